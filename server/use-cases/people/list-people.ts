import type { Person } from '@shared/schemas/people'
import type { AppContext } from '../../context'
import { selectPeople } from '../../db/people'

export function listPeople({ db }: AppContext): Person[] {
  return selectPeople(db)
}
