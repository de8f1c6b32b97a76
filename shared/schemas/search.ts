import { z } from 'zod'
import { certificateRowSchema } from './certificates'
import { customerSchema, partSchema, pieceSchema } from './parts'
import { readingRowSchema } from './readings'

export const searchQuerySchema = z.object({ q: z.string().trim().max(100).default('') })

/** The first few of each thing that matches. */
export const foundSchema = z.object({
  parts: z.array(partSchema),
  pieces: z.array(pieceSchema),
  readings: z.array(readingRowSchema),
  customers: z.array(customerSchema),
  certificates: z.array(certificateRowSchema),
})
export type Found = z.infer<typeof foundSchema>
