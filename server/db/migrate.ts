import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { sql } from 'drizzle-orm'
import { migrate } from 'drizzle-orm/better-sqlite3/migrator'
import { StartRefusal } from '../start-refusal'
import type { Db } from './client'

// Beside this file in the source; the build copies the folder beside the bundle.
const migrationsFolder = fileURLToPath(new URL('./migrations', import.meta.url))

/** Brings the database to this program's schema. */
export function migrateDatabase(db: Db): void {
  refuseNewer(db)
  // SQLite changes some columns by rebuilding their table, which live foreign keys would refuse.
  db.$client.pragma('foreign_keys = OFF')
  migrate(db, { migrationsFolder })
  const broken = db.$client.pragma('foreign_key_check') as unknown[]
  db.$client.pragma('foreign_keys = ON')
  if (broken.length > 0) {
    throw new Error(`After the migration ${broken.length} rows point at rows that are not there.`)
  }
}

function refuseNewer(db: Db): void {
  const applied = latestApplied(db)
  if (applied !== null && applied > latestKnown()) {
    throw new StartRefusal(
      'The database was written by a newer Lapwing. Start that version, or name another folder in LAPWING_DATA.',
    )
  }
}

function latestApplied(db: Db): number | null {
  const table = db.get(sql`SELECT 1 FROM sqlite_master WHERE name = '__drizzle_migrations'`)
  if (!table) return null
  const row = db.get<{ latest: number | null }>(
    sql`SELECT max(created_at) AS latest FROM __drizzle_migrations`,
  )
  return row.latest === null ? null : Number(row.latest)
}

function latestKnown(): number {
  const journal: { entries: { when: number }[] } = JSON.parse(
    readFileSync(join(migrationsFolder, 'meta', '_journal.json'), 'utf8'),
  )
  return Math.max(...journal.entries.map((entry) => entry.when))
}
