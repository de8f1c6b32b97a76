import { type PartFrame, partFrame } from '../geometry/part-frame'
import { bandHeightUm } from './band-height'
import { readBands, worstBand } from './band-readings'
import { drawUpBudget, expandedUncertaintyUm, notStatedIn } from './budget'
import { leaveOutBands } from './cross-validation'
import { acrossMmOf, degreeFor, FINE_DEGREE, faceBasis, USUAL_DEGREE } from './face-basis'
import { surfaceUncertainty } from './flatness-uncertainty'
import { type FormFit, fitForm, formStatements, formWord } from './form-terms'
import {
  type MeasuredArea,
  type MeasuredPlaces,
  mapGrid,
  measuredArea,
  measuredPlaces,
} from './measured-area'
import { misnumberedTrace } from './misnumbered-band'
import { flatnessParameters } from './parameters'
import { readPressArrow } from './press-arrow'
import { rimDistancesMm, steepestRimSlope } from './rim'
import { supportedPlaces } from './support'
import { fitSurface, gapsAt, type SurfaceFit } from './surface-fit'
import { clicksOutside, clicksThatDoNotFit, crossedBands, finding, missingForAFigure } from './trace-checks'
import type { TracedPoints } from './traced-points'
import type {
  FacePlace,
  Finding,
  FlatnessResult,
  FormTerms,
  HeightGrid,
  ReadingOutcome,
  TracedReading,
  TraceResidual,
} from './types'

/** Changes whenever the same marks may give another figure. */
export const ENGINE_VERSION = '1.1.0'

/** A bend whose band reading departs from the figure by more than this share, and by U, is told of. */
const SHOP_METHOD_SHARE = 0.25
/** Less of the area than this within a band spacing of a trace is told of; less than the second refuses. */
const WELL_SUPPORTED_SHARE = 0.9
const LEAST_SUPPORTED_SHARE = 0.5
/** Bands nearer than this can't be told apart by a hand, px. */
const LEAST_SPACING_PX = 4
/** A posterior spread beyond this share of the figure and this many bands: the traces don't hold the surface. */
const UNSTABLE_SHARE = 0.5
const UNSTABLE_BANDS = 0.15

/**
 * From marks to figures: the photograph's pixels to millimetres, the traced bands to a smooth surface, its
 * flatness by both reference planes, form in words, and the expanded uncertainty with its budget. Refuses,
 * saying what is missing, rather than guess. The same input gives the same figures to the last digit.
 */
export function readTraces(reading: TracedReading): ReadingOutcome {
  const placed = partFrame(reading.outline, reading.size, {
    viewingAngleDeg: reading.setUp.viewingAngleDeg,
    photo: reading.photo,
    mirrored: reading.mirrored,
  })
  if ('problem' in placed)
    return refused([finding('outlineDegenerate', 'refusal', { problem: placed.problem })])
  const area = measuredArea(reading, placed)
  const missing = missingForAFigure(reading, area, placed)
  if (missing.length > 0) return refused(missing)
  const points = tracedPoints(reading, placed)
  const fit = tryFit(points, reading, placed)
  if (!fit) return refused([finding('fitUnstable', 'refusal')])
  return figureFrom(reading, placed, area, points, fit)
}

function refused(findings: readonly Finding[]): ReadingOutcome {
  return { kind: 'refused', findings }
}

function tryFit(points: TracedPoints, reading: TracedReading, frame: PartFrame): SurfaceFit | null {
  try {
    const usual = fitSurface(points, faceBasis(reading, frame, degreeFor(points.count, USUAL_DEGREE)))
    if (!holdsFinerWaves(usual, points)) return usual
    return fitSurface(points, faceBasis(reading, frame, degreeFor(points.count, FINE_DEGREE)))
  } catch (error) {
    if (error instanceof RangeError) return null
    throw error
  }
}

/** Degrees just under the usual limit, and the share of them that the data must determine to look beyond it. */
const TOP_DEGREES = 3
const FINER_SHARE = 0.3

