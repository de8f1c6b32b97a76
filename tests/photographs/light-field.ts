import { photoGeometry } from './camera'
import { gapBands } from './gap'
import { datumMarkDots, faceHolds } from './measured-area'
import { faceRadiusMm, type Light, type Scene } from './scene'
import { seededRandom } from './seeded-random'

/** Light of each part of the picture over the exposure, away from bands. */
const FACE_SHARE = 0.68
const SLOT_SHARE = 0.29
const BENCH_SHARE = 0.165

/** Bands across the face in the weak second set that a flat's upper side gives. */
const GHOST_BANDS = [30, 60] as const

/**
 * Two-beam interference, a(1 − V cos 2πg): dark where the gap g is a whole number of bands; the second harmonic squeezes or
 * widens the dark bands.
 */
function interference(light: Light, gap: number): number {
  const phase = 2 * Math.PI * gap
  const first = light.visibility * Math.cos(phase)
  return light.harmonic === 0 ? 1 - first : 1 - first + light.harmonic * Math.cos(2 * phase)
}

/** Falls off to the photo's corners and along one direction. */
function unevenLight(scene: Scene): (xPx: number, yPx: number) => number {
  const { camera, light } = scene
  const direction = seededRandom(scene.seed, 'light').between(0, 2 * Math.PI)
  const halfX = (camera.widthPx - 1) / 2
  const halfY = (camera.heightPx - 1) / 2
  const corner2 = halfX * halfX + halfY * halfY
  const slopeX = (light.lightSlope * Math.cos(direction)) / Math.sqrt(corner2)
  const slopeY = (light.lightSlope * Math.sin(direction)) / Math.sqrt(corner2)
  return (xPx, yPx) => {
    const x = xPx - halfX
    const y = yPx - halfY
    return (1 - (light.vignette * (x * x + y * y)) / corner2) * (1 + slopeX * x + slopeY * y)
  }
}

function ghostBands(scene: Scene): (xMm: number, yMm: number) => number {
  if (scene.light.ghost === 0) return () => 0
  const random = seededRandom(scene.seed, 'ghost')
  const direction = random.between(0, 2 * Math.PI)
  const perMm = (Math.PI * random.between(...GHOST_BANDS)) / faceRadiusMm(scene.face)
  const alongX = perMm * Math.cos(direction)
  const alongY = perMm * Math.sin(direction)
  return (xMm, yMm) => scene.light.ghost * Math.cos(alongX * xMm + alongY * yMm)
}

/** Light at a part place over the exposure: bands on the face, dimmer slots and marks, dark bench and bore. */
function placeLight(scene: Scene): (xMm: number, yMm: number) => number {
  const { face, light } = scene
  const gap = gapBands(scene)
  const ghost = ghostBands(scene)
  const isOnFace = faceHolds({ ...face, datumMarksMm: [] }, 0)
  const isInOutline = faceHolds({ ...face, slots: null, kidneyPorts: [], datumMarksMm: [] }, 0)
  const isMark = datumMarkDots(face)
  return (xMm, yMm) => {
    if (isOnFace(xMm, yMm)) {
      if (isMark(xMm, yMm)) return SLOT_SHARE
      return FACE_SHARE * (interference(light, gap(xMm, yMm)) + ghost(xMm, yMm))
    }
    return isInOutline(xMm, yMm) ? SLOT_SHARE : BENCH_SHARE
  }
}

/** What falls onto the picture of a clean face through a perfect lens: linear light, 1 is white, row by row. */
export function lightField(scene: Scene): Float32Array {
  const { widthPx, heightPx } = scene.camera
  const { partFromPhoto } = photoGeometry(scene)
  const lightAt = placeLight(scene)
  const uneven = unevenLight(scene)
  const field = new Float32Array(widthPx * heightPx)
  for (let y = 0; y < heightPx; y++) {
    for (let x = 0; x < widthPx; x++) {
      const place = partFromPhoto(x, y)
      field[y * widthPx + x] = scene.light.exposure * uneven(x, y) * lightAt(place[0], place[1])
    }
  }
  return field
}
