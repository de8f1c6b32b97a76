import type { Trace } from '../schemas/marks'
import type { SetUp, TracedReading } from './types'

/** A set-up in which nothing is stated but the wavelength: helium d, square on. */
export const bareSetUp: SetUp = {
  wavelengthNm: 587.5618,
  wavelengthRelativeU: null,
  viewingAngleDeg: 0,
  viewingAngleUDeg: null,
  edgePlacementUMm: null,
  referenceFlatFormUm: null,
  temperatureHalfWidthUm: null,
  repeats: null,
  nearCamera: null,
  supportHalfWidthUm: null,
}

export const discPx = { cx: 800, cy: 600, r: 480 }
const mmPerPx = 20 / discPx.r

export interface ClosedFormOptions {
  /** Bands of wedge over the face; enough of them that the gap rises with x everywhere. */
  wedgeBands?: number
  /** Error added to every click, px, by click number. */
  clickError?: (click: number) => readonly [number, number]
  setUp?: Partial<SetUp>
}

/**
 * A 40 mm disc with a height known in closed form (µm over mm), under a flat wedged along x, with every dark band
 * traced exactly: for each row the place where the gap is a whole number of bands is found by bisection.
 */
export function closedFormReading(
  heightUm: (xMm: number, yMm: number) => number,
  { wedgeBands = 14, clickError = () => [0, 0], setUp = {} }: ClosedFormOptions = {},
): TracedReading {
  const bandUm = bareSetUp.wavelengthNm / 2000
  const gap = (xMm: number, yMm: number) => (wedgeBands * xMm) / 40 - heightUm(xMm, yMm) / bandUm
  const traces: Trace[] = []
  let click = 0
  for (let order = -40; order <= 40; order++) {
    const points: [number, number][] = []
    for (let y = -460; y <= 460; y += 20) {
      const half = Math.sqrt(discPx.r ** 2 - y * y) - 2
      const at = (xPx: number) => gap(xPx * mmPerPx, y * mmPerPx) - order
      if (at(-half) > 0 || at(half) < 0) continue
      let [low, high] = [-half, half]
      for (let k = 0; k < 60; k++) {
        const middle = (low + high) / 2
        if (at(middle) < 0) low = middle
        else high = middle
      }
      const [ex, ey] = clickError(click++)
      points.push([discPx.cx + low + ex, discPx.cy + y + ey])
    }
    if (points.length >= 3) traces.push({ id: `band ${order}`, order, points })
  }
  return {
    outline: { kind: 'circle', ...discPx },
    size: { kind: 'round', diameterMm: 40 },
    exclusions: [],
    edgeBandMm: 0.8,
    pressArrow: { x: 800, y: 600, dx: 1, dy: 0 },
    traces,
    photo: { widthPx: 1600, heightPx: 1200 },
    mirrored: false,
    setUp: { ...bareSetUp, ...setUp },
  }
}

/** A cap of a sphere: so many µm high in the middle over the rim of the 40 mm face. */
export const cap = (sagittaUm: number) => (x: number, y: number) => sagittaUm * (1 - (x * x + y * y) / 400)

/** A saddle that is high towards +x and −x by so many µm at the rim. */
export const saddle = (um: number) => (x: number, y: number) => (um * (x * x - y * y)) / 400

export const plane = () => 0
