import type { DisplayUnit } from '@shared/schemas/settings'
import { sql } from 'drizzle-orm'
import { check, integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'

/** One row: the shop's own settings. */
export const settings = sqliteTable(
  'settings',
  {
    id: integer('id').primaryKey(),
    shopName: text('shop_name').notNull(),
    shopAddress: text('shop_address').notNull().default(''),
    shopEmail: text('shop_email').notNull().default(''),
    displayUnit: text('display_unit').$type<DisplayUnit>().notNull().default('um'),
    allowPlainNetwork: integer('allow_plain_network', { mode: 'boolean' }).notNull().default(false),
    onePersonShop: integer('one_person_shop', { mode: 'boolean' }).notNull().default(false),
    certificatePrefix: text('certificate_prefix').notNull().default('FC'),
    procedure: text('procedure').notNull().default(''),
    publicAddress: text('public_address').notNull().default(''),
    leastSupportedShare: real('least_supported_share').notNull().default(0.9),
    updatedAt: text('updated_at').notNull(),
  },
  (table) => [check('settings_one_row', sql`${table.id} = 1`)],
)
