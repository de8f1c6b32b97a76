import { choleskyInPlace, invertLower, solveLower, solveLowerTransposed } from './cholesky'
import { type ClickRuns, meanRows, meanValues, runsOfClicks } from './click-runs'
import { accumulateNormalEquations, designMatrix, linearCombination, pickColumns } from './design-matrix'
import type { SurfaceBasis } from './surface-basis'
import { type TracedPoints, thinned } from './traced-points'

export interface SurfaceFit {
  readonly basis: SurfaceBasis
  /** The functions that the data left in play; the others count as zero. */
  readonly active: Int32Array
  /** Gap in bands = Σ coefficients × active functions. */
  readonly coefficients: Float64Array
  /** The fitted gap at a place of the part frame, bands. */
  gapAt(xMm: number, yMm: number): number
  /** Lower Cholesky factor of the posterior precision (bands⁻²) of the active functions, row-major. */
  readonly precisionFactor: Float64Array
  /** Standard deviation of a click square to its band. */
  readonly clickNoisePx: number
  readonly effectiveTerms: number
  /** Signed distance of each click from the fitted band, px, and its robust weight 0 to 1. */
  readonly residualsPx: Float64Array
  readonly weights: Float64Array
  /** Slope of the gap at each click, bands per px, floored where the gap is level. */
  readonly slopePerPx: Float64Array
  /** Active functions at the clicks, row by row. */
  readonly design: Float64Array
  readonly iterations: number
  readonly converged: boolean
  /** Estimated deviation of each variance component, bands. */
  readonly componentSd: Float64Array
  /** For each active function, how far the data determine it, 0 to 1. */
  readonly determined: Float64Array
}

/** Clicks beyond this many standard deviations lose weight (Huber 1964; 1.345 is 95 % efficient, wider spares good ones). */
const HUBER_LIMIT = 2.5
/** A click beyond this many lies on another band or is a slip: it gets none. */
const SET_ASIDE_LIMIT = 5
/** No hand and no program finds a band's centre better than this; it keeps exact clicks from asking for every function. */
const LEAST_CLICK_NOISE_PX = 0.05
/** What a hand's error usually is, worth so many clicks beside the clicks themselves: few clicks can't deny it. */
const USUAL_CLICK_NOISE_PX = 0.5
const USUAL_NOISE_WORTH = 8
const REWEIGHTINGS = 8
const EVIDENCE_STEPS = 8
/** For weights that are about to change, and for a smoothness that has settled before. */
const FEW_EVIDENCE_STEPS = 3
/** The evidence has settled when no component that matters changes its deviation by more than this share. */
const SETTLED_SHARE = 0.05
/** Prior deviation that every shrunk component starts from, bands: a loose start invents form where there are no bands. */
const STARTING_SD_BANDS = 0.02
/** The free functions are as good as unbounded, bands. */
const FREE_SD_BANDS = 1e3
const LEAST_SD_BANDS = 1e-6
/** A function whose prior lets it explain less than this share of what the data can see is left out. */
const NEGLIGIBLE_INFORMATION = 1e-3
/** Clicks that suffice to choose the functions. */
const ENOUGH_TO_CHOOSE = 700
/** Rows that suffice to fit the chosen functions; more clicks are taken in runs of neighbours. */
const ENOUGH_ROWS = 1200

/**
 * Fits the gap through the clicks: least squares weighted by each click's own error, Huber weights against
 * slips, and a prior variance for every function that is a sum of few components, re-estimated from the data
 * by evidence (MacKay, Neural Computation 4, 415 (1992)), so that the clicks themselves choose the smoothness.
 *
 * @throws RangeError when the clicks don't determine even the free functions.
 */
export function fitSurface(points: TracedPoints, basis: SurfaceBasis): SurfaceFit {
  const everything = Int32Array.from({ length: basis.size }, (_, i) => i)
  const scales = new Float64Array(basis.components.length).fill(STARTING_SD_BANDS ** 2)
  if (points.count <= ENOUGH_TO_CHOOSE) return refine(new Fitting(points, basis, everything, scales))
  // Few clicks choose the functions as well as many; only those chosen are then fitted to all clicks.
  const chosen = refine(new Fitting(thinned(points, ENOUGH_TO_CHOOSE), basis, everything, scales))
  const fit = new Fitting(
    points,
    basis,
    chosen.active,
    chosen.componentSd.map((sd) => sd * sd),
  )
  fit.beginFrom(chosen.coefficients)
  return refine(fit)
}

