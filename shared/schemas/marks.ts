import { z } from 'zod'
import { circleSchema, ellipseSchema, pointPxSchema, polygonSchema, shapeSchema } from './shapes'

const markId = z.string().min(1).max(40)

/**
 * The face's outline in the photograph. Its sizes in mm come from the face on the drawing.
 * A block is a polygon of four corners whose first edge is the width.
 */
export const outlineSchema = z.discriminatedUnion('kind', [circleSchema, ellipseSchema, polygonSchema])
export type Outline = z.infer<typeof outlineSchema>

/**
 * A place that isn't measured. `copies` repeats it evenly round a centre: `count` places in all, the
 * drawn shape being the first.
 */
export const leaveOutSchema = z.object({
  id: markId,
  shape: shapeSchema,
  copies: z.object({ count: z.number().int().min(2).max(360), cx: z.number(), cy: z.number() }).nullable(),
})
export type LeaveOut = z.infer<typeof leaveOutSchema>

/** Where the finger presses, and which way the bands travel there (photo pixels, any length above 0). */
export const pressArrowSchema = z.object({
  x: z.number().finite(),
  y: z.number().finite(),
  dx: z.number().finite(),
  dy: z.number().finite(),
})
export type PressArrow = z.infer<typeof pressArrowSchema>

export const datumMarkSchema = z.object({
  id: markId,
  label: z.string().max(20),
  x: z.number().finite(),
  y: z.number().finite(),
})
export type DatumMark = z.infer<typeof datumMarkSchema>

/** The centre line of one dark band, or of a piece of it. `order` rises by one with each band of gap. */
export const traceSchema = z.object({
  id: markId,
  order: z.number().int().min(-10_000).max(10_000).nullable(),
  points: z.array(pointPxSchema).min(1).max(2000),
})
export type Trace = z.infer<typeof traceSchema>

/** A ruler laid over one band: chord ends, the place of greatest bow, and a place on the next band. */
export const straightedgeSchema = z.object({
  from: pointPxSchema,
  to: pointPxSchema,
  bowAt: pointPxSchema,
  nextBandAt: pointPxSchema,
})
export type Straightedge = z.infer<typeof straightedgeSchema>

/** Everything that a person marks on one photograph. Plain data: history and autosave keep it as it is. */
export const marksSchema = z.object({
  outline: outlineSchema.nullable(),
  leaveOuts: z.array(leaveOutSchema).max(500),
  edgeBandMm: z.number().min(0).max(100),
  pressArrow: pressArrowSchema.nullable(),
  datumMarks: z.array(datumMarkSchema).max(20),
  /** The reference flat's own index mark, where one is seen. */
  flatIndexMark: pointPxSchema.nullable(),
  traces: z.array(traceSchema).max(2000),
  straightedge: straightedgeSchema.nullable(),
})
export type Marks = z.infer<typeof marksSchema>

/** Marks of a photograph on which nothing is marked yet. */
export function emptyMarks(edgeBandMm = 0): Marks {
  return {
    outline: null,
    leaveOuts: [],
    edgeBandMm,
    pressArrow: null,
    datumMarks: [],
    flatIndexMark: null,
    traces: [],
    straightedge: null,
  }
}
