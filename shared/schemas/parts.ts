import { z } from 'zod'
import { leaveOutSchema, outlineSchema } from './marks'

const line = (max: number) => z.string().trim().max(max)

export const newCustomerSchema = z.object({
  name: line(120).min(1, 'customer.name.missing'),
  address: line(300).default(''),
  email: line(200).default(''),
})
export type NewCustomer = z.infer<typeof newCustomerSchema>
export const customerSchema = newCustomerSchema.extend({ id: z.string() })
export type Customer = z.infer<typeof customerSchema>

/** A length that a person typed, kept beside what it means. */
export const typedHeightSchema = z.object({ valueUm: z.number().finite(), typed: z.string().max(60) })
export type TypedHeight = z.infer<typeof typedHeightSchema>

/**
 * Tolerance of a face. Plain: the flatness is at most `max`. Signed: high counts plus and hollow minus, and
 * the signed flatness lies from `least` to `most` ("hollow 0.2 to 0.6 µm, never high" is −0.6 to −0.2).
 */
export const toleranceSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('none') }),
  z.object({ kind: z.literal('plain'), max: typedHeightSchema }),
  z.object({ kind: z.literal('signed'), least: typedHeightSchema, most: typedHeightSchema }),
])
export type Tolerance = z.infer<typeof toleranceSchema>

/** Decision rule: guard band w = factor × U. */
export const decisionRuleSchema = z.object({
  kind: z.enum(['simpleAcceptance', 'iso14253_2017', 'iso14253_older', 'own']),
  guardFactor: z.number().min(0).max(5),
})
export type DecisionRule = z.infer<typeof decisionRuleSchema>

export const faceSizeSchema = z.discriminatedUnion('shape', [
  z.object({ shape: z.literal('disc'), diameterMm: z.number().positive().max(2000) }),
  z.object({
    shape: z.literal('annulus'),
    diameterMm: z.number().positive().max(2000),
    boreMm: z.number().positive().max(2000),
  }),
  z.object({
    shape: z.literal('block'),
    widthMm: z.number().positive().max(2000),
    heightMm: z.number().positive().max(2000),
  }),
  z.object({ shape: z.literal('free'), longestSideMm: z.number().positive().max(2000) }),
])
export type FaceSizes = z.infer<typeof faceSizeSchema>

/** Outline and leave-outs of an earlier photograph, kept to be laid on the next. */
export const faceTemplateSchema = z.object({ outline: outlineSchema, leaveOuts: z.array(leaveOutSchema) })
export type FaceTemplate = z.infer<typeof faceTemplateSchema>

export const newFaceSchema = z.object({
  name: line(60).min(1, 'face.name.missing'),
  size: faceSizeSchema.refine((s) => s.shape !== 'annulus' || s.boreMm < s.diameterMm, 'face.bore.tooLarge'),
  tolerance: toleranceSchema
    .refine((t) => t.kind !== 'plain' || t.max.valueUm > 0, 'face.tolerance.notPositive')
    .refine((t) => t.kind !== 'signed' || t.least.valueUm < t.most.valueUm, 'face.tolerance.order'),
  reference: z.enum(['minimumZone', 'leastSquares']),
  rule: decisionRuleSchema,
  edgeBandMm: z.number().min(0).max(100),
  support: z.enum(['held', 'free']),
  template: faceTemplateSchema.nullable().default(null),
})
export type NewFace = z.infer<typeof newFaceSchema>
export const faceSchema = newFaceSchema.extend({ id: z.string(), partId: z.string() })
export type Face = z.infer<typeof faceSchema>

export const newPartSchema = z.object({
  customerId: z.string().min(1, 'part.customer.missing'),
  number: line(60).min(1, 'part.number.missing'),
  revision: line(20).default(''),
  name: line(120).min(1, 'part.name.missing'),
  material: line(120).default(''),
})
export type NewPart = z.infer<typeof newPartSchema>
export const partSchema = newPartSchema.extend({ id: z.string(), customerName: z.string() })
export type Part = z.infer<typeof partSchema>

export const partRowSchema = partSchema.extend({ faces: z.array(faceSchema), pieceCount: z.number().int() })
export type PartRow = z.infer<typeof partRowSchema>

export const newLotSchema = z.object({
  partId: z.string(),
  number: line(60).min(1, 'lot.number.missing'),
  order: line(60).default(''),
})
export type NewLot = z.infer<typeof newLotSchema>
export const lotSchema = newLotSchema.extend({ id: z.string() })
export type Lot = z.infer<typeof lotSchema>

export const newPieceSchema = z.object({
  partId: z.string().min(1, 'piece.part.missing'),
  lotId: z.string().nullable().default(null),
  serial: line(60).min(1, 'piece.serial.missing'),
})
export type NewPiece = z.infer<typeof newPieceSchema>
export const pieceSchema = newPieceSchema.extend({
  id: z.string(),
  partNumber: z.string(),
  partRevision: z.string(),
  partName: z.string(),
  customerName: z.string(),
  lotNumber: z.string().nullable(),
  createdAt: z.string(),
})
export type Piece = z.infer<typeof pieceSchema>