/** The fitted gap at places of the part frame, bands. */
export function gapsAt(fit: SurfaceFit, xMm: Float64Array, yMm: Float64Array): Float64Array {
  return xMm.map((x, i) => fit.gapAt(x, yMm[i]!))
}

/** The fitted gap as a function of the place in the part frame, bands. */
function gapFunction(
  basis: SurfaceBasis,
  active: Int32Array,
  coefficients: Float64Array,
): (xMm: number, yMm: number) => number {
  const all = new Float64Array(basis.size)
  active.forEach((f, a) => {
    all[f] = coefficients[a]!
  })
  return basis.combine(all)
}

function refine(fit: Fitting): SurfaceFit {
  let iterations = 0
  let seeing = 0
  let converged = false
  while (iterations < REWEIGHTINGS && !converged) {
    const before = fit.noise
    const isBlind = !fit.knowsSlopes
    const settled = fit.settleEvidence(isBlind || fit.beganFromFit ? FEW_EVIDENCE_STEPS : EVIDENCE_STEPS)
    fit.reweigh()
    iterations++
    // The weights that came of a blind pass are no test of convergence, nor are those that came of the next.
    if (!isBlind) seeing++
    const enough = seeing >= (fit.beganFromFit ? 1 : 2)
    // A fit that began from another's surface has that one's smoothness, which has settled.
    converged = (settled || fit.beganFromFit) && enough && Math.abs(fit.noise - before) < 0.005 * fit.noise
    if (!converged) fit.leaveOutNegligible()
  }
  if (!converged) fit.settleEvidence(1)
  fit.measureResiduals()
  return fit.result(iterations, converged)
}

/** The state of one fit; every array is allocated once and shrinks only when functions are left out. */
class Fitting {
  noise = 0.1
  /** Whether weights and noise are in px yet; at first they are in bands. */
  private inPixels = false
  beganFromFit = false
  private readonly count: number
  private readonly runs: ClickRuns
  private active: Int32Array
  private design: Float64Array
  private gram: Float64Array
  private moment: Float64Array
  private precision: Float64Array
  private inverse: Float64Array
  private coefficients: Float64Array
  private priorVariance: Float64Array
  private readonly scales: Float64Array
  private readonly weights: Float64Array
  private readonly rowWeight: Float64Array
  private readonly slope: Float64Array
  private readonly residualsPx: Float64Array
  private effectiveTerms = 0
  private determined = new Float64Array(0)

  constructor(
    private readonly points: TracedPoints,
    private readonly basis: SurfaceBasis,
    active: Int32Array,
    scales: Float64Array,
  ) {
    const { count } = points
    this.count = count
    this.runs = runsOfClicks(points.traceOf, count, Math.ceil(count / ENOUGH_ROWS))
    this.active = active
    this.scales = scales
    this.design = designMatrix(basis, active, count, points.xMm, points.yMm)
    // The first pass knows no slopes: every click weighs the same, with an error of a tenth of a band.
    this.weights = new Float64Array(count).fill(1)
    this.rowWeight = new Float64Array(count).fill(1)
    this.slope = new Float64Array(count).fill(1)
    this.residualsPx = new Float64Array(count)
    const terms = active.length
    this.gram = new Float64Array(terms * terms)
    this.precision = new Float64Array(terms * terms)
    this.inverse = new Float64Array(terms * terms)
    this.moment = new Float64Array(terms)
    this.coefficients = new Float64Array(terms)
    this.priorVariance = new Float64Array(terms)
  }

  get knowsSlopes(): boolean {
    return this.inPixels
  }

  /** Takes slopes, weights and noise from a surface that was fitted to some of the clicks. */
  beginFrom(coefficients: Float64Array): void {
    this.coefficients.set(coefficients)
    this.effectiveTerms = 0
    this.reweigh()
    this.beganFromFit = true
  }

  /** Re-estimates the components' variances with the weights as they are; true when they have settled. */
  settleEvidence(steps: number): boolean {
    const terms = this.active.length
    const rows = this.rowsToFit()
    accumulateNormalEquations(
      rows.design,
      rows.order,
      rows.rowWeight,
      this.runs.count,
      terms,
      this.gram,
      this.moment,
    )
    let settled = false
    for (let step = 0; step < steps && !settled; step++) {
      this.mixVariances()
      this.solvePosterior()
      invertLower(this.precision, terms, this.inverse)
      settled = this.updateScales() < SETTLED_SHARE
      this.noise = this.weightedNoise()
    }
    this.mixVariances()
    this.solvePosterior()
    return settled
  }

