import { type PartFrame, partFrame } from '@shared/geometry/part-frame'
import { copiesOf } from '@shared/geometry/shape'
import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { FaceSizes } from '@shared/schemas/parts'
import type { Shape } from '@shared/schemas/shapes'
import type { Point } from './paths'

/** A drawn curve, and how far from it the measured area ends. */
interface RimCurve {
  placesMm: readonly Point[]
  offsetMm: number
  /** Least x, least y, most x, most y. */
  boundsMm: readonly [number, number, number, number]
}

/** A circle's polygon: at 20 mm its sides stay within 1 µm of it. */
const roundPlaces = 360

/**
 * Moves places of a rim found on the map's grid onto the true rim, where one lies within `reachMm`: outline less
 * edge band, bores with theirs, slots. A grid can't place a rim better than a few hundredths of a cell, and it shows.
 */
export function trueRim(snapshot: CertificateSnapshot, reachMm: number): (place: Point) => Point {
  const curves = rimCurves(snapshot)
  return (place) => {
    let best = place
    let least = reachMm
    for (const curve of curves) {
      if (!isNear(curve, place, reachMm)) continue
      const foot = nearestOn(curve.placesMm, place)
      const distance = Math.hypot(place[0] - foot[0], place[1] - foot[1])
      const off = Math.abs(distance - curve.offsetMm)
      if (off >= least || distance === 0) continue
      least = off
      const share = curve.offsetMm / distance
      best = [foot[0] + (place[0] - foot[0]) * share, foot[1] + (place[1] - foot[1]) * share]
    }
    return best
  }
}

function rimCurves({ marks, face, photo, viewingAngleDeg, setUp }: CertificateSnapshot): RimCurve[] {
  if (!marks.outline) return []
  const view = { viewingAngleDeg, photo, mirrored: setUp.mirrored }
  const frame = partFrame(marks.outline, drawnSize(face.size), view)
  if ('problem' in frame) return []
  const { edgeBandMm } = marks
  return [
    curveOf(marks.outline, edgeBandMm, frame),
    ...marks.leaveOuts
      .flatMap(copiesOf)
      .map((shape) => curveOf(shape, shape.kind === 'polygon' ? 0 : edgeBandMm, frame)),
  ]
}

function drawnSize(size: FaceSizes) {
  switch (size.shape) {
    case 'disc':
    case 'annulus':
      return { kind: 'round', diameterMm: size.diameterMm } as const
    case 'block':
      return { kind: 'block', widthMm: size.widthMm, heightMm: size.heightMm } as const
    case 'free':
      return { kind: 'free', longestSideMm: size.longestSideMm } as const
  }
}

function curveOf(shape: Shape, offsetMm: number, frame: PartFrame): RimCurve {
  const placesMm = placesOf(shape).map(([x, y]): Point => frame.toMm(x, y))
  const xs = placesMm.map(([x]) => x)
  const ys = placesMm.map(([, y]) => y)
  return {
    placesMm,
    offsetMm,
    boundsMm: [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)],
  }
}

function placesOf(shape: Shape): readonly Point[] {
  if (shape.kind === 'polygon') return shape.points
  const { cx, cy } = shape
  const [rx, ry] = shape.kind === 'circle' ? [shape.r, shape.r] : [shape.rx, shape.ry]
  const turn = shape.kind === 'circle' ? 0 : (shape.rotationDeg * Math.PI) / 180
  return Array.from({ length: roundPlaces }, (_, i): Point => {
    const angle = (2 * Math.PI * i) / roundPlaces
    const [u, v] = [rx * Math.cos(angle), ry * Math.sin(angle)]
    return [cx + u * Math.cos(turn) - v * Math.sin(turn), cy + u * Math.sin(turn) + v * Math.cos(turn)]
  })
}

function isNear({ boundsMm: [x0, y0, x1, y1], offsetMm }: RimCurve, [x, y]: Point, reachMm: number): boolean {
  const far = offsetMm + reachMm
  return x > x0 - far && x < x1 + far && y > y0 - far && y < y1 + far
}

/** Nearest place on a closed polygon's sides. */
function nearestOn(corners: readonly Point[], [x, y]: Point): Point {
  let best = corners[0]
  let least = Number.POSITIVE_INFINITY
  for (let i = 0, j = corners.length - 1; i < corners.length; j = i++) {
    const [ax, ay] = corners[j]
    const [dx, dy] = [corners[i][0] - ax, corners[i][1] - ay]
    const along = ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy || 1)
    const share = Math.min(1, Math.max(0, along))
    const [fx, fy] = [ax + share * dx, ay + share * dy]
    const square = (x - fx) ** 2 + (y - fy) ** 2
    if (square >= least) continue
    least = square
    best = [fx, fy]
  }
  return best
}
