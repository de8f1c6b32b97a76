import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64'
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus'
import { solveLowerTransposed } from './cholesky'
import type { SurfaceFit } from './surface-fit'

/** Fixed, so that the same marks give the same figure and the same U every time. */
const SEED = 20_260_113

/**
 * Draws of the surface's coefficients from their posterior, less their mean: antithetic pairs (each draw is
 * followed by its negative), `count` of them (made even), row by row.
 */
export function drawCoefficients(fit: SurfaceFit, count: number): Float64Array {
  const terms = fit.active.length
  const pairs = Math.ceil(count / 2)
  const out = new Float64Array(2 * pairs * terms)
  const random = xoroshiro128plus(SEED)
  const draw = new Float64Array(terms)
  for (let p = 0; p < pairs; p++) {
    for (let a = 0; a < terms; a++) {
      // Box and Muller's transform.
      const radius = Math.sqrt(-2 * Math.log(1 - uniformFloat64(random)))
      draw[a] = radius * Math.cos(2 * Math.PI * uniformFloat64(random))
    }
    solveLowerTransposed(fit.precisionFactor, terms, draw)
    for (let a = 0; a < terms; a++) {
      out[2 * p * terms + a] = draw[a]!
      out[(2 * p + 1) * terms + a] = -draw[a]!
    }
  }
  return out
}
