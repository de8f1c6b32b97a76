import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64'
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus'

/** Pairs of normal numbers of a deviation, the same for a seed. */
export function seededNormal(seed: number, deviation: number): () => readonly [number, number] {
  const generator = xoroshiro128plus(seed)
  return () => {
    const radius = deviation * Math.sqrt(-2 * Math.log(1 - uniformFloat64(generator)))
    const angle = 2 * Math.PI * uniformFloat64(generator)
    return [radius * Math.cos(angle), radius * Math.sin(angle)]
  }
}
