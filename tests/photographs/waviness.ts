import type { Waviness } from './scene'
import { seededRandom } from './seeded-random'

/**
 * Random smooth field: white noise on a lattice, each node spread by a cubic B-spline. Twice continuously
 * differentiable, the same at a place from whatever direction it is asked, and cheap (16 nodes a place).
 *
 * A cubic B-spline of step s has standard deviation s/√3; a gaussian of that width is 2.355·s/√3 wide at half height,
 * which gives the lattice step for a stated length.
 */
const STEP_PER_LENGTH = Math.sqrt(3) / 2.3548

/** Places across the face over which the root mean square is set. */
const CHECK_PLACES = 80

function lattice(waviness: Waviness, radiusMm: number) {
  const stepMm = waviness.lengthMm * STEP_PER_LENGTH
  const half = Math.ceil((radiusMm * 1.25) / stepMm) + 2
  const side = 2 * half + 1
  const random = seededRandom(waviness.seed, 'waviness')
  const nodes = Float64Array.from({ length: side * side }, () => random.normal())
  return { stepMm, half, side, nodes }
}

/** Weight of the four nodes about a place that lies t past the second of them. */
function splineWeights(t: number): readonly [number, number, number, number] {
  const r = 1 - t
  return [(r * r * r) / 6, 2 / 3 - t * t * (1 - t / 2), 2 / 3 - r * r * (1 - r / 2), (t * t * t) / 6]
}

function latticeField(waviness: Waviness, radiusMm: number): (xMm: number, yMm: number) => number {
  const { stepMm, half, side, nodes } = lattice(waviness, radiusMm)
  const farthest = side - 3
  return (xMm, yMm) => {
    const gridX = Math.min(Math.max(xMm / stepMm + half, 1), farthest)
    const gridY = Math.min(Math.max(yMm / stepMm + half, 1), farthest)
    const column = Math.floor(gridX)
    const row = Math.floor(gridY)
    const across = splineWeights(gridX - column)
    const down = splineWeights(gridY - row)
    let sum = 0
    for (let j = 0; j < 4; j++) {
      const start = (row + j - 1) * side + column - 1
      let line = 0
      for (let i = 0; i < 4; i++) line += across[i] * nodes[start + i]
      sum += down[j] * line
    }
    return sum
  }
}

function meanAndDeviation(field: (x: number, y: number) => number, radiusMm: number) {
  let count = 0
  let sum = 0
  let squares = 0
  for (let j = 0; j < CHECK_PLACES; j++) {
    for (let i = 0; i < CHECK_PLACES; i++) {
      const xMm = radiusMm * ((2 * i + 1) / CHECK_PLACES - 1)
      const yMm = radiusMm * ((2 * j + 1) / CHECK_PLACES - 1)
      if (xMm * xMm + yMm * yMm > radiusMm * radiusMm) continue
      const value = field(xMm, yMm)
      count++
      sum += value
      squares += value * value
    }
  }
  const mean = sum / count
  return { mean, deviation: Math.sqrt(squares / count - mean * mean) }
}

/** The field in µm at a part place. Its root mean square over the disc round the face is the stated one. */
export function wavinessUm(waviness: Waviness, radiusMm: number): (xMm: number, yMm: number) => number {
  if (waviness.rmsUm === 0) return () => 0
  const field = latticeField(waviness, radiusMm)
  const { mean, deviation } = meanAndDeviation(field, radiusMm)
  const scale = waviness.rmsUm / deviation
  return (xMm, yMm) => scale * (field(xMm, yMm) - mean)
}
