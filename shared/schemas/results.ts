import { z } from 'zod'

export const verdictSchema = z.enum([
  'conforms',
  'doesNotConform',
  'neitherProven',
  'noTolerance',
  'noVerdict',
])
export type Verdict = z.infer<typeof verdictSchema>

/** What lists and rules show of a result. */
export const resultSummarySchema = z.object({
  id: z.string(),
  outcome: z.enum(['figure', 'refused']),
  engineVersion: z.string(),
  mode: z.enum(['traced', 'automatic']),
  /** Flatness by the face's reference (minimum zone or least squares); null when refused. */
  flatnessUm: z.number().nullable(),
  minimumZoneUm: z.number().nullable(),
  leastSquaresUm: z.number().nullable(),
  expandedUncertaintyUm: z.number().nullable(),
  sagittaUm: z.number().nullable(),
  bandUm: z.number().nullable(),
  form: z.string().nullable(),
  /** By the face's rule. Screens show it only once the reading has left draft. */
  verdict: verdictSchema,
  marksVersion: z.number().int(),
  computedAt: z.string(),
})
export type ResultSummary = z.infer<typeof resultSummarySchema>

const findingSchema = z.object({
  code: z.string(),
  severity: z.enum(['refusal', 'warning', 'remark']),
  params: z.record(z.string(), z.union([z.string(), z.number()])),
  place: z.object({ x: z.number(), y: z.number() }).nullable(),
  traceIds: z.array(z.string()),
})

const placeSchema = z.object({
  xMm: z.number(),
  yMm: z.number(),
  xPx: z.number(),
  yPx: z.number(),
  heightUm: z.number(),
})

const bandReadingSchema = z.object({
  traceId: z.string(),
  order: z.number(),
  bowPx: z.number(),
  spacingPx: z.number(),
  flatnessUm: z.number(),
  chord: z.tuple([z.tuple([z.number(), z.number()]), z.tuple([z.number(), z.number()])]),
  bowAt: z.tuple([z.number(), z.number()]),
})

export const budgetRowSchema = z.object({
  source: z.string(),
  stated: z.boolean(),
  estimate: z.string().nullable(),
  distribution: z.enum(['normal', 'rectangular', 'triangular']).nullable(),
  standardUncertainty: z.number().nullable(),
  unit: z.enum(['um', 'px', 'deg', 'mm', 'relative']),
  sensitivity: z.number().nullable(),
  contributionUm: z.number(),
  degreesOfFreedom: z.number().nullable(),
})

/** A figure as it is stored and sent: `FlatnessResult` of the engine, with the map in whole nanometres. */
export const figureSchema = z.object({
  engineVersion: z.string(),
  mode: z.literal('traced'),
  bandUm: z.number(),
  flatness: z.object({
    minimumZoneUm: z.number(),
    leastSquaresUm: z.number(),
    peakUm: z.number(),
    valleyUm: z.number(),
    rmsUm: z.number(),
  }),
  expandedUncertaintyUm: z.number(),
  coverageFactor: z.literal(2),
  budget: z.array(budgetRowSchema),
  notStated: z.array(z.string()),
  signKnown: z.boolean(),
  form: z.enum(['convex', 'concave', 'saddle', 'flat', 'irregular', 'unknown']),
  terms: z.object({
    sagittaUm: z.number().nullable(),
    sagittaUUm: z.number(),
    radiusOfCurvatureM: z.number().nullable(),
    saddlePeakToValleyUm: z.number(),
    saddleHighAxisDeg: z.number().nullable(),
    edgeDropUm: z.number(),
    edgeDropWidthMm: z.number(),
    edgeDropWorstHour: z.number().nullable(),
    remainderRmsUm: z.number(),
  }),
  statements: z.array(
    z.object({ code: z.string(), params: z.record(z.string(), z.union([z.string(), z.number()])) }),
  ),
  peak: placeSchema,
  valley: placeSchema,
  areaMm2: z.number(),
  supportedShare: z.number(),
  mmPerPx: z.number(),
  bandReadings: z.array(bandReadingSchema),
  worstBandReading: bandReadingSchema.nullable(),
  map: z.object({
    columns: z.number().int(),
    rows: z.number().int(),
    x0Mm: z.number(),
    y0Mm: z.number(),
    stepMm: z.number(),
    /** Height about the least squares plane, whole nm; null off the measured area. */
    heightsNm: z.array(z.number().int().nullable()),
    supported: z.array(z.union([z.literal(0), z.literal(1)])),
    /** Share of each cell that is measured: the rim is its contour at one half. Engine 1.0.0 gave none. */
    coveragePercent: z.array(z.number().int()).optional(),
  }),
  fit: z.object({
    model: z.string(),
    terms: z.number(),
    effectiveTerms: z.number(),
    clickNoisePx: z.number(),
    pointsUsed: z.number(),
    pointsSetAside: z.number(),
    crossValidationUm: z.number(),
    iterations: z.number(),
    converged: z.boolean(),
  }),
  residuals: z.array(
    z.object({ traceId: z.string(), residualsPx: z.array(z.number()), weights: z.array(z.number()) }),
  ),
  findings: z.array(findingSchema),
})
export type Figure = z.infer<typeof figureSchema>

export const readingResultSchema = resultSummarySchema.extend({
  figure: figureSchema.nullable(),
  findings: z.array(findingSchema),
})
export type ReadingResult = z.infer<typeof readingResultSchema>
