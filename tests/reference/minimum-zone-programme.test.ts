// References: a linear programme (npm package yalps), which shares nothing with the exchange method, and the singular
// value decomposition of ml-matrix for the least squares plane.
import { minimumZone } from '@shared/metrology/minimum-zone'
import { fitPlane } from '@shared/metrology/plane-fit'
import { Matrix, SingularValueDecomposition } from 'ml-matrix'
import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64'
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus'
import { describe, expect, it } from 'vitest'
import { lessEq, solve } from 'yalps'

/** minimise 2t with |z − a x − b y − c| ≤ t; each coefficient is the difference of two variables of one sign. */
function widthByProgramme(xs: number[], ys: number[], zs: number[]): number {
  const constraints: Record<string, ReturnType<typeof lessEq>> = {}
  const columns: Record<string, Record<string, number>> = { t: { cost: 2 } }
  for (const name of ['a+', 'a-', 'b+', 'b-', 'c+', 'c-']) columns[name] = {}
  zs.forEach((z, i) => {
    for (const sign of [1, -1]) {
      const row = `${sign}:${i}`
      constraints[row] = lessEq(-sign * z)
      columns.t![row] = -1
      const put = (name: string, value: number) => {
        columns[`${name}+`]![row] = -sign * value
        columns[`${name}-`]![row] = sign * value
      }
      put('a', xs[i]!)
      put('b', ys[i]!)
      put('c', 1)
    }
  })
  const { status, result } = solve(
    { direction: 'minimize', objective: 'cost', constraints, variables: columns },
    { precision: 1e-12 },
  )
  if (status !== 'optimal') throw new Error(status)
  return result
}

interface Places {
  kind: string
  xs: number[]
  ys: number[]
  zs: number[]
}

const KINDS = [
  'scattered places',
  'a grid with ties',
  'a rim',
  'a grid of whole heights',
  'rings far from the origin',
]

/** Seeded sets of five kinds; heights are a tilted form with noise, rounded so that many places tie. */
function places(seed: number): Places {
  const generator = xoroshiro128plus(seed)
  const random = () => uniformFloat64(generator)
  const kind = seed % KINDS.length
  const count = 20 + Math.floor(50 * random())
  const place = (k: number): [number, number] => {
    const angle = (2 * Math.PI * k) / count
    switch (kind) {
      case 0:
        return [2 * random() - 1, 2 * random() - 1]
      case 2:
        return [Math.cos(angle), Math.sin(angle)]
      case 4:
        return [100 + (1 + (k % 2)) * Math.cos(angle), -40 + (1 + (k % 2)) * Math.sin(angle)]
      default:
        return [(k % 8) / 4 - 1, Math.floor(k / 8) / 4 - 1]
    }
  }
  const at = Array.from({ length: count }, (_, k) => place(k))
  const zs = at.map(([x, y]) => {
    const z = 0.8 * x - 0.3 * y + x * x - 0.7 * y * y + 0.6 * random()
    if (kind === 1) return Math.round(5 * z) / 5
    return kind === 3 ? Math.round(3 * z) : z
  })
  return { kind: KINDS[kind]!, xs: at.map(([x]) => x), ys: at.map(([, y]) => y), zs }
}

const seeds = Array.from({ length: 30 }, (_, k) => k + 1)

describe('the minimum zone against a linear programme', () => {
  it.each(seeds)('agrees on seeded set %i', (seed) => {
    const { xs, ys, zs } = places(seed)
    // The programme's own variables stay small about the middle of the places; the width doesn't change.
    const mean = (values: number[]) => values.reduce((a, b) => a + b, 0) / values.length
    const [mx, my, mz] = [mean(xs), mean(ys), mean(zs)]
    const expected = widthByProgramme(
      xs.map((x) => x - mx),
      ys.map((y) => y - my),
      zs.map((z) => z - mz),
    )
    expect(Math.abs(minimumZone(xs, ys, zs).width - expected) / expected).toBeLessThan(1e-9)
  })
})

describe('the least squares plane against a singular value decomposition', () => {
  it.each(seeds)('agrees on seeded set %i, with uneven weights', (seed) => {
    const { xs, ys, zs } = places(seed)
    const weights = zs.map((_, i) => 0.5 + (i % 4))
    const roots = weights.map(Math.sqrt)
    const left = new Matrix(xs.map((x, i) => [x * roots[i]!, ys[i]! * roots[i]!, roots[i]!]))
    const right = Matrix.columnVector(zs.map((z, i) => z * roots[i]!))
    const [a, b, c] = new SingularValueDecomposition(left).solve(right).to1DArray()
    const plane = fitPlane(xs, ys, zs, weights)
    // Relative to heights of about 1 over places of about 1; far from the origin c carries 100 · a.
    expect(Math.abs(plane.a - a!)).toBeLessThan(1e-9)
    expect(Math.abs(plane.b - b!)).toBeLessThan(1e-9)
    expect(Math.abs(plane.c - c!)).toBeLessThan(1e-9 * Math.max(1, Math.abs(c!)))
  })
})
