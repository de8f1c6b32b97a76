import { choleskyInPlace, solveLower, solveLowerTransposed } from './cholesky'
import type { SurfaceFit, TracedPoints } from './surface-fit'

export interface CrossValidation {
  /** For each order left out: rms of what the other bands foretell wrongly beyond the clicks' own noise, bands. */
  readonly excessByOrder: ReadonlyMap<number, number>
  /** Median over the orders, bands. */
  readonly typicalExcess: number
}

/**
 * Leaves out one band (all pieces of one order) at a time and asks the rest for it, by the closed form for a
 * block left out of a linear fit: with A the weighted rows of the band and Σ the posterior covariance,
 * error = (I − AΣAᵀ)⁻¹ · residual. Clicks set aside are not asked.
 */
export function leaveOutBands(points: TracedPoints, fit: SurfaceFit): CrossValidation {
  const byOrder = new Map<number, number[]>()
  for (let i = 0; i < points.count; i++) {
    if (fit.weights[i] === 0) continue
    const list = byOrder.get(points.order[i]!)
    if (list) list.push(i)
    else byOrder.set(points.order[i]!, [i])
  }
  const excessByOrder = new Map<number, number>()
  for (const [order, rows] of byOrder) {
    const errors = foretellingErrors(rows, fit)
    if (!errors) continue
    excessByOrder.set(order, excessOverNoise(rows, errors, fit))
  }
  const sorted = [...excessByOrder.values()].sort((a, b) => a - b)
  return { excessByOrder, typicalExcess: sorted[sorted.length >> 1] ?? 0 }
}

/** Order less what the rest foretells, bands, for each click left out; null when the rest foretells nothing. */
function foretellingErrors(rows: readonly number[], fit: SurfaceFit): Float64Array | null {
  const n = rows.length
  const terms = fit.active.length
  const sigma = fit.clickNoisePx
  const influence = new Float64Array(n * terms)
  const error = new Float64Array(n)
  const row = new Float64Array(terms)
  rows.forEach((i, k) => {
    const scale = Math.sqrt(fit.weights[i]!) / (sigma * fit.slopePerPx[i]!)
    for (let a = 0; a < terms; a++) row[a] = fit.design[i * terms + a]! * scale
    solveLower(fit.precisionFactor, terms, row)
    influence.set(row, k * terms)
    error[k] = (fit.residualsPx[i]! * Math.sqrt(fit.weights[i]!)) / sigma
  })
  const system = new Float64Array(n * n)
  for (let a = 0; a < n; a++) {
    for (let b = 0; b <= a; b++) {
      let sum = 0
      for (let t = 0; t < terms; t++) sum += influence[a * terms + t]! * influence[b * terms + t]!
      system[a * n + b] = (a === b ? 1 : 0) - sum
    }
  }
  // Without this band the free functions may not be determined at all: then it foretells nothing.
  if (!choleskyInPlace(system, n)) return null
  solveLower(system, n, error)
  solveLowerTransposed(system, n, error)
  return error.map((e, k) => {
    const i = rows[k]!
    return (e * sigma * fit.slopePerPx[i]!) / Math.sqrt(Math.max(1e-6, fit.weights[i]!))
  })
}

function excessOverNoise(rows: readonly number[], errors: Float64Array, fit: SurfaceFit): number {
  let sum = 0
  rows.forEach((i, k) => {
    sum += errors[k]! ** 2 - (fit.clickNoisePx * fit.slopePerPx[i]!) ** 2
  })
  return Math.sqrt(Math.max(0, sum) / rows.length)
}
