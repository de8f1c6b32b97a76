import type { PointPx, Shape } from '@shared/schemas/shapes'

/** The centre of a circle or an ellipse; of a polygon, the centre of its area. */
export function centreOfShape(shape: Shape): PointPx {
  if (shape.kind !== 'polygon') return [shape.cx, shape.cy]
  let [area, x, y] = [0, 0, 0]
  const { points } = shape
  const [ox, oy] = points[0]
  for (let i = 1; i + 1 < points.length; i += 1) {
    const [ax, ay] = [points[i][0] - ox, points[i][1] - oy]
    const [bx, by] = [points[i + 1][0] - ox, points[i + 1][1] - oy]
    const cross = ax * by - ay * bx
    area += cross
    x += cross * (ax + bx)
    y += cross * (ay + by)
  }
  return area === 0 ? points[0] : [ox + x / (3 * area), oy + y / (3 * area)]
}

/** The rim as a closed path without the first place repeated. */
export function rimOf(shape: Shape, places = 90): readonly PointPx[] {
  if (shape.kind === 'polygon') return shape.points
  return Array.from({ length: places }, (_, i) => rimPlace(shape, (2 * Math.PI * i) / places))
}

/** The place on a round rim at an angle from the shape's own x axis towards y. */
export function rimPlace(shape: Exclude<Shape, { kind: 'polygon' }>, angleRad: number): PointPx {
  if (shape.kind === 'circle')
    return [shape.cx + shape.r * Math.cos(angleRad), shape.cy + shape.r * Math.sin(angleRad)]
  const turn = (shape.rotationDeg * Math.PI) / 180
  const u = shape.rx * Math.cos(angleRad)
  const v = shape.ry * Math.sin(angleRad)
  return [
    shape.cx + u * Math.cos(turn) - v * Math.sin(turn),
    shape.cy + u * Math.sin(turn) + v * Math.cos(turn),
  ]
}
