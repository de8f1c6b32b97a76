import { heightUm } from './height'
import { bandHeightUm, faceRadiusMm, type Scene } from './scene'

/**
 * Gap between face and flat in bands at a part place. Whole numbers are the dark bands. The viewing angle counts once, at the
 * face's middle: the change of its cosine across the face is left out, as the gap is small.
 */
export function gapBands(scene: Scene): (xMm: number, yMm: number) => number {
  const height = heightUm(scene)
  const bandUm = bandHeightUm(scene)
  const { wedge, camera, face } = scene
  // The wedge is stated in the photo's axes; the piece is turned in it.
  const direction = ((wedge.towardsDeg - camera.turnDeg) * Math.PI) / 180
  const perMm = wedge.bandsAcross / (2 * faceRadiusMm(face))
  const alongX = perMm * Math.cos(direction)
  const alongY = perMm * Math.sin(direction)
  return (xMm, yMm) => wedge.middleBands + alongX * xMm + alongY * yMm - height(xMm, yMm) / bandUm
}
