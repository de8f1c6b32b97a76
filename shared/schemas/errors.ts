import { z } from 'zod'

/** What every route answers when it can't do what was asked: a sentence for the person, by field where one is at fault. */
export const apiErrorSchema = z.object({
  error: z.object({
    code: z.string(),
    message: z.string(),
    fields: z.record(z.string(), z.string()).optional(),
    /** What the caller needs to go on, such as the version that is current after a stale save. */
    details: z.record(z.string(), z.unknown()).optional(),
  }),
})
export type ApiError = z.infer<typeof apiErrorSchema>
