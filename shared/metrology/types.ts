import type { Outline, PressArrow, Trace } from '../schemas/marks'
import type { Shape } from '../schemas/shapes'

/** Sizes on the drawing that give the photograph its millimetres. */
export type FaceSize =
  | { kind: 'round'; diameterMm: number }
  | { kind: 'block'; widthMm: number; heightMm: number }
  /** A face of free outline: one known length stands between two places in the photograph. */
  | { kind: 'free'; longestSideMm: number }

/** What is known, and how well, of the set-up. `null` is "nobody stated it" and is listed as such. */
export interface SetUp {
  /** Wavelength in the air of the gap. */
  wavelengthNm: number
  /** Relative standard uncertainty of the wavelength. */
  wavelengthRelativeU: number | null
  /** Camera off the face's normal, measured in the gap. */
  viewingAngleDeg: number
  /** Standard uncertainty of the angle. */
  viewingAngleUDeg: number | null
  /** Standard uncertainty of where the outline was put. */
  edgePlacementUMm: number | null
  /** Certified peak-to-valley of the reference flat: taken as ± this, rectangular. */
  referenceFlatFormUm: number | null
  /** Bending of plate and flat by a temperature gradient, half-width of a rectangular distribution. */
  temperatureHalfWidthUm: number | null
  /** Spread of repeats with the flat lifted and laid again: standard deviation and how many. */
  repeats: { standardDeviationUm: number; count: number } | null
  /** Mean gap under the flat, for a camera near enough that the angle changes over the face. */
  nearCamera: { meanGapUm: number; distanceMm: number } | null
  /** Sag of part and flat as held, half-width of a rectangular distribution. */
  supportHalfWidthUm: number | null
}

/** One photograph's marks with the drawing's sizes: what the figures are computed from. */
export interface TracedReading {
  outline: Outline
  size: FaceSize
  /** Places inside these are not measured. Circles and ellipses (bores) have the edge band round them. */
  exclusions: readonly Shape[]
  edgeBandMm: number
  pressArrow: PressArrow | null
  traces: readonly Trace[]
  /** The photograph's size; its middle decides the sign of perspective of a disc seen at an angle. */
  photo: { widthPx: number; heightPx: number } | null
  /** Seen by a mirror: left and right are exchanged on the part. */
  mirrored: boolean
  setUp: SetUp
}

export type FindingSeverity = 'refusal' | 'warning' | 'remark'

/**
 * Something a person should know about the marks or the figure. The sentence stands in the locale files
 * under `findings.<code>`, with `params` filled in.
 */
export interface Finding {
  code: FindingCode
  severity: FindingSeverity
  params: Readonly<Record<string, string | number>>
  /** Where to look in the photograph. */
  place: { x: number; y: number } | null
  traceIds: readonly string[]
}

export type FindingCode =
  // what is missing or wrong, so that no figure can be given
  | 'noOutline'
  | 'outlineDegenerate'
  | 'noBands'
  | 'tooFewBands'
  | 'orderMissing'
  | 'crossingsOnOneLine'
  | 'tooFewPoints'
  | 'nothingMeasured'
  | 'orderAgainstPressArrow'
  | 'tooLittleSupported'
  | 'fitUnstable'
  // mistakes shown where they are
  | 'bandsCross'
  | 'neighboursDiffer'
  | 'pointsOutsideFace'
  | 'pointsOutsideArea'
  | 'clicksSetAside'
  // what the figure is worth
  | 'noPressArrow'
  | 'pressArrowUnclear'
  | 'partlySupported'
  | 'shopMethodDiffers'
  | 'bandsTooClose'
  | 'landsApart'

/** One row of the uncertainty budget (JCGM 100). `contributionUm` is |sensitivity| × standard uncertainty. */
export interface BudgetRow {
  source: BudgetSource
  /** False where nobody stated the input: it counts as nothing and is shown as "not stated". */
  stated: boolean
  estimate: string | null
  distribution: 'normal' | 'rectangular' | 'triangular' | null
  standardUncertainty: number | null
  unit: 'um' | 'px' | 'deg' | 'mm' | 'relative'
  sensitivity: number | null
  contributionUm: number
  degreesOfFreedom: number | null
}

