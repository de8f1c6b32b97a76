import type { PointPx } from '@shared/schemas/shapes'

export function distance(a: PointPx, b: PointPx): number {
  return Math.hypot(a[0] - b[0], a[1] - b[1])
}

export function movedBy([x, y]: PointPx, dx: number, dy: number): PointPx {
  return [x + dx, y + dy]
}

/** Distance from a place to the segment a–b. */
export function distanceToSegment(place: PointPx, a: PointPx, b: PointPx): number {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  const length2 = dx * dx + dy * dy
  const t = length2 === 0 ? 0 : ((place[0] - a[0]) * dx + (place[1] - a[1]) * dy) / length2
  const held = Math.min(1, Math.max(0, t))
  return distance(place, [a[0] + held * dx, a[1] + held * dy])
}

export interface NearestSegment {
  distancePx: number
  /** The segment runs from point `index` to the next; the last one of a closed path runs back to the first. */
  index: number
}

/** Nearest segment of a path; a path of one point is taken as that point. */
export function nearestSegment(points: readonly PointPx[], place: PointPx, closed = false): NearestSegment {
  let best: NearestSegment = { distancePx: distance(points[0], place), index: 0 }
  const last = closed ? points.length : points.length - 1
  for (let i = 0; i < last; i += 1) {
    const distancePx = distanceToSegment(place, points[i], points[(i + 1) % points.length])
    if (distancePx < best.distancePx) best = { distancePx, index: i }
  }
  return best
}

/** Share of a–b at which it meets c–d, or null. Touching ends count. */
export function segmentsMeet(a: PointPx, b: PointPx, c: PointPx, d: PointPx): number | null {
  const [rx, ry] = [b[0] - a[0], b[1] - a[1]]
  const [sx, sy] = [d[0] - c[0], d[1] - c[1]]
  const cross = rx * sy - ry * sx
  if (cross === 0) return null
  const t = ((c[0] - a[0]) * sy - (c[1] - a[1]) * sx) / cross
  const u = ((c[0] - a[0]) * ry - (c[1] - a[1]) * rx) / cross
  return t >= 0 && t <= 1 && u >= 0 && u <= 1 ? t : null
}

export interface Crossing {
  /** How far along the first path, in segments: 2.5 is the middle of its third. */
  along: number
  place: PointPx
}

/** The first place along one path at which it meets another, or null. */
export function firstCrossing(path: readonly PointPx[], other: readonly PointPx[]): Crossing | null {
  let best: Crossing | null = null
  for (let i = 0; i + 1 < path.length && best === null; i += 1) {
    for (let j = 0; j + 1 < other.length; j += 1) {
      const t = segmentsMeet(path[i], path[i + 1], other[j], other[j + 1])
      if (t === null || (best && i + t >= best.along)) continue
      best = { along: i + t, place: between(path[i], path[i + 1], t) }
    }
  }
  return best
}

export function between(a: PointPx, b: PointPx, share: number): PointPx {
  return [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share]
}

export interface Box {
  left: number
  top: number
  right: number
  bottom: number
}

export function boxOf(points: readonly PointPx[]): Box {
  const box = { left: Infinity, top: Infinity, right: -Infinity, bottom: -Infinity }
  for (const [x, y] of points) {
    box.left = Math.min(box.left, x)
    box.right = Math.max(box.right, x)
    box.top = Math.min(box.top, y)
    box.bottom = Math.max(box.bottom, y)
  }
  return box
}

export function boxesMeet(a: Box, b: Box): boolean {
  return a.left <= b.right && b.left <= a.right && a.top <= b.bottom && b.top <= a.bottom
}

export function pathLength(points: readonly PointPx[]): number {
  let total = 0
  for (let i = 1; i < points.length; i += 1) total += distance(points[i - 1], points[i])
  return total
}

/** The place half way along a path by length. */
export function middleOfPath(points: readonly PointPx[]): PointPx {
  let left = pathLength(points) / 2
  for (let i = 1; i < points.length; i += 1) {
    const length = distance(points[i - 1], points[i])
    if (length > 0 && left <= length) return between(points[i - 1], points[i], left / length)
    left -= length
  }
  return points[points.length - 1]
}
