import { z } from 'zod'
import { equipmentSchema } from './equipment'
import { readingRowSchema } from './readings'

export const equipmentDueSchema = z.object({
  equipment: equipmentSchema,
  dueOn: z.string(),
  /** Whole days from today to `dueOn`; below 0 when it is past. */
  daysLeft: z.number().int(),
})
export type EquipmentDue = z.infer<typeof equipmentDueSchema>

/** What the signed-in person finds on the first page. */
export const homeSchema = z.object({
  /** To review, for a reviewer; sent back to oneself, for an inspector. Oldest first. */
  waiting: z.array(readingRowSchema),
  drafts: z.array(readingRowSchema),
  outOfTolerance: z.array(readingRowSchema),
  due: z.array(equipmentDueSchema),
})
export type Home = z.infer<typeof homeSchema>
