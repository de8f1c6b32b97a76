import { solveLeastSquares } from './least-squares'
import type { FormTerms, FormWord } from './types'

/** Heights at places of the measured area, as the form is read from them. */
export interface SampledForm {
  readonly xMm: Float64Array
  readonly yMm: Float64Array
  /** Area that each place stands for; 0 for rim places, which count for extremes only. */
  readonly weightMm2: Float64Array
  readonly heightUm: Float64Array
  /** Distance of each place from the outline, mm. */
  readonly rimDistanceMm: Float64Array
}

export interface FormScales {
  /** Diameter of a round face, longer side of a block. */
  readonly acrossMm: number
  readonly edgeBandMm: number
}

/** What the form is made of, with high counted up; the caller turns signs when the press arrow is missing. */
export interface FormFit {
  /** Middle over rim of the best sphere over `acrossMm`; plus is high in the middle. */
  sagittaUm: number
  spherePeakToValleyUm: number
  saddlePeakToValleyUm: number
  saddleHighAxisDeg: number
  edgeDropUm: number
  edgeDropWidthMm: number
  edgeDropWorstHour: number | null
  /** Middle over the inside of the rolled rim, from the part of the face that the roll doesn't reach. */
  innerSagittaUm: number
  remainderRmsUm: number
}

/**
 * Part of the face's size that counts as its very rim: it has its own step beside the sphere, so that the last
 * tenths of a millimetre of a rolled edge don't bend the sphere.
 */
const RIM_SHARE = 1 / 40
/** Width over which a rolled rim is told of, as a share of the face's size: 2 mm on a 40 mm disc. */
const ROLL_SHARE = 1 / 20

/**
 * Sphere, saddle and rim of a form by weighted least squares:
 * h = piston + tilts + p·(x² + y²) + saddles (x² − y², 2xy) + step at the rim. The sagitta is −p·(across/2)²;
 * null where the places don't determine it.
 */
export function fitForm(form: SampledForm, scales: FormScales): FormFit | null {
  const half = scales.acrossMm / 2
  const n = form.xMm.length
  const u = form.xMm.map((x) => x / half)
  const v = form.yMm.map((y) => y / half)
  const one = new Float64Array(n).fill(1)
  const sphere = u.map((x, i) => x * x + v[i]! * v[i]!)
  const saddle0 = u.map((x, i) => x * x - v[i]! * v[i]!)
  const saddle45 = u.map((x, i) => 2 * x * v[i]!)
  const rimWidth = scales.acrossMm * RIM_SHARE
  const step = form.rimDistanceMm.map((d) => (d < rimWidth ? 1 : 0))
  const smooth = [one, u, v, sphere, saddle0, saddle45]
  const withStep = weightIn(step, form.weightMm2) > 0 ? [...smooth, step] : smooth
  const c = solveLeastSquares(withStep, form.heightUm, form.weightMm2)
  if (!c) return null
  const [, , , p, a0, a45] = c as unknown as number[]
  const roll = rolledRim(form, scales, smooth)
  return {
    sagittaUm: -p!,
    spherePeakToValleyUm: Math.abs(p!) * peakToValley(sphere),
    saddlePeakToValleyUm: peakToValley(saddle0.map((s, i) => a0! * s + a45! * saddle45[i]!)),
    saddleHighAxisDeg: (Math.atan2(a45!, a0!) * 90) / Math.PI,
    ...roll,
    remainderRmsUm: remainderRms(form, withStep, c),
  }
}

/**
 * Edge drop: mean height of the outer millimetres less that of the best low-order form of the rest, carried on
 * outwards (negative: rolled down); and the clock hour where it drops most, where that stands out by a third.
 */
function rolledRim(
  form: SampledForm,
  scales: FormScales,
  smooth: readonly Float64Array[],
): Pick<FormFit, 'edgeDropUm' | 'edgeDropWidthMm' | 'edgeDropWorstHour' | 'innerSagittaUm'> {
  const widthMm = scales.edgeBandMm + scales.acrossMm * ROLL_SHARE
  const inner = form.weightMm2.map((w, i) => (form.rimDistanceMm[i]! > widthMm ? w : 0))
  const none = { edgeDropUm: 0, edgeDropWidthMm: widthMm, edgeDropWorstHour: null, innerSagittaUm: 0 }
  const c = solveLeastSquares(smooth, form.heightUm, inner)
  if (!c) return none
  const sums = new Float64Array(12)
  const counts = new Float64Array(12)
  for (let i = 0; i < form.heightUm.length; i++) {
    if (form.rimDistanceMm[i]! > widthMm || form.weightMm2[i] === 0) continue
    let expected = 0
    for (let k = 0; k < c.length; k++) expected += c[k]! * smooth[k]![i]!
    const hour = Math.round((Math.atan2(form.xMm[i]!, -form.yMm[i]!) * 6) / Math.PI + 12) % 12
    sums[hour] = sums[hour]! + form.heightUm[i]! - expected
    counts[hour] = counts[hour]! + 1
  }
  const total = counts.reduce((a, b) => a + b, 0)
  if (total === 0) return { ...none, innerSagittaUm: -c[3]! }
  const edgeDropUm = sums.reduce((a, b) => a + b, 0) / total
  let worst = -1
  for (let h = 0; h < 12; h++) {
    if (counts[h] === 0) continue
    if (worst < 0 || sums[h]! / counts[h]! < sums[worst]! / counts[worst]!) worst = h
  }
  const worstDrop = worst < 0 ? 0 : sums[worst]! / counts[worst]!
  const standsOut = worst >= 0 && worstDrop < 0 && worstDrop < 1.33 * edgeDropUm
  return {
    edgeDropUm,
    edgeDropWidthMm: widthMm,
    edgeDropWorstHour: standsOut ? (worst === 0 ? 12 : worst) : null,
    innerSagittaUm: -c[3]!,
  }
}

