import type { Settings } from '@shared/schemas/settings'
import type { AppContext } from '../../context'
import { readSettings } from '../../db/settings'

export function showSettings({ db }: AppContext): Settings {
  return readSettings(db)
}
