import type { Outline } from '../schemas/marks'
import type { Ellipse, Polygon } from '../schemas/shapes'
import {
  applyHomography,
  composeHomographies,
  type Homography,
  homographyFromFourPoints,
  invertHomography,
  type Place,
  rigidMap,
} from './homography'

/** Sizes on the drawing that give a photograph its millimetres. */
export type DrawnSize =
  | { kind: 'round'; diameterMm: number }
  | { kind: 'block'; widthMm: number; heightMm: number }
  | { kind: 'free'; longestSideMm: number }

/**
 * Photograph and part: mm with the origin at the face's centre, x right and y down as photographed (x turned
 * over when seen by a mirror).
 */
export interface PartFrame {
  toMm(xPx: number, yPx: number): Place
  toPx(xMm: number, yMm: number): Place
  /** Local scale: root of the area that one pixel covers there. */
  mmPerPx(xPx: number, yPx: number): number
}

export interface View {
  /** Camera off the face's normal. */
  viewingAngleDeg: number
  /** The photograph's size; null leaves the perspective of a disc at an angle out. */
  photo: { widthPx: number; heightPx: number } | null
  mirrored: boolean
}

export interface OutlineProblem {
  problem: 'flat' | 'cornersOnALine' | 'cornersCrossed'
}

/**
 * The part frame of an outline with the drawing's sizes. Circle: similarity. Ellipse: homography of a disc seen
 * at an angle, perspective included. Four corners of a block: homography, the first side being the width. Any
 * other polygon: similarity by its longest side. An outline that can't be the face gives its problem.
 */
export function partFrame(outline: Outline, size: DrawnSize, view: View): PartFrame | OutlineProblem {
  const pxToMm = photoToPart(outline, size, view)
  if ('problem' in pxToMm) return pxToMm
  const turned = view.mirrored
    ? composeHomographies(Float64Array.of(-1, 0, 0, 0, 1, 0, 0, 0, 1), pxToMm)
    : pxToMm
  const mmToPx = invertHomography(turned)
  if (!mmToPx) return { problem: 'flat' }
  return {
    toMm: (xPx, yPx) => applyHomography(turned, xPx, yPx),
    toPx: (xMm, yMm) => applyHomography(mmToPx, xMm, yMm),
    mmPerPx: (xPx, yPx) => localScale(turned, xPx, yPx),
  }
}

function photoToPart(outline: Outline, size: DrawnSize, view: View): Homography | OutlineProblem {
  switch (outline.kind) {
    case 'circle':
      return similarity(outline.cx, outline.cy, roundDiameterMm(size) / 2 / outline.r)
    case 'ellipse':
      return discAtAnAngle(outline, roundDiameterMm(size), view)
    case 'polygon':
      return size.kind === 'block' && outline.points.length === 4
        ? blockCorners(outline, size.widthMm, size.heightMm)
        : freePolygon(outline, size)
  }
}

function roundDiameterMm(size: DrawnSize): number {
  switch (size.kind) {
    case 'round':
      return size.diameterMm
    case 'block':
      return Math.max(size.widthMm, size.heightMm)
    case 'free':
      return size.longestSideMm
  }
}

function similarity(cx: number, cy: number, mmPerPx: number): Homography {
  return Float64Array.of(mmPerPx, 0, -mmPerPx * cx, 0, mmPerPx, -mmPerPx * cy, 0, 0, 1)
}

/** Beyond this the camera would stand within five radii: the ratio is a misplaced ellipse then, not perspective. */
const LARGEST_PERSPECTIVE = 0.2

/**
 * A disc of radius R seen at an angle t by a camera at a distance D, its tilt axis along the ellipse's major
 * axis. With s = R sin t ÷ D and (X, Y) on the disc over R, the picture is
 *
 *   u = a X √(1 − s²) / (1 + s Y)      v = b (1 − s²) Y / (1 + s Y)
 *
 * an ellipse with half-axes a, b of ratio b/a = cos t ÷ √(1 − s²), whose centre lies b·s towards the near side
 * of the disc's own centre. The camera looks at the face, so the photograph's middle lies on the far side of the
 * ellipse's centre: that gives the sign of s. (Derived from the pinhole camera; foreshortening alone is 0.05 to
 * 0.2 band wrong.)
 */
