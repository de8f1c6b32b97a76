import type { CrossValidation } from './cross-validation'
import { designMatrix, linearCombination } from './design-matrix'
import type { MeasuredPlaces } from './measured-area'
import { createMinimumZoneSolver } from './minimum-zone'
import { drawCoefficientPairs } from './posterior-draws'
import type { SurfaceFit } from './surface-fit'

/** Draws of the whole surface, each taken with its opposite; the spread of so many is known to about a tenth. */
const DRAW_PAIRS = 24
/** Rim places used for draws: the spread needs fewer than the figure itself. */
const DRAW_PLACES = 1800
/**
 * Share of what left-out bands miss that is counted for places between bands that were read: a left-out band
 * lies a whole spacing from its neighbours, a place between bands half of one at most. Chosen on seeded
 * drawings of every kind of face so that U covers.
 */
const SHARE_OF_CROSS_VALIDATION = 0.4
/** No surface model is better than this, bands: structure finer than it and the rim's pixel steps. */
const MODEL_FLOOR_BANDS = 0.0035

/** Contributions to the minimum zone from the clicks and the surface between them, bands. */
export interface SurfaceUncertainty {
  /** Spread of the minimum zone when the surface varies as the clicks' noise lets it. */
  readonly centreLine: number
  /** What the surface may hide between the bands. */
  readonly betweenBands: number
  /** By how much noise widens a peak-to-valley on average (a minimum zone of a noisy surface is too large). */
  readonly bias: number
}

/**
 * Propagates the fit's posterior through the minimum zone itself, which isn't linear, by seeded draws
 * (JCGM 101), and adds what cross-validation says of the surface between the bands.
 *
 * @param minimumZoneBands the figure from the fitted surface
 */
export function surfaceUncertainty(
  fit: SurfaceFit,
  places: MeasuredPlaces,
  crossValidation: CrossValidation,
  minimumZoneBands: number,
): SurfaceUncertainty {
  const stride = Math.max(1, places.count / DRAW_PLACES)
  const picked: number[] = []
  for (let k = 0; k < places.count; k += stride) picked.push(Math.floor(k))
  const xMm = Float64Array.from(picked, (i) => places.xMm[i]!)
  const yMm = Float64Array.from(picked, (i) => places.yMm[i]!)
  const terms = fit.active.length
  const design = designMatrix(fit.basis, fit.active, picked.length, xMm, yMm)
  const centralGaps = linearCombination(design, fit.coefficients, terms, picked.length)
  const draws = drawCoefficientPairs(fit, DRAW_PAIRS)
  const solver = createMinimumZoneSolver(xMm, yMm)
  const central = solver.solve(centralGaps).width
  const gaps = new Float64Array(picked.length)
  let sum = 0
  let sumOfSquares = 0
  for (let d = 0; d < DRAW_PAIRS; d++) {
    const draw = draws.subarray(d * terms, (d + 1) * terms)
    const departures = linearCombination(design, draw, terms, picked.length)
    for (const sign of [1, -1]) {
      for (let i = 0; i < gaps.length; i++) gaps[i] = centralGaps[i]! + sign * departures[i]!
      const deviation = solver.solve(gaps).width - central
      sum += deviation
      sumOfSquares += deviation * deviation
    }
  }
  const count = 2 * DRAW_PAIRS
  const mean = sum / count
  const spread = Math.sqrt(Math.max(0, sumOfSquares - count * mean * mean) / (count - 1))
  const missed = SHARE_OF_CROSS_VALIDATION * Math.min(crossValidation.typicalExcess, minimumZoneBands)
  return {
    centreLine: spread,
    betweenBands: Math.hypot(missed, MODEL_FLOOR_BANDS),
    bias: mean,
  }
}
