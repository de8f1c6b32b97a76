import { existsSync, renameSync, rmSync } from 'node:fs'
import { createAuth } from '../auth/auth'
import type { AppContext } from '../context'
import { closeDatabase, inTransaction, openDatabase } from '../db/client'
import { recordEvent } from '../db/events'
import { migrateDatabase } from '../db/migrate'
import { seedDemoShop } from '../seed/seed-demo-shop'
import { addFirstAdministrator } from '../use-cases/people/add-first-administrator'
import { isUntouched } from './is-untouched'

export type FirstAdministrator = { email: string; password: string }

/**
 * Fills a new database, under another name until it is whole: a start that is broken off leaves nothing
 * half done. Gives the account that was made for an empty shop.
 */
export async function setUpNewShop(
  services: Omit<AppContext, 'db' | 'auth'>,
): Promise<FirstAdministrator | null> {
  const { databaseFile, demo } = services.env
  if (existsSync(databaseFile) && !isUntouched(databaseFile)) return null

  const building = `${databaseFile}.new`
  removeDatabase(building)
  const db = openDatabase(building)
  migrateDatabase(db)
  const context: AppContext = { ...services, db, auth: createAuth(db) }
  const administrator = demo ? await seedDemo(context) : await addFirstAdministrator(context)
  closeDatabase(db)

  removeDatabase(databaseFile)
  renameSync(building, databaseFile)
  return administrator
}

async function seedDemo(context: AppContext): Promise<null> {
  process.stderr.write('Setting up the demo shop.\n')
  await seedDemoShop(context)
  inTransaction(context.db, (tx) =>
    recordEvent(tx, {
      kind: 'demo.seeded',
      subject: { type: 'shop', id: 'demo' },
      actor: null,
      at: context.now(),
    }),
  )
  return null
}

function removeDatabase(file: string): void {
  for (const suffix of ['', '-wal', '-shm']) rmSync(`${file}${suffix}`, { force: true })
}
