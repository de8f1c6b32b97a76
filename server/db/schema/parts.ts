import type { DecisionRule, FaceSizes, FaceTemplate, Tolerance } from '@shared/schemas/parts'
import { sql } from 'drizzle-orm'
import { index, integer, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'

// Names and numbers are unique whatever their case: "vc-60" beside "VC-60" would be one part entered twice.

export const customers = sqliteTable(
  'customers',
  {
    id: text('id').primaryKey(),
    name: text('name').notNull(),
    address: text('address').notNull().default(''),
    email: text('email').notNull().default(''),
    createdAt: text('created_at').notNull(),
  },
  (table) => [uniqueIndex('customers_name').on(sql`lower(${table.name})`)],
)

export const parts = sqliteTable(
  'parts',
  {
    id: text('id').primaryKey(),
    customerId: text('customer_id')
      .notNull()
      .references(() => customers.id),
    number: text('number').notNull(),
    revision: text('revision').notNull().default(''),
    name: text('name').notNull(),
    material: text('material').notNull().default(''),
    createdAt: text('created_at').notNull(),
  },
  (table) => [
    uniqueIndex('parts_number_revision').on(sql`lower(${table.number})`, sql`lower(${table.revision})`),
    index('parts_customer').on(table.customerId),
  ],
)

export const faces = sqliteTable(
  'faces',
  {
    id: text('id').primaryKey(),
    partId: text('part_id')
      .notNull()
      .references(() => parts.id),
    /** Order of the faces on the part's page. */
    position: integer('position').notNull(),
    name: text('name').notNull(),
    size: text('size', { mode: 'json' }).$type<FaceSizes>().notNull(),
    tolerance: text('tolerance', { mode: 'json' }).$type<Tolerance>().notNull(),
    reference: text('reference').$type<'minimumZone' | 'leastSquares'>().notNull(),
    rule: text('rule', { mode: 'json' }).$type<DecisionRule>().notNull(),
    edgeBandMm: real('edge_band_mm').notNull(),
    support: text('support').$type<'held' | 'free'>().notNull(),
    template: text('template', { mode: 'json' }).$type<FaceTemplate>(),
    createdAt: text('created_at').notNull(),
  },
  (table) => [uniqueIndex('faces_part_name').on(table.partId, sql`lower(${table.name})`)],
)

export const lots = sqliteTable(
  'lots',
  {
    id: text('id').primaryKey(),
    partId: text('part_id')
      .notNull()
      .references(() => parts.id),
    number: text('number').notNull(),
    order: text('order').notNull().default(''),
    createdAt: text('created_at').notNull(),
  },
  (table) => [uniqueIndex('lots_part_number').on(table.partId, sql`lower(${table.number})`)],
)

export const pieces = sqliteTable(
  'pieces',
  {
    id: text('id').primaryKey(),
    partId: text('part_id')
      .notNull()
      .references(() => parts.id),
    lotId: text('lot_id').references(() => lots.id),
    serial: text('serial').notNull(),
    createdAt: text('created_at').notNull(),
  },
  (table) => [
    uniqueIndex('pieces_part_serial').on(table.partId, sql`lower(${table.serial})`),
    index('pieces_created').on(table.createdAt, table.id),
    index('pieces_lot').on(table.lotId),
  ],
)
