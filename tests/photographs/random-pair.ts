import { type Form, plainScene, type Scene } from './scene'
import { commonLamps, lappedForm, setAnnulus, setBands, setTurn } from './scene-parts'
import { type SeededRandom, seededRandom } from './seeded-random'

/** A piece before and after lapping, turned on the bench between the two photographs. */
export interface ScenePair {
  before: Scene
  after: Scene
  /** Turn of the piece in the photograph from before to after, clockwise as seen, 0 to 360. */
  turnedDeg: number
}

function scaledForm(form: Form, share: number): Form {
  const entries = Object.entries(form).map(([term, amountUm]) => [term, share * amountUm])
  return Object.fromEntries(entries) as unknown as Form
}

function pairBefore(seed: number, random: SeededRandom): Scene {
  const scene = plainScene(`pair-${seed}-before`, seed)
  scene.family = 'pair'
  scene.lamp = random.pick(commonLamps)
  const diameterMm = random.between(30, 55)
  const marks = [
    [0.31 * diameterMm, 0],
    [-0.1 * diameterMm, 0.27 * diameterMm],
  ] as const
  setAnnulus(scene, diameterMm, random.pick([0, 6]))
  scene.face = { ...scene.face, datumMarksMm: marks }
  scene.form = lappedForm(random, 1.2)
  scene.rolledRim = { ...scene.rolledRim, dropUm: random.between(0.08, 0.26) }
  scene.waviness = { rmsUm: 0.02, lengthMm: 9, seed }
  setTurn(scene, random.between(0, 360))
  setBands(scene, random, 12, 22)
  return scene
}

/** One piece before and after: less form, more rolled rim, the same waviness, laid down another way. */
export function randomPair(seed: number): ScenePair {
  const random = seededRandom(seed, 'pair')
  const before = pairBefore(seed, random)
  const after: Scene = { ...before, name: `pair-${seed}-after`, seed: seed + 0x10000 }
  after.form = scaledForm(before.form, random.between(0.25, 0.45))
  after.rolledRim = {
    ...before.rolledRim,
    dropUm: before.rolledRim.dropUm + random.between(0.01, 0.25),
  }
  setTurn(after, random.between(0, 360))
  setBands(after, random, 12, 22)
  return { before, after, turnedDeg: (after.camera.turnDeg - before.camera.turnDeg + 360) % 360 }
}
