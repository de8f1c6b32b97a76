import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64'
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus'

/** A stream of random numbers that is the same for the same seed on every machine. */
export interface SeededRandom {
  between(low: number, high: number): number
  /** Whole number from low to high, both included. */
  whole(low: number, high: number): number
  normal(): number
  /** +1 or −1. */
  sign(): number
  pick<T>(choices: readonly T[]): T
}

/** Mixes a seed and a purpose into 32 bits, so that neighbouring seeds and purposes give unrelated streams. */
function mixedSeed(seed: number, purpose: string): number {
  let hash = 2166136261 ^ (seed | 0)
  for (const letter of `${purpose}#${seed}`) {
    hash = Math.imul(hash ^ letter.charCodeAt(0), 16777619)
  }
  hash = Math.imul(hash ^ (hash >>> 16), 2246822507)
  return hash ^ (hash >>> 13)
}

/** Starts the stream of a seed; `purpose` keeps the streams of one scene apart. */
export function seededRandom(seed: number, purpose: string): SeededRandom {
  const generator = xoroshiro128plus(mixedSeed(seed, purpose))
  const unit = () => uniformFloat64(generator)
  let spare: number | null = null

  function normal(): number {
    if (spare !== null) {
      const value = spare
      spare = null
      return value
    }
    const radius = Math.sqrt(-2 * Math.log(1 - unit()))
    const angle = 2 * Math.PI * unit()
    spare = radius * Math.sin(angle)
    return radius * Math.cos(angle)
  }

  return {
    between: (low, high) => low + (high - low) * unit(),
    whole: (low, high) => low + Math.floor((high - low + 1) * unit()),
    normal,
    sign: () => (unit() < 0.5 ? -1 : 1),
    pick: (choices) => choices[Math.floor(choices.length * unit())],
  }
}