  /** The clicks, or their runs where there are more than the fit needs. */
  private rowsToFit(): { design: Float64Array; order: Float64Array; rowWeight: Float64Array } {
    const { runs, design, rowWeight, points } = this
    if (runs.count === this.count) return { design, order: points.order, rowWeight }
    return {
      ...meanRows(runs, design, this.active.length, rowWeight),
      order: meanValues(runs, points.order, rowWeight),
    }
  }

  private mixVariances(): void {
    const { basis, active, priorVariance, scales } = this
    const terms = active.length
    for (let a = 0; a < terms; a++) {
      const f = active[a]!
      if (f < basis.freeCount) {
        priorVariance[a] = FREE_SD_BANDS * FREE_SD_BANDS
        continue
      }
      let variance = LEAST_SD_BANDS * LEAST_SD_BANDS
      for (let k = 0; k < scales.length; k++) variance += scales[k]! * basis.components[k]!.profile[f]!
      priorVariance[a] = variance
    }
  }

  private solvePosterior(): void {
    const { gram, moment, precision, coefficients, priorVariance } = this
    const terms = this.active.length
    const scale = 1 / (this.noise * this.noise)
    for (let a = 0; a < terms; a++) {
      const row = a * terms
      for (let b = 0; b <= a; b++) precision[row + b] = gram[row + b]! * scale
      precision[row + a] = precision[row + a]! + 1 / priorVariance[a]!
      coefficients[a] = moment[a]! * scale
    }
    if (!choleskyInPlace(precision, terms)) throw new RangeError('the clicks do not determine a surface')
    solveLower(precision, terms, coefficients)
    solveLowerTransposed(precision, terms, coefficients)
  }

  /**
   * Fixed-point step of the components' variances towards greatest evidence: where the evidence is
   * stationary, Σ profile·(c/v)² equals Σ profile·(v − Σjj)/v². Returns the largest relative change of a
   * component that matters.
   */
  private updateScales(): number {
    const { basis, active, inverse, priorVariance, coefficients, scales } = this
    const terms = active.length
    // Σ = L⁻ᵀ·L⁻¹, so its diagonal is the sum of squares down each column of L⁻¹.
    const posteriorVariance = new Float64Array(terms)
    for (let i = 0; i < terms; i++) {
      const row = i * terms
      for (let j = 0; j <= i; j++) {
        const value = inverse[row + j]!
        posteriorVariance[j] = posteriorVariance[j]! + value * value
      }
    }
    this.determined = posteriorVariance.map((variance, a) => Math.max(0, 1 - variance / priorVariance[a]!))
    this.effectiveTerms = this.determined.reduce((a, b) => a + b, 0)
    let largestChange = 0
    basis.components.forEach(({ profile }, k) => {
      let energy = 0
      let room = 0
      let determined = 0
      for (let a = 0; a < terms; a++) {
        const share = profile[active[a]!]!
        if (share === 0) continue
        const v = priorVariance[a]!
        const ratio = coefficients[a]! / v
        energy += share * ratio * ratio
        room += (share * Math.max(0, v - posteriorVariance[a]!)) / (v * v)
        determined += (scales[k]! * share * Math.max(0, v - posteriorVariance[a]!)) / (v * v)
      }
      const step = room > 0 ? energy / room : 1
      const bounded = Math.min(16, Math.max(1 / 16, step))
      scales[k] = Math.max(1e-12, scales[k]! * bounded)
      if (determined > 0.05) largestChange = Math.max(largestChange, Math.abs(Math.sqrt(bounded) - 1))
    })
    return largestChange
  }

  private weightedNoise(): number {
    const fitted = linearCombination(this.design, this.coefficients, this.active.length, this.count)
    let sum = 0
    let used = 0
    for (let i = 0; i < this.count; i++) {
      const w = this.rowWeight[i]!
      if (w === 0) continue
      const r = this.points.order[i]! - fitted[i]!
      sum += w * r * r
      used++
    }
    return this.noiseOf(sum, used)
  }

