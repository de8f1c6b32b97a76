import type { Marks, Trace } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import type { Selection } from '../tools/tool'
import { nearestSegment } from './paths'

/** The marks without what is selected: one point of a path or polygon, or the whole mark. */
export function removeSelected(marks: Marks, selection: Selection): Marks {
  switch (selection.kind) {
    case 'trace':
      return {
        ...marks,
        traces: marks.traces.flatMap((trace) =>
          trace.id === selection.id ? traceWithout(trace, selection.point) : [trace],
        ),
      }
    case 'leaveOut':
      return {
        ...marks,
        leaveOuts: marks.leaveOuts.flatMap((leaveOut) => {
          if (leaveOut.id !== selection.id) return [leaveOut]
          const shape = polygonWithout(leaveOut.shape, selection.point)
          return shape ? [{ ...leaveOut, shape }] : []
        }),
      }
    case 'datum':
      return { ...marks, datumMarks: marks.datumMarks.filter(({ id }) => id !== selection.id) }
    case 'outline':
      return { ...marks, outline: marks.outline && polygonWithout(marks.outline, selection.point) }
    case 'pressArrow':
      return { ...marks, pressArrow: null }
    case 'straightedge':
      return { ...marks, straightedge: null }
  }
}

/** A path of one point says where no band runs, so the last but one takes the whole with it. */
function traceWithout(trace: Trace, point: number | null): Trace[] {
  if (point === null || trace.points.length <= 2) return []
  return [{ ...trace, points: trace.points.filter((_, i) => i !== point) }]
}

function polygonWithout<S extends { kind: string; points?: PointPx[] }>(
  shape: S,
  point: number | null,
): S | null {
  if (point === null || !shape.points || shape.points.length <= 3) return null
  return { ...shape, points: shape.points.filter((_, i) => i !== point) }
}

export interface Inserted {
  marks: Marks
  selection: Selection
}

/** A new point on the nearest stretch of a selected path or polygon; null for what has no stretches. */
export function insertPoint(marks: Marks, selection: Selection, place: PointPx): Inserted | null {
  switch (selection.kind) {
    case 'trace': {
      const trace = marks.traces.find(({ id }) => id === selection.id)
      if (!trace) return null
      const { index } = nearestSegment(trace.points, place)
      const points = trace.points.toSpliced(index + 1, 0, place)
      return {
        marks: { ...marks, traces: marks.traces.map((t) => (t === trace ? { ...t, points } : t)) },
        selection: { ...selection, point: index + 1 },
      }
    }
    case 'leaveOut': {
      const leaveOut = marks.leaveOuts.find(({ id }) => id === selection.id)
      if (leaveOut?.shape.kind !== 'polygon') return null
      const { index } = nearestSegment(leaveOut.shape.points, place, true)
      const shape = { ...leaveOut.shape, points: leaveOut.shape.points.toSpliced(index + 1, 0, place) }
      return {
        marks: {
          ...marks,
          leaveOuts: marks.leaveOuts.map((l) => (l === leaveOut ? { ...l, shape } : l)),
        },
        selection: { ...selection, point: index + 1 },
      }
    }
    case 'outline': {
      const { outline } = marks
      if (outline?.kind !== 'polygon') return null
      const { index } = nearestSegment(outline.points, place, true)
      return {
        marks: {
          ...marks,
          outline: { ...outline, points: outline.points.toSpliced(index + 1, 0, place) },
        },
        selection: { ...selection, point: index + 1 },
      }
    }
    default:
      return null
  }
}

export function withNumber(marks: Marks, traceId: string, order: number | null): Marks {
  return {
    ...marks,
    traces: marks.traces.map((trace) => (trace.id === traceId ? { ...trace, order } : trace)),
  }
}
