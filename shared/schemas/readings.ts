import { z } from 'zod'
import { readingStateSchema } from '../workflow/reading-states'
import { daySchema } from './equipment'
import { marksSchema } from './marks'
import { faceSchema, pieceSchema } from './parts'
import { readingResultSchema, resultSummarySchema, verdictSchema } from './results'

/** What the photograph was taken with. `null` is "not stated". */
export const setUpSchema = z.object({
  lightSourceId: z.string().nullable(),
  referenceFlatId: z.string().nullable(),
  cameraSetUpId: z.string().nullable(),
  thermometerId: z.string().nullable(),
  /** Taken from the camera set-up unless typed. */
  viewingAngleDeg: z
    .number()
    .min(0, 'setUp.viewingAngle.range')
    .max(75, 'setUp.viewingAngle.range')
    .nullable(),
  viewingAngleUDeg: z.number().min(0).max(20).nullable(),
  mirrored: z.boolean(),
})
export type ReadingSetUp = z.infer<typeof setUpSchema>

export const conditionsSchema = z.object({
  airTemperatureC: z.number().min(-20).max(60).nullable(),
  partTemperatureC: z.number().min(-20).max(120).nullable(),
  soakMinutes: z.number().min(0).max(100_000).nullable(),
  /** Bending by temperature gradient that the inspector allows for, half-width, µm. */
  temperatureHalfWidthUm: z.number().min(0).max(10).nullable(),
  meanGapUm: z.number().min(0).max(1000).nullable(),
  supportHalfWidthUm: z.number().min(0).max(10).nullable(),
  /** How well the outline is placed on the photograph, standard uncertainty, mm. */
  edgePlacementUMm: z.number().min(0).max(10).nullable().default(null),
  /** Readings of this piece with the flat lifted, cleaned and laid again: their spread and how many. */
  repeats: z
    .object({
      standardDeviationUm: z.number({ error: 'reading.repeats.spread' }).positive().max(10),
      count: z
        .number({ error: 'reading.repeats.count' })
        .int('reading.repeats.count')
        .min(2, 'reading.repeats.count')
        .max(1000),
    })
    .nullable()
    .default(null),
  note: z.string().max(1000),
})
export type Conditions = z.infer<typeof conditionsSchema>

export const newReadingSchema = z.object({
  pieceId: z.string().min(1, 'reading.piece.missing'),
  faceId: z.string().min(1, 'reading.face.missing'),
  setUp: setUpSchema,
  conditions: conditionsSchema,
  /** The reading that this one corrects. */
  correctsId: z.string().nullable().default(null),
  /** The piece was lapped since the reading before, so that earlier ones count no more. */
  lappedSince: z.boolean().default(false),
})
export type NewReading = z.infer<typeof newReadingSchema>

export const readingChangeSchema = z.object({
  setUp: setUpSchema.optional(),
  conditions: conditionsSchema.optional(),
})

export const photoSchema = z.object({
  id: z.string(),
  sha256: z.string(),
  role: z.enum(['bands', 'pressed', 'other']),
  fileName: z.string(),
  /** After EXIF orientation. */
  widthPx: z.number().int(),
  heightPx: z.number().int(),
  bitDepth: z.number().int(),
  format: z.string(),
  bytes: z.number().int(),
})
export type Photo = z.infer<typeof photoSchema>

export const readingRowSchema = z.object({
  id: z.string(),
  number: z.number().int(),
  state: readingStateSchema,
  pieceId: z.string(),
  partNumber: z.string(),
  partName: z.string(),
  serial: z.string(),
  faceName: z.string(),
  customerName: z.string(),
  takenBy: z.object({ id: z.string(), name: z.string() }),
  createdAt: z.string(),
  updatedAt: z.string(),
  face: faceSchema,
  photoSha256: z.string().nullable(),
  marksVersion: z.number().int(),
  sentBackReason: z.string().nullable(),
  result: resultSummarySchema.nullable(),
})
export type ReadingRow = z.infer<typeof readingRowSchema>

export const readingSchema = readingRowSchema.extend({
  piece: pieceSchema,
  setUp: setUpSchema,
  conditions: conditionsSchema,
  marks: marksSchema,
  photos: z.array(photoSchema),
  /** Latest result computed by the server, whole; null before the first. */
  fullResult: readingResultSchema.nullable(),
  correctsId: z.string().nullable(),
  mayEdit: z.boolean(),
  maySend: z.boolean(),
  setAsideCause: z.string().nullable(),
  /** Marks, set-up, equipment or the face have changed since the figure, so that it can't be sent. */
  figureIsStale: z.boolean(),
})
export type Reading = z.infer<typeof readingSchema>

export const readingListQuerySchema = z.object({
  state: z.string().optional(),
  mine: z.enum(['true', 'false']).optional(),
  pieceId: z.string().optional(),
  search: z.string().max(100).optional(),
  customerId: z.string().max(40).optional(),
  verdict: verdictSchema.optional(),
  /** Calendar days on which readings were started, both included. */
  from: daySchema.optional(),
  to: daySchema.optional(),
  order: z.enum(['newest', 'oldest']).default('newest'),
  limit: z.coerce.number().int().min(1).max(200).default(50),
  /** `next` of the answer before. */
  before: z.string().max(200).optional(),
})
export type ReadingListQuery = z.infer<typeof readingListQuerySchema>
export const readingListSchema = z.object({
  rows: z.array(readingRowSchema),
  next: z.string().nullable(),
  /** How many there are in all. */
  total: z.number().int(),
})
export type ReadingList = z.infer<typeof readingListSchema>

/** Autosave: the marks, and the version that they were edited from. */
export const saveMarksSchema = z.object({ basedOnVersion: z.number().int().min(0), marks: marksSchema })
export type SaveMarks = z.infer<typeof saveMarksSchema>
export const savedMarksSchema = z.object({ marksVersion: z.number().int(), savedAt: z.string() })
export type SavedMarks = z.infer<typeof savedMarksSchema>
