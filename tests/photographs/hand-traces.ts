import type { PlacePx } from './camera'
import { type DarkBand, darkBands, nearestBandPlace } from './dark-bands'
import type { Scene } from './scene'
import { seededRandom } from './seeded-random'

export interface Trace {
  order: number
  points: PlacePx[]
}

/** Pixels between clicks, and standard deviation of a click along each axis, both in a photo 1600 px wide. */
const CLICK_SPACING_PX = 20
const CLICK_NOISE_PX = 0.7
const REFERENCE_WIDTH_PX = 1600

/** Shortest piece of band that a person traces: three clicks. */
const LEAST_CLICKS = 3

function lengthsAlong(points: readonly PlacePx[]): number[] {
  const along = [0]
  for (let i = 1; i < points.length; i++) {
    along.push(along[i - 1] + Math.hypot(points[i][0] - points[i - 1][0], points[i][1] - points[i - 1][1]))
  }
  return along
}

function evenPlaces(points: readonly PlacePx[], along: readonly number[], count: number): PlacePx[] {
  const total = along[along.length - 1]
  let segment = 1
  return Array.from({ length: count }, (_, index): PlacePx => {
    const target = (total * index) / (count - 1)
    while (segment < points.length - 1 && along[segment] < target) segment++
    const t = (target - along[segment - 1]) / (along[segment] - along[segment - 1] || 1)
    const from = points[segment - 1]
    const to = points[segment]
    return [from[0] + t * (to[0] - from[0]), from[1] + t * (to[1] - from[1])]
  })
}

function clicksOn(band: DarkBand, spacingPx: number, ontoBand: (place: PlacePx) => PlacePx): PlacePx[] {
  const along = lengthsAlong(band.points)
  const count = Math.floor(along[along.length - 1] / spacingPx)
  if (count < LEAST_CLICKS) return []
  return evenPlaces(band.points, along, count).map(ontoBand)
}

const hundredths = (value: number) => Math.round(value * 100) / 100

/**
 * Traces as a careful person clicks them: evenly along each piece of dark band from end to end, every click off by its own
 * independent error. `noiseShare` scales the error; 0 gives places exactly on the bands.
 */
export function handTraces(scene: Scene, seed: number, noiseShare = 1): Trace[] {
  const random = seededRandom(seed, 'clicks')
  const photoShare = scene.camera.widthPx / REFERENCE_WIDTH_PX
  const noisePx = CLICK_NOISE_PX * photoShare * noiseShare
  const ontoBand = nearestBandPlace(scene)
  const click = ([x, y]: PlacePx): PlacePx =>
    noisePx === 0
      ? [x, y]
      : [hundredths(x + noisePx * random.normal()), hundredths(y + noisePx * random.normal())]
  return darkBands(scene)
    .map((band) => ({ order: band.order, points: clicksOn(band, CLICK_SPACING_PX * photoShare, ontoBand) }))
    .filter((trace) => trace.points.length > 0)
    .map((trace) => ({ order: trace.order, points: trace.points.map(click) }))
}
