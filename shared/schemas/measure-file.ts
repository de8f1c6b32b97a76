import { z } from 'zod'
import { circleSchema, ellipseSchema, pointPxSchema, polygonSchema, shapeSchema } from './shapes'

const positive = (key: string) => z.number().positive(key)
const notNegative = (key: string) => z.number().min(0, key)
const lengthMm = positive('measureFile.notPositive').max(2000, 'measureFile.tooLarge')

/** The face's outline with the drawing's sizes. A polygon of four corners has its width along the first edge. */
export const measureOutlineSchema = z.discriminatedUnion('kind', [
  circleSchema.extend({ diameterMm: lengthMm }),
  ellipseSchema.extend({ diameterMm: lengthMm }),
  polygonSchema.extend({ widthMm: lengthMm, heightMm: lengthMm }),
])
export type MeasureOutline = z.infer<typeof measureOutlineSchema>

const pressTestSchema = z
  .object({
    x: z.number().finite(),
    y: z.number().finite(),
    dx: z.number().finite(),
    dy: z.number().finite(),
  })
  .refine((arrow) => Math.hypot(arrow.dx, arrow.dy) > 0, 'measureFile.pressTestWithoutLength')

/** A traced dark band as the file has it: without a name, its order possibly left out. */
const fileTraceSchema = z.object({
  order: z.number().int('measureFile.orderNotWhole').min(-10_000).max(10_000).nullable().default(null),
  points: z.array(pointPxSchema).min(1, 'measureFile.traceEmpty').max(5000),
})

/**
 * The file of the measuring command: what an inspector knows and marks of one photograph. Keys that it doesn't
 * know are left alone. Sources of uncertainty that aren't in it count nothing and are listed as not stated.
 */
export const measureFileSchema = z.object({
  /** The photograph, beside the file. */
  photo: z.string().min(1).optional(),
  lightSource: z.object({
    /** In air. */
    wavelengthNm: z.number().min(300, 'measureFile.wavelengthRange').max(1100, 'measureFile.wavelengthRange'),
    /** Relative standard uncertainty. */
    relativeUncertainty: positive('measureFile.notPositive').max(0.2).optional(),
  }),
  viewingAngleDeg: z
    .number()
    .min(0, 'measureFile.viewingAngleRange')
    .max(75, 'measureFile.viewingAngleRange')
    .default(0),
  outline: measureOutlineSchema,
  exclusions: z.array(shapeSchema).max(2000).default([]),
  edgeExclusionMm: notNegative('measureFile.negative').max(1000).default(0),
  pressTest: pressTestSchema.nullish(),
  datumMarks: z.array(pointPxSchema).max(100).optional(),
  traces: z.array(fileTraceSchema).max(5000).optional(),

  /** Standard uncertainty of the viewing angle. */
  viewingAngleUncertaintyDeg: notNegative('measureFile.negative').max(20).optional(),
  /** Certified peak-to-valley of the reference flat. */
  referenceFlatFormUm: notNegative('measureFile.negative').max(10).optional(),
  /** Standard uncertainty of where the outline was put. */
  edgePlacementUncertaintyMm: notNegative('measureFile.negative').max(10).optional(),
  temperatureHalfWidthUm: notNegative('measureFile.negative').max(10).optional(),
  supportHalfWidthUm: notNegative('measureFile.negative').max(10).optional(),
  /** Repeats with the flat lifted and laid again. */
  repeats: z
    .object({
      standardDeviationUm: notNegative('measureFile.negative').max(100),
      count: z.number().int().min(2, 'measureFile.repeatsTooFew').max(10_000),
    })
    .optional(),
  nearCamera: z
    .object({
      meanGapUm: notNegative('measureFile.negative').max(1000),
      distanceMm: positive('measureFile.notPositive').max(20_000),
    })
    .optional(),
  /** Seen by a mirror: left and right are exchanged on the part. */
  mirrored: z.boolean().default(false),
})
export type MeasureFile = z.infer<typeof measureFileSchema>
