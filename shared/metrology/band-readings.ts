import type { PartFrame } from '../geometry/part-frame'
import type { Trace } from '../schemas/marks'
import { solveLeastSquares } from './least-squares'
import type { BandReading } from './types'

type Place = readonly [number, number]

/** A band as the straightedge sees it: t along the chord, s square to it, mm. */
interface LaidBand {
  trace: Trace & { order: number }
  points: readonly Place[]
}

/** A band whose ends are nearer than this share of its length is a ring: no chord can be laid. */
const RING_SHARE = 0.35
const LEAST_POINTS = 4

/**
 * The shop's reading of every open band: the chord through the band's ends, the bow (greatest departure square
 * to it), the spacing to the next band of the next order at the same place (mean of both sides where both
 * exist), and bow ÷ spacing × band height. Bands without a neighbour, and rings, give none. Measured in the
 * part frame, so that a camera at an angle does no harm; told in photo pixels.
 */
export function readBands(traces: readonly Trace[], frame: PartFrame, bandUm: number): BandReading[] {
  const bands = traces.flatMap((trace): LaidBand[] => {
    if (trace.order === null || trace.points.length < LEAST_POINTS) return []
    return [
      { trace: { ...trace, order: trace.order }, points: trace.points.map(([x, y]) => frame.toMm(x, y)) },
    ]
  })
  return bands.flatMap((band) => readBand(band, bands, frame, bandUm) ?? [])
}

function readBand(
  band: LaidBand,
  bands: readonly LaidBand[],
  frame: PartFrame,
  bandUm: number,
): BandReading | null {
  const first = band.points[0]!
  const last = band.points[band.points.length - 1]!
  const chordMm = Math.hypot(last[0] - first[0], last[1] - first[1])
  if (chordMm < RING_SHARE * pathLength(band.points)) return null
  const along: Place = [(last[0] - first[0]) / chordMm, (last[1] - first[1]) / chordMm]
  const square: Place = [-along[1], along[0]]
  const curve = smoothCurve(band.points, first, along, square, chordMm)
  if (!curve) return null
  const bow = greatestBow(curve, chordMm)
  const at: Place = [
    first[0] + along[0] * bow.t + square[0] * bow.s,
    first[1] + along[1] * bow.t + square[1] * bow.s,
  ]
  const spacingMm = spacingAt(band, bands, at, square)
  if (spacingMm === null) return null
  const scale = frame.mmPerPx(...frame.toPx(at[0], at[1]))
  return {
    traceId: band.trace.id,
    order: band.trace.order,
    bowPx: Math.abs(bow.bow) / scale,
    spacingPx: spacingMm / scale,
    flatnessUm: (Math.abs(bow.bow) / spacingMm) * bandUm,
    chord: [frame.toPx(first[0], first[1]), frame.toPx(last[0], last[1])],
    bowAt: frame.toPx(at[0], at[1]),
  }
}

function pathLength(points: readonly Place[]): number {
  let length = 0
  for (let i = 1; i < points.length; i++) {
    length += Math.hypot(points[i]![0] - points[i - 1]![0], points[i]![1] - points[i - 1]![1])
  }
  return length
}

/** The band as a polynomial s(t), so that one shaky click isn't taken for the bow. */
function smoothCurve(
  points: readonly Place[],
  origin: Place,
  along: Place,
  square: Place,
  chordMm: number,
): ((t: number) => number) | null {
  const t = Float64Array.from(
    points,
    ([x, y]) => ((x - origin[0]) * along[0] + (y - origin[1]) * along[1]) / chordMm,
  )
  const s = Float64Array.from(points, ([x, y]) => (x - origin[0]) * square[0] + (y - origin[1]) * square[1])
  const degree = Math.min(4, Math.floor(points.length / 3) + 1)
  const columns = Array.from({ length: degree + 1 }, (_, k) => t.map((v) => (2 * v - 1) ** k))
  const c = solveLeastSquares(columns, s, new Float64Array(t.length).fill(1))
  if (!c) return null
  return (mm) => {
    const w = (2 * mm) / chordMm - 1
    let sum = 0
    for (let k = degree; k >= 0; k--) sum = sum * w + c[k]!
    return sum
  }
}

function greatestBow(curve: (t: number) => number, chordMm: number): { t: number; s: number; bow: number } {
  const start = curve(0)
  const end = curve(chordMm)
  let best = { t: 0, s: start, bow: 0 }
  for (let k = 1; k < 100; k++) {
    const t = (chordMm * k) / 100
    const s = curve(t)
    const bow = s - (start + ((end - start) * k) / 100)
    if (Math.abs(bow) > Math.abs(best.bow)) best = { t, s, bow }
  }
  return best
}

/** Mean distance along `square` to the bands of the orders next to this one, null when neither side has one. */
function spacingAt(band: LaidBand, bands: readonly LaidBand[], at: Place, square: Place): number | null {
  const found: number[] = []
  for (const step of [-1, 1]) {
    let nearest: number | null = null
    for (const other of bands) {
      if (other.trace.order !== band.trace.order + step) continue
      for (const distance of crossings(other.points, at, square)) {
        if (nearest === null || Math.abs(distance) < Math.abs(nearest)) nearest = distance
      }
    }
    if (nearest !== null) found.push(Math.abs(nearest))
  }
  return found.length === 0 ? null : found.reduce((a, b) => a + b, 0) / found.length
}

/** Signed distances from `at` along a direction at which the line crosses a path. */
function crossings(points: readonly Place[], at: Place, direction: Place): number[] {
  const out: number[] = []
  for (let i = 1; i < points.length; i++) {
    const [ax, ay] = points[i - 1]!
    const [bx, by] = points[i]!
    const sideA = (ax - at[0]) * -direction[1] + (ay - at[1]) * direction[0]
    const sideB = (bx - at[0]) * -direction[1] + (by - at[1]) * direction[0]
    if (sideA * sideB > 0 || sideA === sideB) continue
    const share = sideA / (sideA - sideB)
    out.push(
      (ax + share * (bx - ax) - at[0]) * direction[0] + (ay + share * (by - ay) - at[1]) * direction[1],
    )
  }
  return out
}

/** The band that reads worst; null where none could be read. */
export function worstBand(readings: readonly BandReading[]): BandReading | null {
  return readings.reduce<BandReading | null>(
    (worst, reading) => (worst && worst.flatnessUm >= reading.flatnessUm ? worst : reading),
    null,
  )
}
