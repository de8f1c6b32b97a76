import type { LeaveOut } from '../schemas/marks'
import type { Circle, Ellipse, PointPx, Shape } from '../schemas/shapes'
import { eliminate } from './homography'

/** Whether a place lies inside a closed shape; places on its rim count as inside for circles and ellipses. */
export function isInside(shape: Shape, x: number, y: number): boolean {
  switch (shape.kind) {
    case 'circle':
      return Math.hypot(x - shape.cx, y - shape.cy) <= shape.r
    case 'ellipse': {
      const turn = (shape.rotationDeg * Math.PI) / 180
      const dx = x - shape.cx
      const dy = y - shape.cy
      const u = (dx * Math.cos(turn) + dy * Math.sin(turn)) / shape.rx
      const v = (-dx * Math.sin(turn) + dy * Math.cos(turn)) / shape.ry
      return u * u + v * v <= 1
    }
    case 'polygon':
      return isInsidePolygon(shape.points, x, y)
  }
}

/** Even-odd rule. */
function isInsidePolygon(points: readonly PointPx[], x: number, y: number): boolean {
  let inside = false
  for (let i = 0, j = points.length - 1; i < points.length; j = i++) {
    const [xi, yi] = points[i]!
    const [xj, yj] = points[j]!
    if (yi > y !== yj > y && x < ((xj - xi) * (y - yi)) / (yj - yi) + xi) inside = !inside
  }
  return inside
}

/** Enclosed area, px²; positive whichever way a polygon winds. */
export function shapeArea(shape: Shape): number {
  switch (shape.kind) {
    case 'circle':
      return Math.PI * shape.r * shape.r
    case 'ellipse':
      return Math.PI * shape.rx * shape.ry
    case 'polygon': {
      let doubled = 0
      for (let i = 0, j = shape.points.length - 1; i < shape.points.length; j = i++) {
        doubled += shape.points[j]![0] * shape.points[i]![1] - shape.points[i]![0] * shape.points[j]![1]
      }
      return Math.abs(doubled) / 2
    }
  }
}

/** The circle through three places, or null when they lie on a line. */
export function circleThroughThreePoints(a: PointPx, b: PointPx, c: PointPx): Circle | null {
  const [bx, by, cx, cy] = [b[0] - a[0], b[1] - a[1], c[0] - a[0], c[1] - a[1]]
  const doubled = 2 * (bx * cy - by * cx)
  const size = Math.max(Math.hypot(bx, by), Math.hypot(cx, cy))
  if (!(Math.abs(doubled) > 1e-6 * size * size)) return null
  const b2 = bx * bx + by * by
  const c2 = cx * cx + cy * cy
  const ux = (cy * b2 - by * c2) / doubled
  const uy = (bx * c2 - cx * b2) / doubled
  return { kind: 'circle', cx: a[0] + ux, cy: a[1] + uy, r: Math.hypot(ux, uy) }
}

/**
 * The circle that fits three or more rim places best: a start through three of them, then Gauss and Newton on the
 * distances themselves. Null for fewer than three places, or places on a line.
 */
export function circleThroughPoints(points: readonly PointPx[]): Circle | null {
  if (points.length < 3) return null
  const third = Math.floor(points.length / 3)
  const start = circleThroughThreePoints(points[0]!, points[third]!, points[2 * third]!)
  if (!start || points.length === 3) return start
  let { cx, cy, r } = start
  for (let step = 0; step < 20; step++) {
    const rows = [
      [0, 0, 0, 0],
      [0, 0, 0, 0],
      [0, 0, 0, 0],
    ]
    for (const [x, y] of points) {
      const d = Math.hypot(x - cx, y - cy) || 1
      const gradient = [(cx - x) / d, (cy - y) / d, -1]
      for (let i = 0; i < 3; i++) {
        for (let j = 0; j < 3; j++) rows[i]![j]! += gradient[i]! * gradient[j]!
        rows[i]![3]! -= gradient[i]! * (d - r)
      }
    }
    const change = eliminate(rows)
    if (!change) return null
    cx += change[0]!
    cy += change[1]!
    r += change[2]!
    if (Math.hypot(...change) < 1e-9 * r) break
  }
  return r > 0 ? { kind: 'circle', cx, cy, r } : null
}