export type BudgetSource =
  | 'centreLine'
  | 'betweenBands'
  | 'peakValleyBias'
  | 'wavelength'
  | 'viewingAngle'
  | 'outline'
  | 'referenceFlat'
  | 'temperature'
  | 'repeat'
  | 'nearCamera'
  | 'support'
  | 'mixedMaterial'

export type FormWord = 'convex' | 'concave' | 'saddle' | 'flat' | 'irregular' | 'unknown'

/** ISO 12781-1 parameters over the measured area; peak and valley are both positive. */
export interface FlatnessParameters {
  minimumZoneUm: number
  leastSquaresUm: number
  peakUm: number
  valleyUm: number
  rmsUm: number
}

/** A place on the face in both frames. */
export interface FacePlace {
  xMm: number
  yMm: number
  xPx: number
  yPx: number
  heightUm: number
}

/**
 * Heights over the part frame, row by row from the top left place, about the least squares plane.
 * NaN off the measured area. `supported` is 0 where the place is farther than one band spacing from any trace.
 */
export interface HeightGrid {
  columns: number
  rows: number
  x0Mm: number
  y0Mm: number
  stepMm: number
  heightsUm: Float32Array
  supported: Uint8Array
  /** Share of every cell that is measured, 0 to 1. */
  coverage: Float32Array
}

/** The shop's reading of one band with a straightedge: bow ÷ spacing × band height. */
export interface BandReading {
  traceId: string
  order: number
  bowPx: number
  spacingPx: number
  flatnessUm: number
  /** Chord ends and place of the greatest bow, in photo pixels. */
  chord: readonly [readonly [number, number], readonly [number, number]]
  bowAt: readonly [number, number]
}

export interface FormTerms {
  /** Middle over rim of the best sphere over the face's diameter (a block: its longer side); null without a press arrow. */
  sagittaUm: number | null
  sagittaUUm: number
  /** Signed radius of curvature in metres, null when flat within U or the sign is unknown. */
  radiusOfCurvatureM: number | null
  saddlePeakToValleyUm: number
  /** Direction of the saddle's high axis, degrees from the photograph's x towards y; null without a press arrow. */
  saddleHighAxisDeg: number | null
  edgeDropUm: number
  edgeDropWidthMm: number
  /** Clock hour (12 at the photograph's top) at which the rim drops most; null where it drops evenly. */
  edgeDropWorstHour: number | null
  remainderRmsUm: number
}

/** How the surface was fitted, for the record and the residual picture. */
export interface FitReport {
  model: string
  terms: number
  effectiveTerms: number
  clickNoisePx: number
  pointsUsed: number
  pointsSetAside: number
  crossValidationUm: number
  iterations: number
  converged: boolean
}

export interface TraceResidual {
  traceId: string
  /** Per point: how far the click lies from the fitted band centre, px, signed; and its weight 0 to 1. */
  residualsPx: Float32Array
  weights: Float32Array
}

export interface FlatnessResult {
  engineVersion: string
  mode: 'traced'
  bandUm: number
  flatness: FlatnessParameters
  expandedUncertaintyUm: number
  coverageFactor: 2
  budget: readonly BudgetRow[]
  notStated: readonly BudgetSource[]
  /** Whether high and hollow are known. */
  signKnown: boolean
  form: FormWord
  terms: FormTerms
  /** Form in words: sentences stand in the locale files under `form.<code>`. */
  statements: readonly { code: string; params: Readonly<Record<string, string | number>> }[]
  peak: FacePlace
  valley: FacePlace
  areaMm2: number
  supportedShare: number
  mmPerPx: number
  bandReadings: readonly BandReading[]
  worstBandReading: BandReading | null
  grid: HeightGrid
  fit: FitReport
  residuals: readonly TraceResidual[]
  findings: readonly Finding[]
}

/** Either a figure, or what is missing for one. Never both. */
export type ReadingOutcome =
  | { kind: 'figure'; result: FlatnessResult }
  | { kind: 'refused'; findings: readonly Finding[] }
