import { closeDatabase, openDatabase } from '../db/client'
import { migrateDatabase } from '../db/migrate'
import { events } from '../db/schema/events'
import { people } from '../db/schema/people'

/** Whether the file is a database that was made (by `npm run db:migrate`, say) and never worked with. */
export function isUntouched(file: string): boolean {
  const db = openDatabase(file)
  try {
    migrateDatabase(db)
    const person = db.select({ id: people.id }).from(people).limit(1).get()
    const event = db.select({ seq: events.seq }).from(events).limit(1).get()
    return !person && !event
  } finally {
    closeDatabase(db)
  }
}
