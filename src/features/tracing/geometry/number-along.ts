import type { Marks, PressArrow, Trace } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { type Crossing, firstCrossing, segmentsMeet } from './paths'

/** The traces that a drag crosses, each once, in the order in which it meets them. */
function tracesAlong(traces: readonly Trace[], path: readonly PointPx[]): Trace[] {
  return traces
    .map((trace) => ({ trace, crossing: firstCrossing(path, trace.points) }))
    .filter((met): met is { trace: Trace; crossing: Crossing } => met.crossing !== null)
    .toSorted((a, b) => a.crossing.along - b.crossing.along)
    .map(({ trace }) => trace)
}

/**
 * Numbers in a row for the traces that a drag crosses. They rise along the press arrow, so a drag against it
 * counts down. `first` is the number of the band met first; without one the row joins on to the first band in
 * it that has a number already, and starts at 1 if none has.
 */
export function numberAlong(marks: Marks, path: readonly PointPx[], first: number | null): Marks {
  const row = tracesAlong(marks.traces, path)
  if (row.length === 0) return marks
  const step = directionOf(row, path, marks.pressArrow)
  const start = first ?? startOf(row, step)
  const orders = new Map(row.map((trace, i) => [trace.id, start + step * i]))
  return {
    ...marks,
    traces: marks.traces.map((trace) => {
      const order = orders.get(trace.id)
      return order === undefined || order === trace.order ? trace : { ...trace, order }
    }),
  }
}

function startOf(row: readonly Trace[], step: 1 | -1): number {
  const known = row.findIndex(({ order }) => order !== null)
  if (known >= 0) return (row[known].order ?? 0) - step * known
  return step === 1 ? 1 : row.length
}

/**
 * Whether orders rise (1) or fall (−1) along the drag: as the arrow's own line crosses the bands of the row, so
 * that rings and saddles come out right; where it meets fewer than two of them, by drag and arrow alone.
 */
function directionOf(row: readonly Trace[], path: readonly PointPx[], arrow: PressArrow | null): 1 | -1 {
  if (!arrow) return 1
  const ahead = risesAtArrow(row, arrow)
  if (ahead !== null) return ahead ? 1 : -1
  const [from, to] = [path[0], path[path.length - 1]]
  return (to[0] - from[0]) * arrow.dx + (to[1] - from[1]) * arrow.dy >= 0 ? 1 : -1
}

/** Whether, of the two different bands that the arrow's line meets nearest to it, the one ahead is later in the row. */
function risesAtArrow(row: readonly Trace[], arrow: PressArrow): boolean | null {
  const met = row
    .flatMap(({ points }, place) => crossingsOfLine(points, arrow).map((along) => ({ along, place })))
    .toSorted((a, b) => Math.abs(a.along) - Math.abs(b.along))
  const nearest = met[0]
  const other = met.find(({ place }) => place !== nearest?.place)
  if (!nearest || !other) return null
  return nearest.along < other.along === nearest.place < other.place
}

/** Longer than any photograph's diagonal. */
const farPx = 1e5

/** Signed distances along the arrow's line at which a path crosses it, from the arrow's tail. */
function crossingsOfLine(points: readonly PointPx[], arrow: PressArrow): number[] {
  const length = Math.hypot(arrow.dx, arrow.dy) || 1
  const [ux, uy] = [arrow.dx / length, arrow.dy / length]
  const from: PointPx = [arrow.x - ux * farPx, arrow.y - uy * farPx]
  const to: PointPx = [arrow.x + ux * farPx, arrow.y + uy * farPx]
  const found: number[] = []
  for (let i = 0; i + 1 < points.length; i += 1) {
    const share = segmentsMeet(from, to, points[i], points[i + 1])
    if (share !== null) found.push((2 * share - 1) * farPx)
  }
  return found
}
