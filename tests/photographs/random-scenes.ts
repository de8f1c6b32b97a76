import { type FamilyChange, familyChanges } from './family-changes'
import { randomPair } from './random-pair'
import type { Scene } from './scene'
import { openBands } from './scene-parts'
import { seededRandom } from './seeded-random'

/** Families of random scenes: what is hard about each stands in its name. */
export type Family = keyof typeof familyChanges | 'pair'

/** All families; `pair` gives two photographs of one piece. */
export const families: readonly Family[] = [...(Object.keys(familyChanges) as Family[]), 'pair']

/** The scene of a family and a seed; of a pair, the photograph before lapping. */
export function randomScene(family: Family, seed: number): Scene {
  if (family === 'pair') return randomPair(seed).before
  const random = seededRandom(seed, family)
  // Dirt, light and waviness follow from the scene's own seed: without this all families would share them.
  const sceneSeed = seed + 100_003 * families.indexOf(family)
  const scene = openBands(`${family}-${seed}`, sceneSeed, random)
  scene.family = family
  const change: FamilyChange = familyChanges[family]
  change(scene, random)
  return scene
}
