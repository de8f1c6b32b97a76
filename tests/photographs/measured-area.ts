import { type Face, faceRadiusMm, type KidneyPort, type PlaceMm, type Slots } from './scene'

/** What is left out of the face, in part places. A bore carries the edge band; polygons don't. */
export type LeaveOut =
  | { kind: 'circle'; radiusMm: number }
  | { kind: 'polygon'; pointsMm: readonly PlaceMm[] }

/** Where the face is measured: inside the outline, less the edge band, less what is left out. */
export interface MeasuredArea {
  holds(xMm: number, yMm: number): boolean
  /** Places along its border, close together, each belonging to the area. */
  borderPlacesMm(): PlaceMm[]
}

/** Radius of the round left-out patch over a datum mark, as share of the face's longer side. */
const MARK_RADIUS_SHARE = 0.022

/** Radius of the mark itself over that of the patch left out for it. */
const MARK_DOT_SHARE = 0.8

/** Border places along one whole outline. */
const BORDER_PLACES = 2400

function turned(xMm: number, yMm: number, angle: number): PlaceMm {
  const cos = Math.cos(angle)
  const sin = Math.sin(angle)
  return [xMm * cos - yMm * sin, xMm * sin + yMm * cos]
}

function slotPolygons(slots: Slots): PlaceMm[][] {
  const half = slots.widthMm / 2
  return Array.from({ length: slots.count }, (_, index) => {
    const angle = ((slots.firstDeg + (360 * index) / slots.count) * Math.PI) / 180
    return [
      turned(slots.innerRadiusMm, -half, angle),
      turned(slots.outerRadiusMm, -half, angle),
      turned(slots.outerRadiusMm, half, angle),
      turned(slots.innerRadiusMm, half, angle),
    ]
  })
}

function arcPlaces(centre: PlaceMm, radiusMm: number, from: number, to: number, count: number): PlaceMm[] {
  return Array.from({ length: count + 1 }, (_, index) => {
    const angle = from + ((to - from) * index) / count
    return [centre[0] + radiusMm * Math.cos(angle), centre[1] + radiusMm * Math.sin(angle)] as const
  })
}

function kidneyPolygon(port: KidneyPort): PlaceMm[] {
  const half = port.widthMm / 2
  const start = ((port.middleDeg - port.spanDeg / 2) * Math.PI) / 180
  const end = ((port.middleDeg + port.spanDeg / 2) * Math.PI) / 180
  const endCentre = turned(port.radiusMm, 0, end)
  const startCentre = turned(port.radiusMm, 0, start)
  return [
    ...arcPlaces([0, 0], port.radiusMm + half, start, end, 16),
    ...arcPlaces(endCentre, half, end, end + Math.PI, 8).slice(1, -1),
    ...arcPlaces([0, 0], port.radiusMm - half, end, start, 16),
    ...arcPlaces(startCentre, half, start + Math.PI, start + 2 * Math.PI, 8).slice(1, -1),
  ]
}

function markPolygon(face: Face, mark: PlaceMm): PlaceMm[] {
  return arcPlaces(mark, 2 * faceRadiusMm(face) * MARK_RADIUS_SHARE, 0, 2 * Math.PI, 24).slice(0, -1)
}

/** Tells where the dots of the datum marks lie. */
export function datumMarkDots(face: Face): (xMm: number, yMm: number) => boolean {
  const dotMm = 2 * faceRadiusMm(face) * MARK_RADIUS_SHARE * MARK_DOT_SHARE
  return (x, y) => face.datumMarksMm.some((mark) => (x - mark[0]) ** 2 + (y - mark[1]) ** 2 < dotMm * dotMm)
}

/** Everything left out of a face, bore first. */
export function leaveOuts(face: Face): LeaveOut[] {
  const bore: LeaveOut[] = face.boreMm > 0 ? [{ kind: 'circle', radiusMm: face.boreMm / 2 }] : []
  const slots = face.slots ? slotPolygons(face.slots) : []
  return [
    ...bore,
    ...slots.map((pointsMm): LeaveOut => ({ kind: 'polygon', pointsMm })),
    ...face.kidneyPorts.map((port): LeaveOut => ({ kind: 'polygon', pointsMm: kidneyPolygon(port) })),
    ...face.datumMarksMm.map((mark): LeaveOut => ({ kind: 'polygon', pointsMm: markPolygon(face, mark) })),
  ]
}

