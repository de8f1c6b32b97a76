import { type Camera, type Face, faceRadiusMm, type PlaceMm, type Scene } from './scene'

export type PlacePx = readonly [xPx: number, yPx: number]

/**
 * Where part places fall in the photograph, and back.
 *
 * The camera looks at the face's middle from `distance`; the face is turned by `turnDeg`, then tilted by the viewing angle
 * t about the line through its middle square to the direction in which it recedes. With q along that direction and p
 * square to it, a place comes to p/(1 + q sin t/distance) and q cos t/(1 + q sin t/distance): a disc becomes an ellipse
 * whose middle isn't the disc's. An offset then shifts the picture, as cropping does.
 */
export interface PhotoGeometry {
  photoFromPart(xMm: number, yMm: number): PlacePx
  partFromPhoto(xPx: number, yPx: number): PlaceMm
  /** Scale at the face's middle. */
  pxPerMm: number
}

function scalePxPerMm(face: Face, camera: Camera): number {
  if (face.shape === 'block') return (camera.fill * camera.widthPx) / face.sizeMm[0]
  return (camera.fill * Math.min(camera.widthPx, camera.heightPx)) / 2 / faceRadiusMm(face)
}

function turnBy(angleDeg: number): { cos: number; sin: number } {
  const angle = (angleDeg * Math.PI) / 180
  return { cos: Math.cos(angle), sin: Math.sin(angle) }
}

/** Radial distortion about the photo's middle: what a squared radius is multiplied by, going out and coming back. */
function lens(camera: Camera) {
  const cornerPx2 = (camera.widthPx ** 2 + camera.heightPx ** 2) / 4
  const strength = camera.distortion / cornerPx2
  const stretch = (radiusPx2: number) => 1 + strength * radiusPx2
  function shrink(distortedPx2: number): number {
    let factor = 1
    for (let step = 0; step < 12 && strength !== 0; step++)
      factor = 1 / stretch(distortedPx2 * factor * factor)
    return factor
  }
  return { stretch, shrink }
}

/** The photograph's geometry of a scene. */
export function photoGeometry(scene: Scene): PhotoGeometry {
  const { camera, face } = scene
  const pxPerMm = scalePxPerMm(face, camera)
  const turn = turnBy(camera.turnDeg)
  const recede = turnBy(camera.recedesDeg)
  const view = turnBy(camera.viewingAngleDeg)
  const depth = view.sin / (camera.distanceInFaceSizes * 2 * faceRadiusMm(face))
  const middleX = (camera.widthPx - 1) / 2
  const middleY = (camera.heightPx - 1) / 2
  const shiftX = camera.offsetMm[0] * pxPerMm
  const shiftY = camera.offsetMm[1] * pxPerMm
  const { stretch, shrink } = lens(camera)

  function photoFromPart(xMm: number, yMm: number): PlacePx {
    const x = xMm * turn.cos - yMm * turn.sin
    const y = xMm * turn.sin + yMm * turn.cos
    const q = x * recede.cos + y * recede.sin
    const p = -x * recede.sin + y * recede.cos
    const scale = pxPerMm / (1 + q * depth)
    const flatX = (q * view.cos * recede.cos - p * recede.sin) * scale + shiftX
    const flatY = (q * view.cos * recede.sin + p * recede.cos) * scale + shiftY
    const factor = stretch(flatX * flatX + flatY * flatY)
    return [middleX + flatX * factor, middleY + flatY * factor]
  }

  function partFromPhoto(xPx: number, yPx: number): PlaceMm {
    const offX = xPx - middleX
    const offY = yPx - middleY
    const factor = shrink(offX * offX + offY * offY)
    const flatX = (offX * factor - shiftX) / pxPerMm
    const flatY = (offY * factor - shiftY) / pxPerMm
    const along = flatX * recede.cos + flatY * recede.sin
    const across = -flatX * recede.sin + flatY * recede.cos
    const q = along / (view.cos - along * depth)
    const p = across * (1 + q * depth)
    const x = q * recede.cos - p * recede.sin
    const y = q * recede.sin + p * recede.cos
    return [x * turn.cos + y * turn.sin, -x * turn.sin + y * turn.cos]
  }

  return { photoFromPart, partFromPhoto, pxPerMm }
}
