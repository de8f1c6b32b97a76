import { z } from 'zod'

/** Weights of Source Sans 3 that a page may use. */
export const pageWeightSchema = z.enum(['light', 'regular', 'semibold'])
export type PageWeight = z.infer<typeof pageWeightSchema>

const colour = z.string().regex(/^#[0-9a-f]{6}$/)
const stroke = z.object({ colour, widthPt: z.number().positive(), dashPt: z.array(z.number()).optional() })

/** One thing on a printed page. Lengths are points (1/72 inch) from the page's top left corner. */
export const pageItemSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('text'),
    text: z.string(),
    x: z.number(),
    /** Of the baseline. */
    y: z.number(),
    sizePt: z.number().positive(),
    weight: pageWeightSchema,
    colour,
    /** Which end of the text stands at x. */
    anchor: z.enum(['start', 'middle', 'end']),
  }),
  z.object({
    kind: z.literal('path'),
    /** SVG path data, absolute commands M, L, C and Z only. */
    d: z.string(),
    fill: colour.nullable(),
    /** 0 to 1, of fill and stroke alike. */
    opacity: z.number().min(0).max(1).default(1),
    stroke: stroke.nullable(),
    evenOdd: z.boolean().default(false),
    /** Path data that the item is kept within. */
    clip: z.string().nullable().default(null),
  }),
  z.object({
    kind: z.literal('image'),
    /** `data:image/png;base64,…` or JPEG. */
    source: z.string(),
    x: z.number(),
    y: z.number(),
    widthPt: z.number().positive(),
    heightPt: z.number().positive(),
    clip: z.string().nullable().default(null),
    /** What it shows, for who can't see it. */
    alt: z.string(),
  }),
])
export type PageItem = z.infer<typeof pageItemSchema>

/** A printed page as a list of what stands on it: the PDF and the print view are both drawn from it. */
export const pageDescriptionSchema = z.object({
  widthPt: z.number().positive(),
  heightPt: z.number().positive(),
  title: z.string(),
  items: z.array(pageItemSchema),
})
export type PageDescription = z.infer<typeof pageDescriptionSchema>
