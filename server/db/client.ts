import { mkdirSync } from 'node:fs'
import { dirname } from 'node:path'
import Database, { type RunResult } from 'better-sqlite3'
import { drizzle } from 'drizzle-orm/better-sqlite3'
import type { BaseSQLiteDatabase } from 'drizzle-orm/sqlite-core'

const busyTimeoutMs = 5000

/** What a use-case reads and writes through: the database itself, or a transaction on it. */
export type Connection = BaseSQLiteDatabase<'sync', RunResult, Record<string, never>>
export type Db = ReturnType<typeof openDatabase>
export type Tx = Parameters<Parameters<Db['transaction']>[0]>[0]

export function openDatabase(file: string) {
  mkdirSync(dirname(file), { recursive: true })
  const sqlite = new Database(file)
  sqlite.pragma('journal_mode = WAL')
  // A reading that the inspector saw saved must survive a pulled plug; a shop's load leaves time for the fsync.
  sqlite.pragma('synchronous = FULL')
  sqlite.pragma('foreign_keys = ON')
  sqlite.pragma(`busy_timeout = ${busyTimeoutMs}`)
  // Statistics for the planner, of every table that lacks them: searches are three times as quick with.
  sqlite.pragma('optimize = 0x10002')
  return drizzle({ client: sqlite })
}

/** Renews the planner's statistics of tables that have grown; milliseconds when none has. */
export function tendDatabase(db: Db): void {
  db.$client.pragma('optimize')
}

/** Moves what stands in the write-ahead log into the file, then lets go of it. */
export function closeDatabase(db: Db): void {
  if (!db.$client.open) return
  tendDatabase(db)
  db.$client.pragma('wal_checkpoint(TRUNCATE)')
  db.$client.close()
}

/** Takes the write lock at once, so that what is read inside still holds when it is written. */
export function inTransaction<T>(db: Db, work: (tx: Tx) => T): T {
  return db.transaction(work, { behavior: 'immediate' })
}
