import type { EquipmentDetails, EquipmentKind } from '@shared/schemas/equipment'
import { sql } from 'drizzle-orm'
import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'

export interface StoredCalibration {
  laboratory: string
  certificateNumber: string
  calibratedOn: string | null
  dueOn: string | null
}

export const equipment = sqliteTable(
  'equipment',
  {
    id: text('id').primaryKey(),
    kind: text('kind').$type<EquipmentKind>().notNull(),
    name: text('name').notNull(),
    description: text('description').notNull().default(''),
    details: text('details', { mode: 'json' }).$type<EquipmentDetails>().notNull(),
    inService: integer('in_service', { mode: 'boolean' }).notNull().default(true),
    calibration: text('calibration', { mode: 'json' }).$type<StoredCalibration>(),
    /** Copy of `calibration.dueOn`, so that what falls due is found by an index. */
    dueOn: text('due_on'),
    createdAt: text('created_at').notNull(),
  },
  (table) => [
    uniqueIndex('equipment_name').on(sql`lower(${table.name})`),
    index('equipment_kind').on(table.kind, table.name),
    index('equipment_due').on(table.dueOn),
  ],
)