/**
 * The ellipse that fits five or more rim places best in the algebraic sense, exactly for five. Null when the
 * conic through them isn't an ellipse, or isn't determined.
 */
export function ellipseThroughPoints(points: readonly PointPx[]): Ellipse | null {
  if (points.length < 5) return null
  const n = points.length
  const mx = points.reduce((sum, [x]) => sum + x, 0) / n
  const my = points.reduce((sum, [, y]) => sum + y, 0) / n
  const scale = points.reduce((sum, [x, y]) => sum + Math.hypot(x - mx, y - my), 0) / n || 1
  const rows = Array.from({ length: 5 }, () => [0, 0, 0, 0, 0, 0])
  for (const [px, py] of points) {
    const x = (px - mx) / scale
    const y = (py - my) / scale
    const f = [x * x, x * y, y * y, x, y]
    for (let i = 0; i < 5; i++) {
      for (let j = 0; j < 5; j++) rows[i]![j]! += f[i]! * f[j]!
      rows[i]![5]! += f[i]!
    }
  }
  const conic = eliminate(rows)
  return conic ? ellipseOfConic(conic as [number, number, number, number, number], mx, my, scale) : null
}

/** Half-axes and turn of a x² + b xy + c y² + d x + e y = 1, put back to the photograph's scale. */
function ellipseOfConic(
  [a, b, c, d, e]: [number, number, number, number, number],
  mx: number,
  my: number,
  scale: number,
): Ellipse | null {
  const discriminant = 4 * a * c - b * b
  if (!(discriminant > 0)) return null
  const x0 = (b * e - 2 * c * d) / discriminant
  const y0 = (b * d - 2 * a * e) / discriminant
  const level = 1 + a * x0 * x0 + b * x0 * y0 + c * y0 * y0
  const mean = (a + c) / 2
  const difference = Math.hypot((a - c) / 2, b / 2)
  const rx = Math.sqrt(level / (mean - difference))
  const ry = Math.sqrt(level / (mean + difference))
  if (!(Number.isFinite(rx) && Number.isFinite(ry) && ry > 0)) return null
  const rotationDeg = (Math.atan2(-b, c - a) * 90) / Math.PI
  return {
    kind: 'ellipse',
    cx: mx + scale * x0,
    cy: my + scale * y0,
    rx: scale * rx,
    ry: scale * ry,
    rotationDeg,
  }
}

/** A shape turned about a place, degrees from x towards y. */
export function turnShape(shape: Shape, cx: number, cy: number, angleDeg: number): Shape {
  const angle = (angleDeg * Math.PI) / 180
  const turn = (x: number, y: number): PointPx => [
    cx + (x - cx) * Math.cos(angle) - (y - cy) * Math.sin(angle),
    cy + (x - cx) * Math.sin(angle) + (y - cy) * Math.cos(angle),
  ]
  switch (shape.kind) {
    case 'circle': {
      const [x, y] = turn(shape.cx, shape.cy)
      return { ...shape, cx: x, cy: y }
    }
    case 'ellipse': {
      const [x, y] = turn(shape.cx, shape.cy)
      return { ...shape, cx: x, cy: y, rotationDeg: shape.rotationDeg + angleDeg }
    }
    case 'polygon':
      return { ...shape, points: shape.points.map(([x, y]) => turn(x, y)) }
  }
}

/** A shape moved by (dx, dy) px. */
export function moveShape(shape: Shape, dx: number, dy: number): Shape {
  if (shape.kind === 'polygon') return { ...shape, points: shape.points.map(([x, y]) => [x + dx, y + dy]) }
  return { ...shape, cx: shape.cx + dx, cy: shape.cy + dy }
}

/** All shapes of a leave-out: the drawn one, and its copies spread evenly round their centre. */
export function copiesOf(leaveOut: Pick<LeaveOut, 'shape' | 'copies'>): Shape[] {
  const { shape, copies } = leaveOut
  if (!copies) return [shape]
  return Array.from({ length: copies.count }, (_, k) =>
    turnShape(shape, copies.cx, copies.cy, (360 * k) / copies.count),
  )
}
