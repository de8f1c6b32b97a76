import type { Scene, StoredFile } from './scene'
import {
  commonLamps,
  lappedForm,
  noForm,
  saddleForm,
  setAnnulus,
  setBands,
  setBlock,
  setDisc,
  setTurn,
} from './scene-parts'
import type { SeededRandom } from './seeded-random'

/** Makes a scene of open bands into one of a family. */
export type FamilyChange = (scene: Scene, random: SeededRandom) => void

/** What sets each family apart from open bands. */
export const familyChanges = {
  'open-bands': (scene, random) => {
    scene.waviness = { ...scene.waviness, rmsUm: random.between(0, 0.016) }
    scene.surface = { ...scene.surface, speckle: random.pick([0, 0.04, 0.06]) }
  },
  big: (scene, random) => {
    scene.camera = { ...scene.camera, widthPx: 4000, heightPx: 3000 }
    scene.sensor = { ...scene.sensor, blurPx: 2 }
    setBands(scene, random, 12, 26)
  },
  'few-bands': (scene, random) => {
    setDisc(scene, random.between(25, 45))
    setBands(scene, random, 3.2, 8)
  },
  sparse: (scene, random) => {
    scene.lamp = random.pick([...commonLamps, 'greenLaser', 'greenLaser'])
    setBands(scene, random, 3.2, 5.5)
    scene.surface = { ...scene.surface, speckle: 0.06 }
  },
  grooved: (scene, random) => {
    const diameterMm = random.pick([40, 60, 60, 80])
    const boreMm = random.between(0.05, 0.3) * diameterMm
    setAnnulus(scene, diameterMm, boreMm)
    setTurn(scene, random.between(0, 360))
    const landMm = (diameterMm - boreMm) / 2
    const slots = {
      count: random.whole(6, 14),
      innerRadiusMm: boreMm / 2 + random.between(0.18, 0.3) * landMm,
      outerRadiusMm: boreMm / 2 + random.between(0.65, 0.78) * landMm,
      widthMm: random.between(0.035, 0.055) * diameterMm,
      firstDeg: random.between(0, 60),
    }
    scene.face = { ...scene.face, slots }
    scene.rolledRim = {
      ...scene.rolledRim,
      dropUm: random.between(0.05, 0.35),
      widthMm: random.between(1.2, 2.5),
    }
    scene.surface = { ...scene.surface, speckle: 0.06 }
  },
  block: (scene, random) => setBlock(scene, random),
  'seal-ring': (scene, random) => {
    const diameterMm = random.between(30, 60)
    setAnnulus(scene, diameterMm, random.between(0.6, 0.8) * diameterMm)
    setTurn(scene, random.between(0, 360))
    scene.face = { ...scene.face, edgeBandMm: 0.5 }
    scene.form = { ...saddleForm(random, random.between(0.08, 0.35)), powerUm: random.between(-0.15, 0.15) }
  },
  tilted: (scene, random) => {
    scene.camera = { ...scene.camera, viewingAngleDeg: random.between(15, 40) }
    setBands(scene, random, 9, 18)
  },
  matte: (scene, random) => {
    scene.light = { ...scene.light, visibility: random.between(0.1, 0.22) }
    scene.surface = { ...scene.surface, speckle: random.between(0.1, 0.18) }
  },
  uneven: (scene, random) => {
    scene.light = {
      ...scene.light,
      vignette: random.between(0.5, 0.75),
      lightSlope: random.between(0.25, 0.45),
      ghost: random.between(0.02, 0.06),
    }
  },
  rings: (scene, random) => {
    const powerUm = random.sign() * random.between(0.6, 1.5)
    scene.form = { ...noForm(), powerUm, astig0Um: 0.06 * random.normal(), astig45Um: 0.06 * random.normal() }
    setBands(scene, random, 0.2, 2.5)
  },
  saddle: (scene, random) => {
    scene.form = saddleForm(random, random.between(0.45, 0.95))
    setBands(scene, random, 0.2, 1.6)
  },
  dense: (scene, random) => {
    setBands(scene, random, 64, 100)
    scene.form = lappedForm(random, 1.3)
    scene.sensor = { ...scene.sensor, blurPx: 0.8 }
  },
  dirty: (scene, random) => {
    scene.surface = {
      ...scene.surface,
      dustCount: random.whole(35, 90),
      scratchCount: random.whole(5, 14),
    }
  },
  stored: (scene, random) => {
    scene.file = random.pick<StoredFile>([
      { format: 'jpeg', colours: 'rgb', quality: 92, exifOrientation: 6 },
      { format: 'jpeg', colours: 'rgb', quality: 92, exifOrientation: 3 },
      { format: 'jpeg', colours: 'rgb', quality: 92, exifOrientation: 8 },
      { format: 'jpeg', colours: 'rgb', quality: 35, exifOrientation: 1 },
      { format: 'png16', colours: 'grey', quality: 92, exifOrientation: 1 },
      { format: 'png16', colours: 'rgb', quality: 92, exifOrientation: 1 },
      { format: 'png8', colours: 'rgb', quality: 92, exifOrientation: 1 },
      { format: 'tiff8', colours: 'grey', quality: 92, exifOrientation: 1 },
      { format: 'webp', colours: 'rgb', quality: 90, exifOrientation: 1 },
    ])
  },
  'rolled-edge': (scene, random) => {
    scene.rolledRim = {
      ...scene.rolledRim,
      dropUm: random.between(0.5, 1),
      widthMm: random.between(1.4, 3),
    }
    setBands(scene, random, 15, 30)
  },
  figured: (scene, random) => {
    scene.waviness = {
      ...scene.waviness,
      rmsUm: random.between(0.02, 0.05),
      lengthMm: random.between(4.5, 8),
    }
    setBands(scene, random, 15, 30)
  },
  bumps: (scene, random) => {
    const radiusMm = scene.face.sizeMm[0] / 2
    scene.bumps = Array.from({ length: random.whole(1, 4) }, () => ({
      xMm: random.between(-0.65, 0.65) * radiusMm,
      yMm: random.between(-0.65, 0.65) * radiusMm,
      heightUm: random.sign() * random.between(0.05, 0.25),
      sigmaMm: random.between(0.08, 0.25) * radiusMm,
    }))
    setBands(scene, random, 14, 28)
  },
  'lobed-rim': (scene, random) => {
    setTurn(scene, random.between(0, 360))
    scene.rolledRim = {
      dropUm: random.between(0.15, 0.7),
      widthMm: random.between(1.2, 3),
      lobeShare: random.between(0.2, 0.7),
      lobeCount: random.whole(2, 5),
      lobeDeg: random.between(0, 360),
    }
    setBands(scene, random, 13, 28)
  },
  'off-centre': (scene, random) => {
    const fill = random.between(0.55, 0.72)
    const roomMm = (scene.face.sizeMm[0] / 2) * (1 / fill - 1.05)
    const offsetMm = [roomMm * random.between(-1.5, 1.5), roomMm * random.between(-0.9, 0.9)] as const
    scene.camera = { ...scene.camera, fill, offsetMm }
  },
  small: (scene, random) => {
    scene.camera = { ...scene.camera, fill: random.between(0.38, 0.55) }
    setBands(scene, random, 8, 18)
  },
  distorted: (scene, random) => {
    scene.camera = { ...scene.camera, distortion: random.sign() * random.between(0.001, 0.006) }
  },
  'valve-plate': (scene, random) => {
    const diameterMm = random.between(60, 110)
    setAnnulus(scene, diameterMm, random.between(0.12, 0.25) * diameterMm)
    setTurn(scene, random.between(0, 360))
    const count = random.pick([2, 3, 4, 6])
    const port = {
      radiusMm: random.between(0.28, 0.33) * diameterMm,
      widthMm: random.between(0.08, 0.12) * diameterMm,
      spanDeg: (360 / count) * random.between(0.45, 0.62),
    }
    const kidneyPorts = Array.from({ length: count }, (_, index) => ({
      ...port,
      middleDeg: (360 * index) / count,
    }))
    scene.face = { ...scene.face, kidneyPorts }
  },
  'tilted-block': (scene, random) => {
    setBlock(scene, random)
    scene.camera = { ...scene.camera, fill: 0.8, viewingAngleDeg: random.between(10, 32) }
    setBands(scene, random, 8, 16)
  },
  'tilted-ring': (scene, random) => {
    const diameterMm = random.between(35, 60)
    setAnnulus(scene, diameterMm, random.between(0.3, 0.65) * diameterMm)
    scene.camera = { ...scene.camera, viewingAngleDeg: random.between(12, 35) }
    setBands(scene, random, 8, 16)
  },
  'few-bands-ring': (scene, random) => {
    const diameterMm = random.between(30, 60)
    setAnnulus(scene, diameterMm, random.between(0.25, 0.6) * diameterMm)
    setTurn(scene, random.between(0, 360))
    setBands(scene, random, 3.2, 8)
  },
  contrasty: (scene, random) => {
    scene.sensor = { ...scene.sensor, toneCurve: random.between(0.15, 0.6) }
  },
  glints: (scene, random) => {
    scene.light = { ...scene.light, hotspots: random.whole(1, 4) }
  },
  harmonic: (scene, random) => {
    scene.light = { ...scene.light, harmonic: random.sign() * random.between(0.03, 0.12) }
  },
} satisfies Record<string, FamilyChange>
