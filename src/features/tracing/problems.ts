import { copiesOf, isInside } from '@shared/geometry/shape'
import type { Marks, Trace } from '@shared/schemas/marks'
import type { PointPx, Shape } from '@shared/schemas/shapes'
import {
  type Box,
  between,
  boxesMeet,
  boxOf,
  distance,
  middleOfPath,
  nearestSegment,
  segmentsMeet,
} from './geometry/paths'
import { centreOfShape, rimOf } from './geometry/shape-path'

/** A mistake that shows in the marks themselves, with its place. Sentences stand under `table:problem.<code>`. */
export interface Problem {
  code: 'bandsCross' | 'neighboursDiffer' | 'noNumber' | 'outsideFace' | 'insideLeaveOut' | 'reviewRemark'
  params: Readonly<Record<string, string | number>>
  place: PointPx
  traceIds: readonly string[]
}

export function findProblems(marks: Marks): Problem[] {
  const shapes = marks.leaveOuts.flatMap(copiesOf)
  return [
    ...bandsThatCross(marks.traces),
    ...neighboursThatDiffer(marks.traces, shapes),
    ...marks.traces.filter(({ order }) => order === null).map(withoutNumber),
    ...marks.traces.flatMap((trace) => outsideFace(trace, marks.outline)),
    ...marks.traces.flatMap((trace) => insideLeaveOut(trace, shapes)),
  ]
}

/** As it stands on the photograph: a band without a number carries a question mark there. */
function numberOf({ order }: Trace): number | string {
  return order ?? '?'
}

function withoutNumber(trace: Trace): Problem {
  return { code: 'noNumber', params: {}, place: middleOfPath(trace.points), traceIds: [trace.id] }
}

/** Two bands of different gap can't meet; pieces of one band may touch. */
function bandsThatCross(traces: readonly Trace[]): Problem[] {
  const found: Problem[] = []
  const boxes = traces.map(({ points }) => boxOf(points))
  for (let a = 0; a < traces.length; a += 1) {
    for (let b = a + 1; b < traces.length; b += 1) {
      if (!boxesMeet(boxes[a], boxes[b])) continue
      const sameBand = traces[a].order !== null && traces[a].order === traces[b].order
      const place = sameBand ? null : meetingPlace(traces[a].points, traces[b].points)
      if (place) {
        const params = { first: numberOf(traces[a]), second: numberOf(traces[b]) }
        found.push({ code: 'bandsCross', params, place, traceIds: [traces[a].id, traces[b].id] })
      }
    }
  }
  return found
}

function meetingPlace(p: readonly PointPx[], q: readonly PointPx[]): PointPx | null {
  for (let i = 0; i + 1 < p.length; i += 1) {
    for (let j = 0; j + 1 < q.length; j += 1) {
      const share = segmentsMeet(p[i], p[i + 1], q[j], q[j + 1])
      if (share !== null) return between(p[i], p[i + 1], share)
    }
  }
  return null
}

interface Neighbours {
  from: Trace
  to: Trace
  place: PointPx
  distancePx: number
  difference: number
}

/** So much nearer than the skipped numbers would need is no gap of bands. */
const gapShare = 0.6

/**
 * Bands side by side whose numbers differ by two or more, although they stand no farther apart than bands that
 * follow each other do here: nothing lies between them, so a number is wrong. Across a leave-out nothing is said.
 */
function neighboursThatDiffer(traces: readonly Trace[], leaveOuts: readonly Shape[]): Problem[] {
  const numbered = traces.filter(({ order, points }) => order !== null && points.length > 1)
  const pairs = neighbouringBands(numbered, leaveOuts)
  const stepPx = median(pairs.filter(({ difference }) => difference === 1).map((pair) => pair.distancePx))
  if (stepPx === null) return []
  const seen = new Set<string>()
  return pairs.flatMap(({ from, to, place, distancePx, difference }) => {
    const key = [from.id, to.id].toSorted().join()
    if (difference < 2 || seen.has(key)) return []
    if (distancePx > gapShare * difference * nearStepPx(pairs, from, to, stepPx)) return []
    seen.add(key)
    const params = { first: from.order ?? 0, second: to.order ?? 0, apart: difference }
    return [{ code: 'neighboursDiffer' as const, params, place, traceIds: [from.id, to.id] }]
  })
}

