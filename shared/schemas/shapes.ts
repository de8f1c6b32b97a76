import { z } from 'zod'

/** A place in a photograph: pixels, x right, y down, pixel centres at whole numbers, after EXIF orientation. */
export const pointPxSchema = z.tuple([z.number().finite(), z.number().finite()])
export type PointPx = z.infer<typeof pointPxSchema>

export const circleSchema = z.object({
  kind: z.literal('circle'),
  cx: z.number().finite(),
  cy: z.number().finite(),
  r: z.number().positive(),
})

export const ellipseSchema = z.object({
  kind: z.literal('ellipse'),
  cx: z.number().finite(),
  cy: z.number().finite(),
  rx: z.number().positive(),
  ry: z.number().positive(),
  /** Turn of the rx axis from the photograph's x towards its y. */
  rotationDeg: z.number().finite(),
})

export const polygonSchema = z.object({
  kind: z.literal('polygon'),
  points: z.array(pointPxSchema).min(3).max(2000),
})

/** A closed shape in a photograph. */
export const shapeSchema = z.discriminatedUnion('kind', [circleSchema, ellipseSchema, polygonSchema])
export type Circle = z.infer<typeof circleSchema>
export type Ellipse = z.infer<typeof ellipseSchema>
export type Polygon = z.infer<typeof polygonSchema>
export type Shape = z.infer<typeof shapeSchema>