/** Whether a place lies inside a polygon (even-odd rule). */
export function polygonHolds(points: readonly PlaceMm[], x: number, y: number): boolean {
  let inside = false
  for (let i = 0, j = points.length - 1; i < points.length; j = i++) {
    const [xi, yi] = points[i]
    const [xj, yj] = points[j]
    if (yi > y !== yj > y && x < ((xj - xi) * (y - yi)) / (yj - yi) + xi) inside = !inside
  }
  return inside
}

interface BoundedPolygon {
  points: readonly PlaceMm[]
  centre: PlaceMm
  reachMm2: number
}

function bounded(points: readonly PlaceMm[]): BoundedPolygon {
  const x = points.reduce((sum, point) => sum + point[0], 0) / points.length
  const y = points.reduce((sum, point) => sum + point[1], 0) / points.length
  const reachMm2 = Math.max(...points.map((point) => (point[0] - x) ** 2 + (point[1] - y) ** 2))
  return { points, centre: [x, y], reachMm2 }
}

function polygonsOf(face: Face): BoundedPolygon[] {
  return leaveOuts(face).flatMap((shape) => (shape.kind === 'polygon' ? [bounded(shape.pointsMm)] : []))
}

function outlineHolds(face: Face, insetMm: number): (xMm: number, yMm: number) => boolean {
  if (face.shape === 'block') {
    const halfX = face.sizeMm[0] / 2 - insetMm
    const halfY = face.sizeMm[1] / 2 - insetMm
    return (x, y) => Math.abs(x) <= halfX && Math.abs(y) <= halfY
  }
  const outer2 = (faceRadiusMm(face) - insetMm) ** 2
  const inner2 = face.boreMm > 0 ? (face.boreMm / 2 + insetMm) ** 2 : -1
  return (x, y) => {
    const radius2 = x * x + y * y
    return radius2 <= outer2 && radius2 >= inner2
  }
}

/** Tells for every part place whether it is on the face and not left out; `insetMm` takes an edge band off. */
export function faceHolds(face: Face, insetMm: number): (xMm: number, yMm: number) => boolean {
  const onOutline = outlineHolds(face, insetMm)
  const polygons = polygonsOf(face)
  return (x, y) => {
    if (!onOutline(x, y)) return false
    for (const { points, centre, reachMm2 } of polygons) {
      if ((x - centre[0]) ** 2 + (y - centre[1]) ** 2 > reachMm2) continue
      if (polygonHolds(points, x, y)) return false
    }
    return true
  }
}

/** Places along a closed polygon, evenly, corners among them. */
function alongPolygon(points: readonly PlaceMm[], stepMm: number): PlaceMm[] {
  return points.flatMap((from, index) => {
    const to = points[(index + 1) % points.length]
    const count = Math.max(1, Math.ceil(Math.hypot(to[0] - from[0], to[1] - from[1]) / stepMm))
    return Array.from({ length: count }, (_, step): PlaceMm => {
      const t = step / count
      return [from[0] + t * (to[0] - from[0]), from[1] + t * (to[1] - from[1])]
    })
  })
}

function outlineBorder(face: Face): PlaceMm[] {
  const inset = face.edgeBandMm
  if (face.shape === 'block') {
    const halfX = face.sizeMm[0] / 2 - inset
    const halfY = face.sizeMm[1] / 2 - inset
    const corners: PlaceMm[] = [
      [-halfX, -halfY],
      [halfX, -halfY],
      [halfX, halfY],
      [-halfX, halfY],
    ]
    return alongPolygon(corners, (4 * (halfX + halfY)) / BORDER_PLACES)
  }
  const rim = arcPlaces([0, 0], faceRadiusMm(face) - inset, 0, 2 * Math.PI, BORDER_PLACES)
  if (face.boreMm === 0) return rim
  return [...rim, ...arcPlaces([0, 0], face.boreMm / 2 + inset, 0, 2 * Math.PI, BORDER_PLACES)]
}

/** The measured area of a face. */
export function measuredArea(face: Face): MeasuredArea {
  const holds = faceHolds(face, face.edgeBandMm)
  const polygons = polygonsOf(face)
  const onOutline = outlineHolds(face, face.edgeBandMm)
  const isLeftOut = (x: number, y: number) => polygons.some(({ points }) => polygonHolds(points, x, y))
  const stepMm = (Math.PI * 2 * faceRadiusMm(face)) / BORDER_PLACES

  function borderPlacesMm(): PlaceMm[] {
    const outline = outlineBorder(face).filter(([x, y]) => !isLeftOut(x, y))
    const edges = polygons.flatMap(({ points }) => alongPolygon(points, stepMm))
    return [...outline, ...edges.filter(([x, y]) => onOutline(x, y))]
  }

  return { holds, borderPlacesMm }
}
