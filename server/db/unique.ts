import Database from 'better-sqlite3'

/**
 * Runs a write, and turns the database's refusal of a second row of the same name into `clash()`.
 * The database decides, not a look beforehand: two people may save at the same moment.
 */
export function withUniqueClash<T>(write: () => T, clash: () => Error): T {
  try {
    return write()
  } catch (error) {
    if (isUniqueClash(error)) throw clash()
    throw error
  }
}

function isUniqueClash(error: unknown): boolean {
  const cause = error instanceof Error && error.cause ? error.cause : error
  return cause instanceof Database.SqliteError && cause.code === 'SQLITE_CONSTRAINT_UNIQUE'
}
