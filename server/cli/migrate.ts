import { closeDatabase, openDatabase } from '../db/client'
import { migrateDatabase } from '../db/migrate'
import { readEnv } from '../env'
import { StartRefusal } from '../start-refusal'

try {
  const { databaseFile } = readEnv(process.env)
  const db = openDatabase(databaseFile)
  migrateDatabase(db)
  closeDatabase(db)
  process.stderr.write(`${databaseFile} is up to date.\n`)
} catch (error) {
  process.stderr.write(`${error instanceof StartRefusal ? error.message : (error as Error).stack}\n`)
  process.exit(1)
}
