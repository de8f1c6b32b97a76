import type { Settings } from '@shared/schemas/settings'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { differences } from '../../db/differences'
import { recordEvent } from '../../db/events'
import { readSettings, writeSettings } from '../../db/settings'

/** `actor` is null when the demo shop is set up. */
export function changeSettings(
  { db, now }: AppContext,
  actor: Actor | null,
  change: Partial<Settings>,
): Settings {
  return inTransaction(db, (tx) => {
    const before = readSettings(tx)
    const changes = differences(before, change)
    if (!changes) return before
    const at = now()
    writeSettings(tx, { ...before, ...change }, at)
    recordEvent(tx, {
      kind: 'settings.changed',
      subject: { type: 'shop', id: 'settings' },
      actor,
      data: { changes },
      at,
    })
    return readSettings(tx)
  })
}
