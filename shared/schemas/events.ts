import { z } from 'zod'

/** One line of the trail: who did what to which. */
export const eventSchema = z.object({
  seq: z.number().int(),
  at: z.string(),
  /** null for what the program itself did. */
  actorId: z.string().nullable(),
  actorName: z.string(),
  kind: z.string(),
  subjectType: z.string(),
  subjectId: z.string(),
  data: z.record(z.string(), z.unknown()),
  hash: z.string(),
})
export type Event = z.infer<typeof eventSchema>

export const eventListQuerySchema = z.object({
  subjectType: z.string().max(40).optional(),
  subjectId: z.string().max(40).optional(),
  limit: z.coerce.number().int().min(1).max(500).default(100),
  /** `next` of the answer before. */
  before: z.coerce.number().int().min(1).optional(),
})
export type EventListQuery = z.infer<typeof eventListQuerySchema>
export const eventListSchema = z.object({ rows: z.array(eventSchema), next: z.number().int().nullable() })
export type EventList = z.infer<typeof eventListSchema>
