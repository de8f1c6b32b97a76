import { moveShape } from '@shared/geometry/shape'
import type { LeaveOut, Marks } from '@shared/schemas/marks'
import type { Ellipse, PointPx, Shape } from '@shared/schemas/shapes'
import type { Selection } from '../tools/tool'
import { distance, movedBy } from './paths'
import { rimPlace } from './shape-path'

/** The places by which a mark is held. Round shapes: centre, then four on the rim. Paths and polygons: each point. */
export function handlesOf(marks: Marks, selection: Selection): readonly PointPx[] {
  switch (selection.kind) {
    case 'trace':
      return marks.traces.find(({ id }) => id === selection.id)?.points ?? []
    case 'leaveOut': {
      const leaveOut = marks.leaveOuts.find(({ id }) => id === selection.id)
      return leaveOut ? shapeHandles(leaveOut.shape) : []
    }
    case 'outline':
      return marks.outline ? shapeHandles(marks.outline) : []
    case 'datum':
      return marks.datumMarks.filter(({ id }) => id === selection.id).map(({ x, y }): PointPx => [x, y])
    case 'pressArrow': {
      const arrow = marks.pressArrow
      return arrow
        ? [
            [arrow.x, arrow.y],
            [arrow.x + arrow.dx, arrow.y + arrow.dy],
          ]
        : []
    }
    case 'straightedge': {
      const edge = marks.straightedge
      return edge ? [edge.from, edge.to, edge.bowAt, edge.nextBandAt] : []
    }
  }
}

function shapeHandles(shape: Shape): readonly PointPx[] {
  if (shape.kind === 'polygon') return shape.points
  return [[shape.cx, shape.cy], ...[0, 1, 2, 3].map((k) => rimPlace(shape, (k * Math.PI) / 2))]
}

/** The marks with what is selected (one handle of it, or the whole) moved by (dx, dy) photo pixels. */
export function moveSelected(marks: Marks, selection: Selection, dx: number, dy: number): Marks {
  switch (selection.kind) {
    case 'trace':
      return {
        ...marks,
        traces: marks.traces.map((trace) =>
          trace.id === selection.id
            ? { ...trace, points: movePoints(trace.points, selection.point, dx, dy) }
            : trace,
        ),
      }
    case 'leaveOut':
      return {
        ...marks,
        leaveOuts: marks.leaveOuts.map((leaveOut) =>
          leaveOut.id === selection.id ? moveLeaveOut(leaveOut, selection.point, dx, dy) : leaveOut,
        ),
      }
    case 'outline':
      return marks.outline
        ? { ...marks, outline: moveShapeHandle(marks.outline, selection.point, dx, dy) }
        : marks
    case 'datum':
      return {
        ...marks,
        datumMarks: marks.datumMarks.map((mark) =>
          mark.id === selection.id ? { ...mark, x: mark.x + dx, y: mark.y + dy } : mark,
        ),
      }
    case 'pressArrow':
      return marks.pressArrow
        ? { ...marks, pressArrow: moveArrow(marks.pressArrow, selection.point, dx, dy) }
        : marks
    case 'straightedge':
      return moveStraightedge(marks, selection.point, dx, dy)
  }
}

function movePoints(points: readonly PointPx[], index: number | null, dx: number, dy: number): PointPx[] {
  return points.map((point, i) => (index === null || index === i ? movedBy(point, dx, dy) : point))
}

function moveLeaveOut(leaveOut: LeaveOut, handle: number | null, dx: number, dy: number): LeaveOut {
  return { ...leaveOut, shape: moveShapeHandle(leaveOut.shape, handle, dx, dy) }
}

function moveShapeHandle<S extends Shape>(shape: S, handle: number | null, dx: number, dy: number): S {
  return moveHandleOf(shape, handle, dx, dy) as S
}

function moveHandleOf(shape: Shape, handle: number | null, dx: number, dy: number): Shape {
  if (shape.kind === 'polygon') return { ...shape, points: movePoints(shape.points, handle, dx, dy) }
  if (handle === null || handle === 0) return moveShape(shape, dx, dy)
  const held = movedBy(rimPlace(shape, ((handle - 1) * Math.PI) / 2), dx, dy)
  if (shape.kind === 'circle') return { ...shape, r: Math.max(1, distance(held, [shape.cx, shape.cy])) }
  return turnedEllipse(shape, handle, held)
}

/** The held end of an axis gives its length and the turn. */
function turnedEllipse(shape: Ellipse, handle: number, held: PointPx): Ellipse {
  const length = Math.max(1, distance(held, [shape.cx, shape.cy]))
  const angleDeg = (Math.atan2(held[1] - shape.cy, held[0] - shape.cx) * 180) / Math.PI
  const rotationDeg = angleDeg - (handle - 1) * 90
  return handle % 2 === 1 ? { ...shape, rx: length, rotationDeg } : { ...shape, ry: length, rotationDeg }
}

function moveArrow(arrow: NonNullable<Marks['pressArrow']>, handle: number | null, dx: number, dy: number) {
  if (handle === null) return { ...arrow, x: arrow.x + dx, y: arrow.y + dy }
  if (handle === 1) return { ...arrow, dx: arrow.dx + dx, dy: arrow.dy + dy }
  return { x: arrow.x + dx, y: arrow.y + dy, dx: arrow.dx - dx, dy: arrow.dy - dy }
}

const straightedgeHandles = ['from', 'to', 'bowAt', 'nextBandAt'] as const

function moveStraightedge(marks: Marks, handle: number | null, dx: number, dy: number): Marks {
  const edge = marks.straightedge
  if (!edge) return marks
  const moved = { ...edge }
  straightedgeHandles.forEach((name, i) => {
    if (handle === null || handle === i) moved[name] = movedBy(edge[name], dx, dy)
  })
  return { ...marks, straightedge: moved }
}