/** Whether the highest usual degrees are still in play, so that the face may hold waves finer than them. */
function holdsFinerWaves(fit: SurfaceFit, points: TracedPoints): boolean {
  if (degreeFor(points.count, FINE_DEGREE) <= USUAL_DEGREE) return false
  let determined = 0
  let count = 0
  fit.basis.degreeOf.forEach((degree, f) => {
    if (degree <= USUAL_DEGREE - TOP_DEGREES) return
    count++
    const at = fit.active.indexOf(f)
    if (at >= 0) determined += fit.determined[at]!
  })
  return determined > FINER_SHARE * count
}

/** Clicks of all traces in the part frame, with the places one pixel to the right and one below. */
function tracedPoints(reading: TracedReading, frame: PartFrame): TracedPoints {
  const clicks = reading.traces.flatMap((trace, t) =>
    trace.points.map(([x, y]) => ({ x, y, t, order: trace.order ?? 0 })),
  )
  const count = clicks.length
  const at = (dx: number, dy: number) => {
    const xMm = new Float64Array(count)
    const yMm = new Float64Array(count)
    clicks.forEach(({ x, y }, i) => {
      const [mx, my] = frame.toMm(x + dx, y + dy)
      xMm[i] = mx
      yMm[i] = my
    })
    return { xMm, yMm }
  }
  const here = at(0, 0)
  const right = at(1, 0)
  const down = at(0, 1)
  return {
    count,
    ...here,
    xMmRight: right.xMm,
    yMmRight: right.yMm,
    xMmDown: down.xMm,
    yMmDown: down.yMm,
    order: Float64Array.from(clicks, (c) => c.order),
    traceOf: Int32Array.from(clicks, (c) => c.t),
  }
}

