import type { PartFrame } from '@shared/geometry/part-frame'
import { copiesOf } from '@shared/geometry/shape'
import type { Marks } from '@shared/schemas/marks'
import type { PointPx, Shape } from '@shared/schemas/shapes'
import { centreOfShape, rimOf } from './shape-path'

type EdgeBand = Pick<Marks, 'outline' | 'leaveOuts' | 'edgeBandMm'>

/** Closed paths of the edge band's inner rims: within the outline, and round the bores. */
export function edgeBandPaths(marks: EdgeBand, frame: PartFrame): readonly (readonly PointPx[])[] {
  const { outline, edgeBandMm } = marks
  if (!outline || edgeBandMm <= 0) return []
  const bores = marks.leaveOuts.flatMap(copiesOf).filter(({ kind }) => kind !== 'polygon')
  return [
    shiftedRim(outline, frame, -edgeBandMm),
    ...bores.map((shape) => shiftedRim(shape, frame, edgeBandMm)),
  ]
}

/** The rim moved out by a length on the part (in, below 0). */
function shiftedRim(shape: Shape, frame: PartFrame, outMm: number): PointPx[] {
  const rimMm = rimOf(shape).map(([x, y]) => frame.toMm(x, y))
  const moved =
    shape.kind === 'polygon' ? shiftedPolygon(rimMm, outMm) : shiftedRound(rimMm, shape, frame, outMm)
  return moved.map(([x, y]): PointPx => {
    const [xPx, yPx] = frame.toPx(x, y)
    return [xPx, yPx]
  })
}

type PlaceMm = readonly [number, number]

function shiftedRound(rimMm: readonly PlaceMm[], shape: Shape, frame: PartFrame, outMm: number): PlaceMm[] {
  const [cx, cy] = frame.toMm(...centreOfShape(shape))
  return rimMm.map(([x, y]): PlaceMm => {
    const r = Math.hypot(x - cx, y - cy) || 1
    const grown = Math.max(0, r + outMm) / r
    return [cx + (x - cx) * grown, cy + (y - cy) * grown]
  })
}

/** Each side moved square to itself; corners where the moved sides meet. */
function shiftedPolygon(corners: readonly PlaceMm[], outMm: number): PlaceMm[] {
  const n = corners.length
  const way = signedArea(corners) > 0 ? 1 : -1
  const sides = corners.map(([x, y], i) => {
    const [nx, ny] = corners[(i + 1) % n]
    const length = Math.hypot(nx - x, ny - y) || 1
    const ux = (nx - x) / length
    const uy = (ny - y) / length
    return { x: x + way * uy * outMm, y: y - way * ux * outMm, ux, uy }
  })
  return sides.map((side, i) => {
    const before = sides[(i + n - 1) % n]
    const cross = before.ux * side.uy - before.uy * side.ux
    if (Math.abs(cross) < 1e-6) return [side.x, side.y]
    const t = ((side.x - before.x) * side.uy - (side.y - before.y) * side.ux) / cross
    return [before.x + before.ux * t, before.y + before.uy * t]
  })
}

function signedArea(corners: readonly PlaceMm[]): number {
  return corners.reduce((sum, [x, y], i) => {
    const [nx, ny] = corners[(i + 1) % corners.length]
    return sum + (x * ny - nx * y) / 2
  }, 0)
}
