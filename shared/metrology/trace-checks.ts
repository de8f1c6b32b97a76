import type { PartFrame } from '../geometry/part-frame'
import type { Trace } from '../schemas/marks'
import { isMeasured, type MeasuredArea } from './measured-area'
import type { SurfaceFit } from './surface-fit'
import type { TracedPoints } from './traced-points'
import type { Finding, FindingCode, FindingSeverity, TracedReading } from './types'

type Place = readonly [number, number]

/** A finding without a place or traces unless they are given. */
export function finding(
  code: FindingCode,
  severity: FindingSeverity,
  params: Finding['params'] = {},
  where: { place?: Place; traceIds?: readonly string[] } = {},
): Finding {
  const place = where.place ? { x: where.place[0], y: where.place[1] } : null
  return { code, severity, params, place, traceIds: where.traceIds ?? [] }
}

/** Fewer dark bands than this across a face say nothing of what lies between them. */
const LEAST_BANDS = 3
/** Below six clicks even piston, tilts, power and astigmatism aren't determined; twice that leaves something to check by. */
const LEAST_POINTS = 12
/** Crossings count as on one line when they spread less than this share of the face square to it. */
const LINE_SHARE = 0.06

/** What is missing or wrong in the traces before anything is fitted: each a refusal. */
export function missingForAFigure(reading: TracedReading, area: MeasuredArea, frame: PartFrame): Finding[] {
  const drawn = reading.traces.filter((trace) => trace.points.length > 0)
  if (drawn.length === 0) return [finding('noBands', 'refusal')]
  if (area.areaMm2 === 0) return [finding('nothingMeasured', 'refusal')]
  const unnumbered = drawn.filter((trace) => trace.order === null)
  if (unnumbered.length > 0) {
    const place = middleOf(unnumbered[0]!)
    const traceIds = unnumbered.map((trace) => trace.id)
    return [finding('orderMissing', 'refusal', { count: unnumbered.length }, { place, traceIds })]
  }
  const bands = countBands(drawn, reading)
  if (bands < LEAST_BANDS) return [finding('tooFewBands', 'refusal', { count: bands, least: LEAST_BANDS })]
  const clicks = drawn.reduce((sum, trace) => sum + trace.points.length, 0)
  if (clicks < LEAST_POINTS)
    return [finding('tooFewPoints', 'refusal', { count: clicks, least: LEAST_POINTS })]
  if (spreadSquareToLine(drawn, frame) < LINE_SHARE * Math.sqrt(area.areaMm2)) {
    return [finding('crossingsOnOneLine', 'refusal')]
  }
  return []
}

/**
 * Bands are counted by their orders. Two orders may still be four bands, the four arms of a saddle, on a face
 * without slots to cut one band in pieces.
 */
function countBands(traces: readonly Trace[], reading: TracedReading): number {
  const orders = new Set(traces.map((trace) => trace.order)).size
  const uncut = !reading.exclusions.some((shape) => shape.kind === 'polygon')
  return orders === 2 && uncut ? Math.max(orders, traces.length) : orders
}

function middleOf(trace: Trace): Place {
  return trace.points[trace.points.length >> 1]!
}

/** Smaller principal deviation of the clicks in the part frame, mm. */
function spreadSquareToLine(traces: readonly Trace[], frame: PartFrame): number {
  const places = traces.flatMap((trace) => trace.points.map(([x, y]) => frame.toMm(x, y)))
  const n = places.length
  const mx = places.reduce((sum, [x]) => sum + x, 0) / n
  const my = places.reduce((sum, [, y]) => sum + y, 0) / n
  let [xx, xy, yy] = [0, 0, 0]
  for (const [x, y] of places) {
    xx += (x - mx) ** 2
    xy += (x - mx) * (y - my)
    yy += (y - my) ** 2
  }
  const smaller = (xx + yy) / 2 - Math.hypot((xx - yy) / 2, xy)
  return Math.sqrt(Math.max(0, smaller) / n)
}

/** Places where two bands of different orders cross, which no gap can do. */
export function crossedBands(traces: readonly Trace[]): Finding[] {
  const found: Finding[] = []
  const boxes = traces.map((trace) => boxOf(trace.points))
  for (let a = 0; a < traces.length; a++) {
    for (let b = a + 1; b < traces.length; b++) {
      if (traces[a]!.order === traces[b]!.order || !overlap(boxes[a]!, boxes[b]!)) continue
      const place = pathsCross(traces[a]!.points, traces[b]!.points)
      if (place) {
        const params = { first: traces[a]!.order ?? '', second: traces[b]!.order ?? '' }
        found.push(
          finding('bandsCross', 'warning', params, { place, traceIds: [traces[a]!.id, traces[b]!.id] }),
        )
      }
    }
  }
  return found
}

