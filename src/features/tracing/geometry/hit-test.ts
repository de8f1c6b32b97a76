import { copiesOf, isInside } from '@shared/geometry/shape'
import type { Marks } from '@shared/schemas/marks'
import type { PointPx, Shape } from '@shared/schemas/shapes'
import type { Selection } from '../tools/tool'
import { handlesOf } from './handles'
import { boxOf, distance, distanceToSegment, nearestSegment } from './paths'
import { rimOf } from './shape-path'

/** What lies under the pointer: handles of what is selected first, then lines, then what they enclose. */
export function hitTest(
  marks: Marks,
  selection: Selection | null,
  place: PointPx,
  reachPx: number,
): Selection | null {
  return (
    handleAt(marks, selection, place, reachPx) ??
    smallMarkAt(marks, place, reachPx) ??
    traceSelection(marks, place, reachPx) ??
    leaveOutSelection(marks, place, reachPx) ??
    outlineAt(marks, place, reachPx)
  )
}

function handleAt(
  marks: Marks,
  selection: Selection | null,
  place: PointPx,
  reachPx: number,
): Selection | null {
  if (!selection || selection.kind === 'datum') return null
  const index = nearestIndex(handlesOf(marks, selection), place, reachPx)
  return index === null ? null : { ...selection, point: index }
}

function nearestIndex(points: readonly PointPx[], place: PointPx, reachPx: number): number | null {
  let best: number | null = null
  let bestPx = reachPx
  points.forEach((point, i) => {
    const px = distance(point, place)
    if (px > bestPx) return
    best = i
    bestPx = px
  })
  return best
}

function smallMarkAt(marks: Marks, place: PointPx, reachPx: number): Selection | null {
  const datum = marks.datumMarks.find(({ x, y }) => distance([x, y], place) <= 1.5 * reachPx)
  if (datum) return { kind: 'datum', id: datum.id, point: null }
  const { pressArrow: arrow, straightedge: edge } = marks
  if (
    arrow &&
    distanceToSegment(place, [arrow.x, arrow.y], [arrow.x + arrow.dx, arrow.y + arrow.dy]) <= reachPx
  ) {
    return { kind: 'pressArrow', point: null }
  }
  if (edge && distanceToSegment(place, edge.from, edge.to) <= reachPx)
    return { kind: 'straightedge', point: null }
  return null
}

/** The trace nearest to a place within reach. */
export function traceAt(marks: Marks, place: PointPx, reachPx: number): string | null {
  let best: string | null = null
  let bestPx = reachPx
  for (const { id, points } of marks.traces) {
    const box = boxOf(points)
    if (place[0] < box.left - bestPx || place[0] > box.right + bestPx) continue
    if (place[1] < box.top - bestPx || place[1] > box.bottom + bestPx) continue
    const { distancePx } = nearestSegment(points, place)
    if (distancePx > bestPx) continue
    best = id
    bestPx = distancePx
  }
  return best
}

function traceSelection(marks: Marks, place: PointPx, reachPx: number): Selection | null {
  const id = traceAt(marks, place, reachPx)
  return id === null ? null : { kind: 'trace', id, point: null }
}

/** The leave-out on whose rim, or in any of whose copies, a place lies; the last drawn first. */
export function leaveOutAt(marks: Marks, place: PointPx, reachPx: number): string | null {
  const holds = (shape: Shape) => isInside(shape, place[0], place[1]) || isOnRim(shape, place, reachPx)
  return marks.leaveOuts.findLast((leaveOut) => copiesOf(leaveOut).some(holds))?.id ?? null
}

function leaveOutSelection(marks: Marks, place: PointPx, reachPx: number): Selection | null {
  const id = leaveOutAt(marks, place, reachPx)
  return id === null ? null : { kind: 'leaveOut', id, point: null }
}

function outlineAt(marks: Marks, place: PointPx, reachPx: number): Selection | null {
  if (!marks.outline || !isOnRim(marks.outline, place, reachPx)) return null
  return { kind: 'outline', point: null }
}

function isOnRim(shape: Shape, place: PointPx, reachPx: number): boolean {
  if (shape.kind === 'circle') return Math.abs(distance(place, [shape.cx, shape.cy]) - shape.r) <= reachPx
  return nearestSegment(rimOf(shape, 180), place, true).distancePx <= reachPx
}