function figureFrom(
  reading: TracedReading,
  frame: PartFrame,
  area: MeasuredArea,
  points: TracedPoints,
  fit: SurfaceFit,
): ReadingOutcome {
  const arrow = readPressArrow(reading, fit, points, area, frame)
  if (arrow === 'against') {
    const place = [reading.pressArrow!.x, reading.pressArrow!.y] as const
    return refused([finding('orderAgainstPressArrow', 'refusal', {}, { place })])
  }
  const wrong = misnumberedTrace(
    points,
    fit,
    (others) => tryFit(others, reading, frame),
    (other, i) => other.gapAt(points.xMm[i]!, points.yMm[i]!),
  )
  if (wrong !== null) return refused([misnumbered(reading, wrong)])
  const misfits = clicksThatDoNotFit(reading, points, fit)
  const refusals = misfits.filter((f) => f.severity === 'refusal')
  if (refusals.length > 0) return refused(refusals)

  const bandUm = bandHeightUm(reading.setUp.wavelengthNm, reading.setUp.viewingAngleDeg)
  const places = measuredPlaces(area)
  const heights = heightsAt(fit, places.xMm, places.yMm, bandUm)
  const { flatness, lsPlane, peakIndex, valleyIndex } = flatnessParameters(
    places.xMm,
    places.yMm,
    heights,
    places.weightMm2,
  )
  const minimumZoneBands = flatness.minimumZoneUm / bandUm
  const validation = leaveOutBands(points, fit)
  const surface = surfaceUncertainty(fit, places, validation, minimumZoneBands)
  if (surface.centreLine > UNSTABLE_BANDS && surface.centreLine > UNSTABLE_SHARE * minimumZoneBands) {
    return refused([finding('fitUnstable', 'refusal')])
  }
  const rimDistance = rimDistancesMm(reading, frame, places)
  const acrossMm = acrossMmOf(reading)
  const budget = drawUpBudget(
    {
      minimumZoneUm: flatness.minimumZoneUm,
      bandUm,
      surface,
      rimSlopeUmPerMm: steepestRimSlope(fit, reading, frame, [peakIndex, valleyIndex], places, bandUm),
      acrossMm,
    },
    reading.setUp,
  )
  const uUm = expandedUncertaintyUm(budget)
  const form = fitForm(
    {
      xMm: places.xMm,
      yMm: places.yMm,
      weightMm2: places.weightMm2,
      heightUm: heights,
      rimDistanceMm: rimDistance,
    },
    { acrossMm, edgeBandMm: reading.edgeBandMm },
  )
  if (!form) return refused([finding('fitUnstable', 'refusal')])

  const signKnown = arrow === 'agrees'
  const grid = heightGrid(area, fit, points, bandUm, lsPlane, frame)
  const supportedShare = shareSupported(grid)
  if (supportedShare < LEAST_SUPPORTED_SHARE) {
    return refused([finding('tooLittleSupported', 'refusal', { percent: Math.round(100 * supportedShare) })])
  }
  const word = formWord(form, flatness.leastSquaresUm, uUm, signKnown)
  const terms = formTerms(form, acrossMm, uUm, signKnown)
  const bandReadings = readBands(reading.traces, frame, bandUm)
  const worst = worstBand(bandReadings)
  const result: FlatnessResult = {
    engineVersion: ENGINE_VERSION,
    mode: 'traced',
    bandUm,
    flatness,
    expandedUncertaintyUm: uUm,
    coverageFactor: 2,
    budget,
    notStated: notStatedIn(budget),
    signKnown,
    form: word,
    terms,
    statements: formStatements(form, terms, word, uUm, signKnown),
    peak: facePlace(places, heights, lsPlane, peakIndex),
    valley: facePlace(places, heights, lsPlane, valleyIndex),
    areaMm2: area.areaMm2,
    supportedShare,
    mmPerPx: frame.mmPerPx(...frame.toPx(0, 0)),
    bandReadings,
    worstBandReading: worst,
    grid,
    fit: {
      model: reading.outline.kind === 'polygon' ? 'legendre' : 'zernike',
      terms: fit.active.length,
      effectiveTerms: fit.effectiveTerms,
      clickNoisePx: fit.clickNoisePx,
      pointsUsed: points.count - fit.weights.filter((w) => w === 0).length,
      pointsSetAside: fit.weights.filter((w) => w === 0).length,
      crossValidationUm: validation.typicalExcess * bandUm,
      iterations: fit.iterations,
      converged: fit.converged,
    },
    residuals: residualsByTrace(reading, points, fit),
    findings: [
      ...crossedBands(reading.traces),
      ...clicksOutside(reading, area, reading.edgeBandMm / frame.mmPerPx(...frame.toPx(0, 0))),
      ...misfits,
      ...worthOfFigure(
        arrow,
        supportedShare,
        area,
        fit,
        worst?.flatnessUm ?? null,
        flatness.minimumZoneUm,
        uUm,
      ),
    ],
  }
  return { kind: 'figure', result }
}

function misnumbered(reading: TracedReading, index: number): Finding {
  const trace = reading.traces[index]!
  const place = trace.points[trace.points.length >> 1]!
  return finding('neighboursDiffer', 'refusal', { order: trace.order ?? '' }, { place, traceIds: [trace.id] })
}

/** Heights of the fitted surface, high up: the gap turned over. */
function heightsAt(fit: SurfaceFit, xMm: Float64Array, yMm: Float64Array, bandUm: number): Float64Array {
  return gapsAt(fit, xMm, yMm).map((gap) => -gap * bandUm)
}

interface Plane {
  a: number
  b: number
  c: number
}

function planeAt(plane: Plane, x: number, y: number): number {
  return plane.a * x + plane.b * y + plane.c
}

function facePlace(places: MeasuredPlaces, heights: Float64Array, plane: Plane, i: number): FacePlace {
  const xMm = places.xMm[i]!
  const yMm = places.yMm[i]!
  return {
    xMm,
    yMm,
    xPx: places.xPx[i]!,
    yPx: places.yPx[i]!,
    heightUm: heights[i]! - planeAt(plane, xMm, yMm),
  }
}