function discAtAnAngle(ellipse: Ellipse, diameterMm: number, view: View): Homography | OutlineProblem {
  const upright = ellipse.rx >= ellipse.ry
  const a = upright ? ellipse.rx : ellipse.ry
  const b = upright ? ellipse.ry : ellipse.rx
  const turn = ((ellipse.rotationDeg + (upright ? 0 : 90)) * Math.PI) / 180
  if (!(b > 1e-3 * a)) return { problem: 'flat' }
  const s = perspective(ellipse, a, b, turn, view)
  const radius = diameterMm / 2
  const fromPart = rigidMap(-turn, 0, 0)
  const camera = Float64Array.of(
    (a * Math.sqrt(1 - s * s)) / radius,
    0,
    0,
    0,
    (b * (1 - s * s)) / radius,
    0,
    0,
    s / radius,
    1,
  )
  const fromCentre = Float64Array.of(1, 0, 0, 0, 1, b * s, 0, 0, 1)
  const toPhoto = rigidMap(turn, ellipse.cx, ellipse.cy)
  const mmToPx = composeHomographies(
    toPhoto,
    composeHomographies(fromCentre, composeHomographies(camera, fromPart)),
  )
  return invertHomography(mmToPx) ?? { problem: 'flat' }
}

function perspective(ellipse: Ellipse, a: number, b: number, turn: number, view: View): number {
  if (!view.photo) return 0
  const expected = Math.cos((view.viewingAngleDeg * Math.PI) / 180)
  const square = 1 - ((expected * a) / b) ** 2
  if (!(square > 0 && square < LARGEST_PERSPECTIVE ** 2)) return 0
  const toMiddleX = (view.photo.widthPx - 1) / 2 - ellipse.cx
  const toMiddleY = (view.photo.heightPx - 1) / 2 - ellipse.cy
  const towardsFar = -Math.sin(turn) * toMiddleX + Math.cos(turn) * toMiddleY
  return Math.sqrt(square) * Math.sign(towardsFar)
}

function blockCorners(outline: Polygon, widthMm: number, heightMm: number): Homography | OutlineProblem {
  const w = widthMm / 2
  const h = heightMm / 2
  const winding = turningOf(outline.points)
  if (winding === 0) return { problem: 'cornersCrossed' }
  const corners: Place[] = [
    [-w, -h],
    [w, -h],
    [w, h],
    [-w, h],
  ]
  // Corners given the other way round are the same block seen the other way up, not a mirrored one.
  const targets = winding > 0 ? corners : corners.map(([x, y]): Place => [x, -y])
  const map = homographyFromFourPoints(outline.points, targets)
  return map ? asPhotographed(map, outline) : { problem: 'cornersOnALine' }
}

/** +1 or −1 when all four corners turn the same way, 0 when the outline crosses itself or is dented. */
function turningOf(points: readonly Place[]): number {
  const turns = points.map((p, i) => {
    const q = points[(i + 1) % points.length]!
    const r = points[(i + 2) % points.length]!
    return Math.sign((q[0] - p[0]) * (r[1] - q[1]) - (q[1] - p[1]) * (r[0] - q[0]))
  })
  return turns.every((t) => t === turns[0]) ? turns[0]! : 0
}

/** The block's own axes turned by quarter turns and less, so that x runs right and y down in the photograph. */
function asPhotographed(map: Homography, outline: Polygon): Homography {
  const [a, b] = [outline.points[0]!, outline.points[1]!]
  const angle = Math.atan2(b[1] - a[1], b[0] - a[0])
  const quarter = Math.round(angle / Math.PI) * Math.PI
  return quarter === 0 ? map : composeHomographies(rigidMap(quarter, 0, 0), map)
}

function freePolygon(outline: Polygon, size: DrawnSize): Homography | OutlineProblem {
  const points = outline.points
  const sides = points.map((p, i) => {
    const q = points[(i + 1) % points.length]!
    return Math.hypot(q[0] - p[0], q[1] - p[1])
  })
  const longest = Math.max(...sides)
  if (!(longest > 0)) return { problem: 'flat' }
  const cx = points.reduce((sum, [x]) => sum + x, 0) / points.length
  const cy = points.reduce((sum, [, y]) => sum + y, 0) / points.length
  return similarity(cx, cy, roundDiameterMm(size) / longest)
}

function localScale(h: Homography, x: number, y: number): number {
  const [x0, y0] = applyHomography(h, x - 0.5, y)
  const [x1, y1] = applyHomography(h, x + 0.5, y)
  const [x2, y2] = applyHomography(h, x, y - 0.5)
  const [x3, y3] = applyHomography(h, x, y + 0.5)
  return Math.sqrt(Math.abs((x1 - x0) * (y3 - y2) - (x3 - x2) * (y1 - y0)))
}
