import { choleskyInPlace, solveLower, solveLowerRows, solveLowerTransposed } from './cholesky'
import { meanRows, meanValues, runsOfClicks } from './click-runs'
import type { SurfaceFit } from './surface-fit'
import type { TracedPoints } from './traced-points'

export interface CrossValidation {
  /** For each order left out: rms of what the other bands foretell wrongly beyond the clicks' own noise, bands. */
  readonly excessByOrder: ReadonlyMap<number, number>
  /** Median over the orders, bands. */
  readonly typicalExcess: number
}

/** Places along a band that show how wrongly it is foretold; more clicks are taken in runs. */
const PLACES_ALONG_A_BAND = 24

/** Rows of one band, or runs of them, each divided by its standard deviation. */
interface BandRows {
  count: number
  design: Float64Array
  residual: Float64Array
  /** Standard deviation of each row, bands, and how many clicks it stands for. */
  sdBands: Float64Array
  clicks: Int32Array
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
  for (const [order, clicks] of byOrder) {
    const rows = bandRows(points, fit, clicks)
    const errors = foretellingErrors(rows, fit)
    if (errors) excessByOrder.set(order, excessOverNoise(rows, errors))
  }
  const sorted = [...excessByOrder.values()].sort((a, b) => a - b)
  return { excessByOrder, typicalExcess: sorted[sorted.length >> 1] ?? 0 }
}

function bandRows(points: TracedPoints, fit: SurfaceFit, clicks: readonly number[]): BandRows {
  const terms = fit.active.length
  const design = new Float64Array(clicks.length * terms)
  clicks.forEach((i, k) => {
    design.set(fit.design.subarray(i * terms, (i + 1) * terms), k * terms)
  })
  const weight = clicks.map((i) => fit.weights[i]! / (fit.clickNoisePx * fit.slopePerPx[i]!) ** 2)
  const residualBands = clicks.map((i) => fit.residualsPx[i]! * fit.slopePerPx[i]!)
  const runs = runsOfClicks(
    clicks.map((i) => points.traceOf[i]!),
    clicks.length,
    Math.ceil(clicks.length / PLACES_ALONG_A_BAND),
  )
  const means = meanRows(runs, design, terms, weight)
  const residual = meanValues(runs, residualBands, weight)
  const sdBands = means.rowWeight.map((w) => 1 / Math.sqrt(w))
  for (let r = 0; r < runs.count; r++) {
    const root = 1 / sdBands[r]!
    residual[r] = residual[r]! * root
    for (let a = r * terms; a < (r + 1) * terms; a++) means.design[a] = means.design[a]! * root
  }
  return {
    count: runs.count,
    design: means.design,
    residual,
    sdBands,
    clicks: Int32Array.from({ length: runs.count }, (_, r) => runs.starts[r + 1]! - runs.starts[r]!),
  }
}

/** Order less what the rest foretells, bands, for each row left out; null when the rest foretells nothing. */
function foretellingErrors(rows: BandRows, fit: SurfaceFit): Float64Array | null {
  const n = rows.count
  const terms = fit.active.length
  const influence = rows.design
  solveLowerRows(fit.precisionFactor, terms, influence, n)
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
  const error = rows.residual.slice()
  solveLower(system, n, error)
  solveLowerTransposed(system, n, error)
  return error.map((e, k) => e * rows.sdBands[k]!)
}

function excessOverNoise(rows: BandRows, errors: Float64Array): number {
  let sum = 0
  let clicks = 0
  errors.forEach((error, k) => {
    sum += rows.clicks[k]! * (error ** 2 - rows.sdBands[k]! ** 2)
    clicks += rows.clicks[k]!
  })
  return Math.sqrt(Math.max(0, sum) / clicks)
}
