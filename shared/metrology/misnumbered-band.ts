import { designMatrix } from './design-matrix'
import { solveLeastSquares } from './least-squares'
import type { SurfaceBasis } from './surface-basis'
import type { SurfaceFit } from './surface-fit'
import { pickClicks, type TracedPoints, thinned } from './traced-points'

/** A band that lies farther than this from a simple surface through the others may carry a wrong number. */
const SUSPECT_BANDS = 0.4
const CONFIRMED_BANDS = 0.5
/** A right band left out leaves the fit about as noisy and as bent as it was; a wrong one frees it of both. */
const LESS_NOISE = 0.75
const LESS_BENT = 0.6
/** The simple surface: degree 4, fitted by least absolute departures, which one wrong band can't bend. */
const SIMPLE_FUNCTIONS = 15
const PASSES = 12
/** Clicks that settle so simple a surface. */
const SIMPLE_CLICKS = 480
const LEAST_DEPARTURE_BANDS = 0.02

/**
 * The trace whose number doesn't fit the others', or null. The one farthest from a simple robust surface is suspected;
 * it is confirmed when a full fit without it still puts it half a band and more away, and is plainly quieter or simpler.
 *
 * @param refit fits the given clicks
 * @returns index of the trace in the reading
 */
export function misnumberedTrace(
  points: TracedPoints,
  fit: SurfaceFit,
  refit: (points: TracedPoints) => SurfaceFit | null,
  gapAtClick: (fit: SurfaceFit, click: number) => number,
): number | null {
  const suspect = farthestFromSimple(thinned(points, SIMPLE_CLICKS), fit.basis)
  if (suspect === null) return null
  const others = clicksWithout(points, suspect)
  const without = refit(others)
  if (!without) return null
  const quieter = without.clickNoisePx < LESS_NOISE * fit.clickNoisePx
  const simpler = without.effectiveTerms < LESS_BENT * fit.effectiveTerms
  if (!quieter && !simpler) return null
  let sum = 0
  let count = 0
  for (let i = 0; i < points.count; i++) {
    if (points.traceOf[i] !== suspect) continue
    sum += points.order[i]! - gapAtClick(without, i)
    count++
  }
  return Math.abs(sum / count) > CONFIRMED_BANDS ? suspect : null
}

function farthestFromSimple(points: TracedPoints, basis: SurfaceBasis): number | null {
  const departures = simpleDepartures(points, basis)
  if (!departures) return null
  const byTrace = new Map<number, number[]>()
  departures.forEach((d, i) => {
    const list = byTrace.get(points.traceOf[i]!)
    if (list) list.push(d)
    else byTrace.set(points.traceOf[i]!, [d])
  })
  let suspect: number | null = null
  let worst = SUSPECT_BANDS
  for (const [trace, list] of byTrace) {
    const median = Math.abs(list.sort((a, b) => a - b)[list.length >> 1]!)
    if (median <= worst) continue
    worst = median
    suspect = trace
  }
  return suspect
}

/** Departures of the clicks' orders from the simple surface, bands (least absolute values by reweighting). */
function simpleDepartures(points: TracedPoints, basis: SurfaceBasis): Float64Array | null {
  const picked = Int32Array.from({ length: SIMPLE_FUNCTIONS }, (_, i) => i)
  const design = designMatrix(basis, picked, points.count, points.xMm, points.yMm)
  const columns = Array.from({ length: SIMPLE_FUNCTIONS }, (_, a) =>
    Float64Array.from({ length: points.count }, (_, i) => design[i * SIMPLE_FUNCTIONS + a]!),
  )
  const weights = new Float64Array(points.count).fill(1)
  const departures = new Float64Array(points.count)
  for (let pass = 0; pass < PASSES; pass++) {
    const c = solveLeastSquares(columns, points.order, weights)
    if (!c) return null
    for (let i = 0; i < points.count; i++) {
      let rest = points.order[i]!
      for (let a = 0; a < SIMPLE_FUNCTIONS; a++) rest -= c[a]! * columns[a]![i]!
      departures[i] = rest
      weights[i] = 1 / Math.max(LEAST_DEPARTURE_BANDS, Math.abs(rest))
    }
  }
  return departures
}

function clicksWithout(points: TracedPoints, trace: number): TracedPoints {
  const kept: number[] = []
  for (let i = 0; i < points.count; i++) if (points.traceOf[i] !== trace) kept.push(i)
  return pickClicks(points, kept)
}