  private noiseOf(weightedSquares: number, used: number): number {
    const freedom = Math.max(1, used - this.effectiveTerms)
    if (!this.inPixels) return Math.max(1e-6, Math.sqrt(weightedSquares / freedom))
    const usual = USUAL_NOISE_WORTH * USUAL_CLICK_NOISE_PX ** 2
    return Math.sqrt((weightedSquares + usual) / (freedom + USUAL_NOISE_WORTH))
  }

  /** Residuals in px, robust weights, row weights and click noise from the surface as it stands. */
  reweigh(): void {
    this.measureSlopes()
    this.inPixels = true
    this.measureResiduals()
    const { count, residualsPx, weights, rowWeight, slope } = this
    const freedom = Math.max(1, count - this.effectiveTerms)
    const scale = robustScale(residualsPx) * Math.sqrt(count / freedom)
    let sum = 0
    let used = 0
    for (let i = 0; i < count; i++) {
      const z = Math.abs(residualsPx[i]!) / scale
      weights[i] = z <= HUBER_LIMIT ? 1 : z <= SET_ASIDE_LIMIT ? HUBER_LIMIT / z : 0
      rowWeight[i] = weights[i]! / (slope[i]! * slope[i]!)
      if (weights[i]! === 0) continue
      sum += weights[i]! * residualsPx[i]! * residualsPx[i]!
      used++
    }
    this.noise = this.noiseOf(sum, used)
  }

  /** Distances of the clicks from the fitted bands, px, by the slopes that weigh them. */
  measureResiduals(): void {
    const fitted = linearCombination(this.design, this.coefficients, this.active.length, this.count)
    for (let i = 0; i < this.count; i++) {
      this.residualsPx[i] = (this.points.order[i]! - fitted[i]!) / this.slope[i]!
    }
  }

  private measureSlopes(): void {
    const { count, points, slope } = this
    const gap = gapFunction(this.basis, this.active, this.coefficients)
    let sumOfSquares = 0
    for (let i = 0; i < count; i++) {
      const here = gap(points.xMm[i]!, points.yMm[i]!)
      const right = gap(points.xMmRight[i]!, points.yMmRight[i]!) - here
      const down = gap(points.xMmDown[i]!, points.yMmDown[i]!) - here
      slope[i] = Math.sqrt(right * right + down * down)
      sumOfSquares += right * right + down * down
    }
    // Where the gap is level (the middle of a saddle or of rings) the click's error acts through the
    // curvature instead: a floor keeps such a click from outweighing all others.
    const floor = 0.15 * Math.sqrt(sumOfSquares / Math.max(1, count))
    for (let i = 0; i < count; i++) slope[i] = Math.max(slope[i]!, floor)
  }

  /** Drops functions that the prior has shrunk to nothing, so that later steps are quicker. */
  leaveOutNegligible(): void {
    const terms = this.active.length
    const scale = 1 / (this.noise * this.noise)
    const kept: number[] = []
    for (let a = 0; a < terms; a++) {
      const free = this.active[a]! < this.basis.freeCount
      let information = 0
      for (let i = 0; i < this.count; i++) {
        const f = this.design[i * terms + a]!
        information += this.rowWeight[i]! * f * f
      }
      if (free || this.priorVariance[a]! * information * scale > NEGLIGIBLE_INFORMATION) kept.push(a)
    }
    if (kept.length === terms) return
    this.design = pickColumns(this.design, this.count, terms, kept)
    this.active = Int32Array.from(kept, (a) => this.active[a]!)
  }

  result(iterations: number, converged: boolean): SurfaceFit {
    const terms = this.active.length
    return {
      basis: this.basis,
      active: this.active,
      coefficients: this.coefficients.slice(0, terms),
      gapAt: gapFunction(this.basis, this.active, this.coefficients),
      precisionFactor: this.precision.slice(0, terms * terms),
      clickNoisePx: this.noise,
      effectiveTerms: this.effectiveTerms,
      residualsPx: this.residualsPx,
      weights: this.weights,
      slopePerPx: this.slope,
      design: this.design,
      iterations,
      converged,
      componentSd: this.scales.map(Math.sqrt),
      determined: this.determined,
    }
  }
}

/** Median of |residual| made equal to the standard deviation of a normal distribution. */
function robustScale(residualsPx: Float64Array): number {
  const sorted = residualsPx.map(Math.abs).sort()
  return Math.max(LEAST_CLICK_NOISE_PX, 1.4826 * (sorted[sorted.length >> 1] ?? 0))
}