function weightIn(share: Float64Array, weights: Float64Array): number {
  return share.reduce((sum, s, i) => sum + s * weights[i]!, 0)
}

function peakToValley(values: Float64Array): number {
  let low = Number.POSITIVE_INFINITY
  let high = Number.NEGATIVE_INFINITY
  for (const value of values) {
    low = Math.min(low, value)
    high = Math.max(high, value)
  }
  return values.length === 0 ? 0 : high - low
}

function remainderRms(form: SampledForm, columns: readonly Float64Array[], c: Float64Array): number {
  let sum = 0
  let area = 0
  for (let i = 0; i < form.heightUm.length; i++) {
    let rest = form.heightUm[i]!
    for (let k = 0; k < c.length; k++) rest -= c[k]! * columns[k]![i]!
    sum += form.weightMm2[i]! * rest * rest
    area += form.weightMm2[i]!
  }
  return area > 0 ? Math.sqrt(sum / area) : 0
}

/**
 * The form in one word: sphere (convex or concave) or saddle, whichever has the larger peak-to-valley, if that
 * exceeds U; else flat; irregular where neither explains half of the flatness. Without a press arrow a sphere's
 * sign is unknown.
 */
export function formWord(
  fit: FormFit,
  flatnessUm: number,
  expandedUncertaintyUm: number,
  signKnown: boolean,
): FormWord {
  const larger = Math.max(fit.spherePeakToValleyUm, fit.saddlePeakToValleyUm)
  if (flatnessUm > expandedUncertaintyUm && larger < flatnessUm / 2) return 'irregular'
  if (larger <= expandedUncertaintyUm) return 'flat'
  if (fit.saddlePeakToValleyUm > fit.spherePeakToValleyUm) return 'saddle'
  if (!signKnown) return 'unknown'
  return fit.sagittaUm > 0 ? 'convex' : 'concave'
}

export interface FormStatement {
  code: string
  params: Readonly<Record<string, string | number>>
}

/**
 * The form in sentences (locale files, `form.<code>`): only what stands out of U is told; "flat within the
 * reading" when nothing does. Heights are in µm for the reader's unit to be put in.
 */
export function formStatements(
  fit: FormFit,
  terms: FormTerms,
  form: FormWord,
  expandedUncertaintyUm: number,
  signKnown: boolean,
): FormStatement[] {
  const statements: FormStatement[] = []
  const stands = (um: number) => Math.abs(um) > expandedUncertaintyUm
  const rolled = fit.edgeDropUm < 0 && stands(fit.edgeDropUm)
  const middleUm = rolled ? fit.innerSagittaUm : fit.sagittaUm
  if (form === 'saddle' && signKnown && terms.saddleHighAxisDeg !== null) {
    const hour = clockHourOf(terms.saddleHighAxisDeg)
    statements.push({
      code: 'saddle',
      params: {
        heightUm: fit.saddlePeakToValleyUm,
        high: hour,
        highOpposite: oppositeHour(hour),
        low: quarterOn(hour),
        lowOpposite: oppositeHour(quarterOn(hour)),
      },
    })
  } else if (form === 'saddle') {
    statements.push({ code: 'saddleUnsigned', params: { heightUm: fit.saddlePeakToValleyUm } })
  }
  if (stands(middleUm)) {
    const code = signKnown ? (middleUm > 0 ? 'highMiddle' : 'hollow') : 'bowedUnsigned'
    statements.push({ code, params: { heightUm: Math.abs(middleUm) } })
  }
  if (rolled && signKnown) {
    const params = { heightUm: Math.abs(fit.edgeDropUm), widthMm: fit.edgeDropWidthMm }
    const hour = fit.edgeDropWorstHour
    statements.push(
      hour === null ? { code: 'rolledRim', params } : { code: 'rolledRimAt', params: { ...params, hour } },
    )
  }
  if (statements.length === 0)
    statements.push({ code: form === 'irregular' ? 'irregular' : 'flatWithinReading', params: {} })
  return statements
}

/** Clock hour (1 to 12, 12 at the top) that a direction from x towards y (down) points to. */
function clockHourOf(directionDeg: number): number {
  const hour = Math.round((directionDeg + 90) / 30)
  return ((((hour - 1) % 12) + 12) % 12) + 1
}

function oppositeHour(hour: number): number {
  return hour > 6 ? hour - 6 : hour + 6
}

function quarterOn(hour: number): number {
  return hour > 9 ? hour - 9 : hour + 3
}