function heightGrid(
  area: MeasuredArea,
  fit: SurfaceFit,
  points: TracedPoints,
  bandUm: number,
  plane: Plane,
  frame: PartFrame,
): HeightGrid {
  const grid = mapGrid(area)
  const heights = heightsAt(fit, grid.xMm, grid.yMm, bandUm)
  const heightsUm = new Float32Array(grid.columns * grid.rows).fill(Number.NaN)
  grid.index.forEach((cell, i) => {
    heightsUm[cell] = heights[i]! - planeAt(plane, grid.xMm[i]!, grid.yMm[i]!)
  })
  const [cx, cy] = frame.toPx(0, 0)
  const mmPerPx = frame.mmPerPx(cx, cy)
  const spacingMm = fit.slopePerPx.map((slope) => mmPerPx / slope)
  const { columns, rows, x0Mm, y0Mm, stepMm } = grid
  const supported = supportedPlaces(grid, points, spacingMm)
  return { columns, rows, x0Mm, y0Mm, stepMm, heightsUm, supported, coverage: grid.coverage }
}

function shareSupported(grid: HeightGrid): number {
  let measured = 0
  let supported = 0
  for (let i = 0; i < grid.heightsUm.length; i++) {
    if (Number.isNaN(grid.heightsUm[i]!)) continue
    measured++
    supported += grid.supported[i]!
  }
  return measured === 0 ? 0 : supported / measured
}

function formTerms(form: FormFit, acrossMm: number, uUm: number, signKnown: boolean): FormTerms {
  const { sagittaUm } = form
  const curved = signKnown && Math.abs(sagittaUm) > uUm
  return {
    sagittaUm: signKnown ? sagittaUm : null,
    sagittaUUm: uUm,
    // R = D² / (8 s): mm² ÷ µm gives km, times 1000 metres.
    radiusOfCurvatureM: curved ? acrossMm ** 2 / (8 * sagittaUm) : null,
    saddlePeakToValleyUm: form.saddlePeakToValleyUm,
    saddleHighAxisDeg: signKnown ? form.saddleHighAxisDeg : null,
    edgeDropUm: form.edgeDropUm,
    edgeDropWidthMm: form.edgeDropWidthMm,
    edgeDropWorstHour: form.edgeDropWorstHour,
    remainderRmsUm: form.remainderRmsUm,
  }
}

function residualsByTrace(reading: TracedReading, points: TracedPoints, fit: SurfaceFit): TraceResidual[] {
  let at = 0
  return reading.traces.map((trace) => {
    const end = Math.min(points.count, at + trace.points.length)
    const residual = {
      traceId: trace.id,
      residualsPx: Float32Array.from(fit.residualsPx.subarray(at, end)),
      weights: Float32Array.from(fit.weights.subarray(at, end)),
    }
    at = end
    return residual
  })
}

/** What a person should know of a figure that could be given. */
function worthOfFigure(
  arrow: ReturnType<typeof readPressArrow>,
  supportedShare: number,
  area: MeasuredArea,
  fit: SurfaceFit,
  worstBandUm: number | null,
  minimumZoneUm: number,
  uUm: number,
): Finding[] {
  const found: Finding[] = []
  if (arrow === 'none') found.push(finding('noPressArrow', 'remark'))
  if (arrow === 'unclear') found.push(finding('pressArrowUnclear', 'warning'))
  if (supportedShare < WELL_SUPPORTED_SHARE) {
    found.push(finding('partlySupported', 'warning', { percent: Math.round(100 * supportedShare) }))
  }
  if (area.landPixels.length > 1)
    found.push(finding('landsApart', 'warning', { count: area.landPixels.length }))
  const steepest = fit.slopePerPx.reduce((a, b) => Math.max(a, b), 0)
  if (steepest > 1 / LEAST_SPACING_PX)
    found.push(finding('bandsTooClose', 'warning', { spacingPx: Number((1 / steepest).toFixed(1)) }))
  if (worstBandUm !== null && worstBandUm > (1 + SHOP_METHOD_SHARE) * minimumZoneUm + uUm) {
    found.push(finding('shopMethodDiffers', 'remark', { bandUm: worstBandUm, surfaceUm: minimumZoneUm }))
  }
  return found
}
