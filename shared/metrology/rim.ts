import type { PartFrame } from '../geometry/part-frame'
import { acrossMmOf } from './face-basis'
import type { MeasuredPlaces } from './measured-area'
import type { SurfaceFit } from './surface-fit'
import type { TracedReading } from './types'

type Place = readonly [number, number]

/** Distance of every place from the face's outline, mm, inside positive. */
export function rimDistancesMm(
  reading: TracedReading,
  frame: PartFrame,
  places: MeasuredPlaces,
): Float64Array {
  const { outline } = reading
  if (outline.kind !== 'polygon') {
    const radius = acrossMmOf(reading) / 2
    return places.xMm.map((x, i) => radius - Math.hypot(x, places.yMm[i]!))
  }
  const corners = outline.points.map(([x, y]) => frame.toMm(x, y))
  return places.xMm.map((x, i) => distanceToSides(corners, x, places.yMm[i]!))
}

function distanceToSides(corners: readonly Place[], x: number, y: number): number {
  let least = Number.POSITIVE_INFINITY
  for (let i = 0, j = corners.length - 1; i < corners.length; j = i++) {
    const [ax, ay] = corners[j]!
    const [dx, dy] = [corners[i]![0] - ax, corners[i]![1] - ay]
    const share = Math.min(1, Math.max(0, ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy || 1)))
    least = Math.min(least, Math.hypot(x - ax - share * dx, y - ay - share * dy))
  }
  return least
}

/** Places nearer to a rim than this share of the face's size are moved when the outline is put elsewhere. */
const NEAR_RIM_SHARE = 0.02

/**
 * How much the figure changes per mm by which the outline is misplaced: the steeper of the slopes at the
 * extremes that touch a rim, across the rim. Extremes inside the face don't move: 0 for them. µm per mm.
 */
export function steepestRimSlope(
  fit: SurfaceFit,
  reading: TracedReading,
  frame: PartFrame,
  extremes: readonly number[],
  places: MeasuredPlaces,
  bandUm: number,
): number {
  const distance = rimDistancesMm(reading, frame, places)
  const near = NEAR_RIM_SHARE * Math.sqrt(places.weightMm2.reduce((a, b) => a + b, 0)) + reading.edgeBandMm
  let steepest = 0
  for (const i of extremes) {
    if (!(distance[i]! < near)) continue
    const [x, y] = [places.xMm[i]!, places.yMm[i]!]
    const r = Math.hypot(x, y) || 1
    const step = 0.01 * r
    const inner = fit.gapAt(x - (step * x) / r, y - (step * y) / r)
    const slope = (fit.gapAt(x, y) - inner) / step
    steepest = Math.max(steepest, Math.abs(slope - tiltAcross(fit, places, x / r, y / r)) * bandUm)
  }
  return steepest
}

/** The plane's own slope carries no form: mean slope of the gap over the face along a direction, bands per mm. */
function tiltAcross(fit: SurfaceFit, places: MeasuredPlaces, ux: number, uy: number): number {
  let [su, sg, suu, sug, n] = [0, 0, 0, 0, 0]
  const stride = Math.max(1, Math.floor(places.interiorCount / 200))
  for (let i = 0; i < places.interiorCount; i += stride) {
    const u = places.xMm[i]! * ux + places.yMm[i]! * uy
    const g = fit.gapAt(places.xMm[i]!, places.yMm[i]!)
    su += u
    sg += g
    suu += u * u
    sug += u * g
    n++
  }
  const spread = suu - (su * su) / n
  return spread > 0 ? (sug - (su * sg) / n) / spread : 0
}
