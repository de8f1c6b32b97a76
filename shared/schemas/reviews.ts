import { z } from 'zod'
import { readingRowSchema } from './readings'

const words = (missing: string) => z.string().trim().min(1, missing).max(1000)
const personSchema = z.object({ id: z.string(), name: z.string() })

export const newRemarkSchema = z.object({
  text: words('review.remark.missing'),
  /** In photograph pixels; null for a remark on the whole. */
  place: z.object({ x: z.number().finite(), y: z.number().finite() }).nullable().default(null),
})
export type NewRemark = z.infer<typeof newRemarkSchema>
export const remarkAnswerSchema = z.object({ text: words('review.answer.missing') })

export const remarkSchema = z.object({
  id: z.string(),
  author: personSchema,
  text: z.string(),
  place: z.object({ x: z.number(), y: z.number() }).nullable(),
  createdAt: z.string(),
  answers: z.array(
    z.object({ id: z.string(), author: personSchema, text: z.string(), createdAt: z.string() }),
  ),
  closed: z.object({ by: personSchema, at: z.string() }).nullable(),
})
export type Remark = z.infer<typeof remarkSchema>

export const departureSchema = z.enum(['edgeBand', 'leaveOuts'])
export type Departure = z.infer<typeof departureSchema>

/** What a reviewer has before them beside the reading itself. */
export const reviewSchema = z.object({
  remarks: z.array(remarkSchema),
  /** Every reading of this face of the piece, oldest first, and whether it counts. */
  faceReadings: z.array(
    readingRowSchema.extend({ counts: z.boolean(), setAsideCause: z.string().nullable() }),
  ),
  /** Where edge band or leave-outs are not those of the face. */
  departures: z.array(departureSchema),
  departureReason: z.string().nullable(),
  agreed: z.object({ by: personSchema, at: z.string() }).nullable(),
  mayReview: z.boolean(),
  /** Why the signed-in reviewer may not agree; the key of a sentence. */
  refusal: z.enum(['ownReading', 'illegalMove', 'remarksOpen']).nullable(),
  maySetAside: z.boolean(),
})
export type Review = z.infer<typeof reviewSchema>

export const sendReadingSchema = z.object({
  departureReason: z.string().trim().max(500).default(''),
})
export type SendReading = z.infer<typeof sendReadingSchema>
export const sendBackSchema = z.object({ reason: words('review.reason.missing') })
export const setAsideSchema = z.object({ cause: words('review.cause.missing') })

export const dispositionKindSchema = z.enum(['rework', 'concession', 'reject'])
export const newDispositionSchema = z
  .object({
    readingId: z.string().min(1),
    kind: dispositionKindSchema,
    reason: words('disposition.reason.missing'),
    /** Who granted a concession, such as the customer's quality manager by letter. */
    onWordOf: z.string().trim().max(200).default(''),
  })
  .refine((d) => d.kind !== 'concession' || d.onWordOf !== '', {
    path: ['onWordOf'],
    message: 'disposition.onWordOf.missing',
  })
export type NewDisposition = z.infer<typeof newDispositionSchema>

export const dispositionSchema = z.object({
  id: z.string(),
  pieceId: z.string(),
  readingId: z.string(),
  readingNumber: z.number().int(),
  kind: dispositionKindSchema,
  reason: z.string(),
  onWordOf: z.string(),
  decidedBy: personSchema,
  decidedAt: z.string(),
})
export type Disposition = z.infer<typeof dispositionSchema>
