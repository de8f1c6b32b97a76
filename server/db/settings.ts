import type { Settings } from '@shared/schemas/settings'
import { eq } from 'drizzle-orm'
import type { Connection, Tx } from './client'
import { settings } from './schema/settings'

const settingsRowId = 1

/** A shop that has set nothing yet. */
const firstSettings: Settings = {
  shopName: 'Our lapping shop',
  shopAddress: '',
  shopEmail: '',
  displayUnit: 'um',
  allowPlainNetwork: false,
  onePersonShop: false,
  certificatePrefix: 'FC',
  procedure: '',
  publicAddress: '',
  leastSupportedShare: 0.9,
}

/** The shop's settings; the first ones until somebody changes them. */
export function readSettings(db: Connection): Settings {
  const row = db.select().from(settings).where(eq(settings.id, settingsRowId)).get()
  if (!row) return firstSettings
  const { id: _id, updatedAt: _updatedAt, ...own } = row
  return own
}

export function writeSettings(tx: Tx, next: Settings, at: Date): void {
  const row = { ...next, updatedAt: at.toISOString() }
  tx.insert(settings)
    .values({ id: settingsRowId, ...row })
    .onConflictDoUpdate({ target: settings.id, set: row })
    .run()
}