/** How far apart bands that follow each other stand beside either of the two; over the face where none do. */
function nearStepPx(pairs: readonly Neighbours[], a: Trace, b: Trace, otherwisePx: number): number {
  const near = pairs.filter(
    ({ from, to, difference }) => difference === 1 && (from === a || from === b || to === a || to === b),
  )
  return median(near.map(({ distancePx }) => distancePx)) ?? otherwisePx
}

/** For places along each band, the band that is met first going square to it, either way. */
function neighbouringBands(traces: readonly Trace[], leaveOuts: readonly Shape[]): Neighbours[] {
  const boxes = traces.map(({ points }) => boxOf(points))
  return traces.flatMap((trace) =>
    samplesOf(trace.points).flatMap(({ place, normal }) =>
      [1, -1].flatMap((way) => {
        const met = firstMet(traces, boxes, trace, place, [normal[0] * way, normal[1] * way])
        if (!met || leaveOuts.some((shape) => crosses(shape, place, met.place))) return []
        return [
          {
            from: trace,
            to: met.trace,
            place: between(place, met.place, 0.5),
            distancePx: distance(place, met.place),
            difference: Math.abs((trace.order ?? 0) - (met.trace.order ?? 0)),
          },
        ]
      }),
    ),
  )
}

/** Shares of a band's length at which its neighbours are looked for, its middle first: that is where it is told. */
const sampleShares = [0.5, 0.3, 0.7, 0.1, 0.9]

function samplesOf(points: readonly PointPx[]): { place: PointPx; normal: PointPx }[] {
  const segments = points.length - 1
  const indices = new Set(sampleShares.map((share) => Math.floor(share * segments)))
  return [...indices].map((i) => {
    const [a, b] = [points[i], points[i + 1]]
    const length = distance(a, b) || 1
    return { place: between(a, b, 0.5), normal: [-(b[1] - a[1]) / length, (b[0] - a[0]) / length] }
  })
}

/** Longer than any photograph's diagonal. */
const farPx = 1e5

function firstMet(
  traces: readonly Trace[],
  boxes: readonly Box[],
  self: Trace,
  from: PointPx,
  way: PointPx,
): { trace: Trace; place: PointPx } | null {
  let to: PointPx = [from[0] + way[0] * farPx, from[1] + way[1] * farPx]
  let met: { trace: Trace; place: PointPx } | null = null
  let ray = boxOf([from, to])
  for (let t = 0; t < traces.length; t += 1) {
    if (traces[t] === self || !boxesMeet(boxes[t], ray)) continue
    const { points } = traces[t]
    for (let i = 0; i + 1 < points.length; i += 1) {
      const share = segmentsMeet(from, to, points[i], points[i + 1])
      if (share === null) continue
      to = between(from, to, share)
      ray = boxOf([from, to])
      met = { trace: traces[t], place: to }
    }
  }
  return met
}

function crosses(shape: Shape, a: PointPx, b: PointPx): boolean {
  const rim = rimOf(shape, 48)
  return rim.some((point, i) => segmentsMeet(a, b, point, rim[(i + 1) % rim.length]) !== null)
}

function median(values: readonly number[]): number | null {
  if (values.length === 0) return null
  return values.toSorted((a, b) => a - b)[values.length >> 1]
}

/** Clicks farther off than a hand's tremble. */
const tremblePx = 6

function outsideFace(trace: Trace, outline: Shape | null): Problem[] {
  if (!outline) return []
  const place = trace.points.find(
    ([x, y]) => !isInside(outline, x, y) && rimDistance(outline, [x, y]) > tremblePx,
  )
  return place ? [atTrace('outsideFace', trace, place)] : []
}

function insideLeaveOut(trace: Trace, shapes: readonly Shape[]): Problem[] {
  const place = trace.points.find(([x, y]) =>
    shapes.some((shape) => isInside(shape, x, y) && rimDistance(shape, [x, y]) > tremblePx),
  )
  return place ? [atTrace('insideLeaveOut', trace, place)] : []
}

function atTrace(code: Problem['code'], trace: Trace, place: PointPx): Problem {
  return { code, params: { order: numberOf(trace) }, place, traceIds: [trace.id] }
}

function rimDistance(shape: Shape, place: PointPx): number {
  if (shape.kind === 'circle') return Math.abs(distance(centreOfShape(shape), place) - shape.r)
  return nearestSegment(rimOf(shape, 180), place, true).distancePx
}
