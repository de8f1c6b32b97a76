import { type Form, type Lamp, plainScene, type Scene } from './scene'
import type { SeededRandom } from './seeded-random'

/** Lamps that a shop is likely to have. */
export const commonLamps: readonly Lamp[] = ['heneLaser', 'helium', 'sodium', 'mercuryGreen']

/** Low-order form of a lapped face, in µm: a hollow or a hill, a saddle, and a little coma and sphere of fourth order. */
export function lappedForm(random: SeededRandom, strength = 1): Form {
  return {
    powerUm: strength * random.sign() * random.between(0.03, 0.26),
    astig0Um: strength * 0.065 * random.normal(),
    astig45Um: strength * 0.065 * random.normal(),
    comaXUm: strength * 0.016 * random.normal(),
    comaYUm: strength * 0.008 * random.normal(),
    sphericalUm: strength * random.between(-0.035, 0.035),
  }
}

/** A perfect plane. */
export function noForm(): Form {
  return { powerUm: 0, astig0Um: 0, astig45Um: 0, comaXUm: 0, comaYUm: 0, sphericalUm: 0 }
}

/** Lays the flat so that between `least` and `most` bands cross the face, in any direction. */
export function setBands(scene: Scene, random: SeededRandom, least: number, most: number): void {
  const bandsAcross = random.between(least, most)
  scene.wedge = {
    bandsAcross,
    towardsDeg: random.between(0, 360),
    middleBands: bandsAcross / 2 + random.between(4, 9),
  }
}

/** Makes the face a plain disc. */
export function setDisc(scene: Scene, diameterMm: number): void {
  scene.face = { ...scene.face, shape: 'disc', sizeMm: [diameterMm, diameterMm] }
}

/** Makes the face a disc with a bore. */
export function setAnnulus(scene: Scene, diameterMm: number, boreMm: number): void {
  scene.face = { ...scene.face, shape: 'annulus', sizeMm: [diameterMm, diameterMm], boreMm }
}

/** Turns the piece in the photograph. */
export function setTurn(scene: Scene, turnDeg: number): void {
  scene.camera = { ...scene.camera, turnDeg }
}

/** A lapped disc with a fair number of bands: what most families begin with. */
export function openBands(name: string, seed: number, random: SeededRandom): Scene {
  const scene = plainScene(name, seed)
  scene.lamp = random.pick(commonLamps)
  setDisc(scene, random.pick([30, 40, 40, 40, 50, 60]))
  scene.form = lappedForm(random)
  setBands(scene, random, 10, 22)
  return scene
}

/** A saddle in any direction, with a little hill or hollow. */
export function saddleForm(random: SeededRandom, amountUm: number): Form {
  const direction = random.between(0, 2 * Math.PI)
  return {
    ...noForm(),
    powerUm: random.between(-0.15, 0.15),
    astig0Um: amountUm * Math.cos(direction),
    astig45Um: amountUm * Math.sin(direction),
  }
}

/** Makes the face a block, somewhat turned in the photograph. */
export function setBlock(scene: Scene, random: SeededRandom): void {
  const lengthMm = random.pick([20, 30, 35, 50, 60])
  const heightMm = random.pick([9, 9, 0.35 * lengthMm, 0.6 * lengthMm])
  scene.face = { ...scene.face, shape: 'block', sizeMm: [lengthMm, heightMm], edgeBandMm: 0.5 }
  scene.form = {
    ...noForm(),
    powerUm: random.sign() * random.between(0.03, 0.2),
    astig0Um: 0.06 * random.normal(),
    astig45Um: random.sign() * random.between(0.05, 0.35),
  }
  scene.camera = { ...scene.camera, fill: 0.85, turnDeg: random.between(-8, 8) }
}
