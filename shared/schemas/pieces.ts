import { z } from 'zod'
import { certificateRowSchema } from './certificates'
import { faceSchema, lotSchema, partRowSchema, partSchema, pieceSchema } from './parts'
import { readingRowSchema } from './readings'
import { dispositionSchema } from './reviews'

/** A piece with its latest reading that isn't set aside. */
export const pieceRowSchema = pieceSchema.extend({ latest: readingRowSchema.nullable() })
export type PieceRow = z.infer<typeof pieceRowSchema>

export const pieceListQuerySchema = z.object({
  search: z.string().max(100).optional(),
  partId: z.string().optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
  before: z.string().max(200).optional(),
})
export type PieceListQuery = z.infer<typeof pieceListQuerySchema>
export const pieceListSchema = z.object({
  rows: z.array(pieceRowSchema),
  next: z.string().nullable(),
  /** How many there are in all. */
  total: z.number().int(),
})
export type PieceList = z.infer<typeof pieceListSchema>

export const piecePageSchema = z.object({
  piece: pieceSchema,
  part: partSchema,
  faces: z.array(faceSchema),
  /** Oldest first. */
  readings: z.array(readingRowSchema),
  /** Newest first: the first one counts. */
  dispositions: z.array(dispositionSchema),
  /** Newest first. */
  certificates: z.array(certificateRowSchema),
})
export type PiecePage = z.infer<typeof piecePageSchema>

export const partListSchema = z.object({ rows: z.array(partRowSchema) })
export type PartList = z.infer<typeof partListSchema>

export const partPageSchema = z.object({
  part: partSchema,
  faces: z.array(faceSchema),
  lots: z.array(lotSchema),
  pieces: z.array(pieceRowSchema),
})
export type PartPage = z.infer<typeof partPageSchema>
