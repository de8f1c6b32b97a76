import { type Form, plainScene, type Scene, type Wedge, withPhotoWidth } from '../../tests/photographs/scene'
import { demoFace } from './demo-faces'

const photoWidthPx = 1200

/** What is particular to one photograph of the demo shop. */
export interface DemoPhoto {
  part: string
  seed: number
  lamp: 'sodium' | 'helium'
  form: Partial<Form>
  wedge: Pick<Wedge, 'bandsAcross' | 'towardsDeg'>
  turnDeg: number
  rimDropUm?: number
  /** Photographs of one piece share it. */
  wavinessSeed?: number
  dustCount?: number
}

const flat: Form = { powerUm: 0, astig0Um: 0, astig45Um: 0, comaXUm: 0, comaYUm: 0, sphericalUm: 0 }

/** The scene of a demo photograph: face, form, light and camera. */
export function demoScene(photo: DemoPhoto): Scene {
  const plain = plainScene(`${photo.part}-${photo.seed}`, photo.seed)
  const face = demoFace(photo.part)
  return withPhotoWidth(
    {
      ...plain,
      lamp: photo.lamp,
      face,
      form: { ...flat, ...photo.form },
      rolledRim: { ...plain.rolledRim, dropUm: photo.rimDropUm ?? 0 },
      waviness: { rmsUm: 0.006, lengthMm: 10, seed: photo.wavinessSeed ?? photo.seed },
      wedge: { ...photo.wedge, middleBands: photo.wedge.bandsAcross / 2 + 5.4 },
      camera: { ...plain.camera, turnDeg: photo.turnDeg, fill: face.shape === 'block' ? 0.86 : 0.84 },
      surface: { ...plain.surface, speckle: 0.02, dustCount: photo.dustCount ?? 6 },
    },
    photoWidthPx,
  )
}
