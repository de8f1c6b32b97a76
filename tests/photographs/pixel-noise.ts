import { seededRandom } from './seeded-random'

const TABLE_SIZE = 1 << 16

/**
 * A source of normal noise fast enough for every pixel: a table of normal numbers, looked up at places from a xorshift
 * generator. The same seed and purpose give the same noise.
 */
export function pixelNoise(seed: number, purpose: string): () => number {
  const random = seededRandom(seed, purpose)
  const table = Float32Array.from({ length: TABLE_SIZE }, () => random.normal())
  let state = random.whole(1, 2 ** 31 - 1)
  return () => {
    state ^= state << 13
    state ^= state >>> 17
    state ^= state << 5
    return table[(state >>> 8) & (TABLE_SIZE - 1)]
  }
}