function boxOf(points: readonly Place[]): [number, number, number, number] {
  const xs = points.map(([x]) => x)
  const ys = points.map(([, y]) => y)
  return [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)]
}

function overlap(a: [number, number, number, number], b: [number, number, number, number]): boolean {
  return a[0] <= b[2] && b[0] <= a[2] && a[1] <= b[3] && b[1] <= a[3]
}

/** First place at which two polylines cross, or null. */
export function pathsCross(p: readonly Place[], q: readonly Place[]): Place | null {
  for (let i = 1; i < p.length; i++) {
    for (let j = 1; j < q.length; j++) {
      const place = segmentsCross(p[i - 1]!, p[i]!, q[j - 1]!, q[j]!)
      if (place) return place
    }
  }
  return null
}

function segmentsCross(a: Place, b: Place, c: Place, d: Place): Place | null {
  const rx = b[0] - a[0]
  const ry = b[1] - a[1]
  const sx = d[0] - c[0]
  const sy = d[1] - c[1]
  const cross = rx * sy - ry * sx
  if (cross === 0) return null
  const t = ((c[0] - a[0]) * sy - (c[1] - a[1]) * sx) / cross
  const u = ((c[0] - a[0]) * ry - (c[1] - a[1]) * rx) / cross
  return t > 0 && t < 1 && u > 0 && u < 1 ? [a[0] + t * rx, a[1] + t * ry] : null
}

/** Clicks farther outside the measured area than a shaky hand explains, px. */
const OUTSIDE_PX = 6

/** Traces with clicks well outside the face's outline or in a leave-out. */
export function clicksOutside(reading: TracedReading, area: MeasuredArea, edgeBandPx: number): Finding[] {
  const margin = OUTSIDE_PX + edgeBandPx
  const outside: { traceId: string; place: Place }[] = []
  for (const trace of reading.traces) {
    const place = trace.points.find(([x, y]) => !isNear(area, x, y, margin))
    if (place) outside.push({ traceId: trace.id, place })
  }
  if (outside.length === 0) return []
  const where = { place: outside[0]!.place, traceIds: outside.map((o) => o.traceId) }
  return [finding('pointsOutsideFace', 'warning', { count: outside.length }, where)]
}

function isNear(area: MeasuredArea, x: number, y: number, margin: number): boolean {
  if (isMeasured(area, x, y)) return true
  for (let k = 0; k < 16; k++) {
    const angle = (k * Math.PI) / 8
    for (const share of [0.35, 0.7, 1]) {
      const r = margin * share
      if (isMeasured(area, x + r * Math.cos(angle), y + r * Math.sin(angle))) return true
    }
  }
  return false
}

/** A fit that had to set aside more than this share of the clicks isn't one surface. */
const TOO_MANY_SET_ASIDE = 0.15
/** A band with this share of its clicks set aside carries a wrong number or lies on another band. */
const WHOLE_TRACE_SHARE = 0.5

/** Slips: single clicks are told of; whole bands that don't fit, or too many clicks, refuse the figure. */
export function clicksThatDoNotFit(reading: TracedReading, points: TracedPoints, fit: SurfaceFit): Finding[] {
  const aside = new Map<number, number>()
  let total = 0
  for (let i = 0; i < points.count; i++) {
    if (fit.weights[i] !== 0) continue
    total++
    aside.set(points.traceOf[i]!, (aside.get(points.traceOf[i]!) ?? 0) + 1)
  }
  if (total === 0) return []
  const traceIds = [...aside.keys()].map((t) => reading.traces[t]!.id)
  const wrong = [...aside].filter(([t, n]) => n > WHOLE_TRACE_SHARE * reading.traces[t]!.points.length)
  const place = middleOf(reading.traces[(wrong[0] ?? [...aside][0])![0]]!)
  if (total > TOO_MANY_SET_ASIDE * points.count) {
    return [finding('fitUnstable', 'refusal', { count: total, of: points.count }, { place, traceIds })]
  }
  if (wrong.length > 0) {
    const ids = wrong.map(([t]) => reading.traces[t]!.id)
    const order = reading.traces[wrong[0]![0]]!.order ?? ''
    return [finding('neighboursDiffer', 'warning', { order }, { place, traceIds: ids })]
  }
  // One click in a hundred is a hand's; more is worth a look.
  const severity = total > Math.max(2, 0.02 * points.count) ? 'warning' : 'remark'
  return [finding('clicksSetAside', severity, { count: total, of: points.count }, { place, traceIds })]
}
