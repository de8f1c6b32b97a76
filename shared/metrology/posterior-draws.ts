import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64'
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus'
import { solveLowerTransposed } from './cholesky'
import type { SurfaceFit } from './surface-fit'

/** Fixed, so that the same marks give the same figure and the same U every time. */
const SEED = 20_260_113

/**
 * Draws of the surface's coefficients from their posterior, less their mean, row by row. Each stands for a pair,
 * itself and its opposite, which is as likely (antithetic draws).
 */
export function drawCoefficientPairs(fit: SurfaceFit, pairs: number): Float64Array {
  const terms = fit.active.length
  const out = new Float64Array(pairs * terms)
  const random = xoroshiro128plus(SEED)
  for (let p = 0; p < pairs; p++) {
    const draw = out.subarray(p * terms, (p + 1) * terms)
    for (let a = 0; a < terms; a++) {
      // Box and Muller's transform.
      const radius = Math.sqrt(-2 * Math.log(1 - uniformFloat64(random)))
      draw[a] = radius * Math.cos(2 * Math.PI * uniformFloat64(random))
    }
    solveLowerTransposed(fit.precisionFactor, terms, draw)
  }
  return out
}
