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
    const excess = leaveOut(rows, fit)
    if (excess !== null) excessByOrder.set(order, excess)
  }
  const sorted = [...excessByOrder.values()].sort((a, b) => a - b)
  return { excessByOrder, typicalExcess: sorted[sorted.length >> 1] ?? 0 }
}

function leaveOut(rows: readonly number[], fit: SurfaceFit): number | null {
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
  let sum = 0
  let noise = 0
  rows.forEach((i, k) => {
    const slope = fit.slopePerPx[i]!
    sum += (error[k]! * sigma * slope) ** 2 / Math.max(1e-6, fit.weights[i]!)
    noise += (sigma * slope) ** 2
  })
  return Math.sqrt(Math.max(0, sum - noise) / n)
}
