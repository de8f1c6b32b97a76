// Reference: a linear programme (npm package yalps), which shares nothing with the exchange method.
import { minimumZone } from '@shared/metrology/minimum-zone'
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

function places(seed: number): { xs: number[]; ys: number[]; zs: number[] } {
  const generator = xoroshiro128plus(seed)
  const random = () => uniformFloat64(generator)
  const count = 20 + Math.floor(60 * random())
  const onGrid = seed % 2 === 0
  const place = () => (onGrid ? Math.round(10 * random()) / 5 - 1 : 2 * random() - 1)
  const xs = Array.from({ length: count }, place)
  const ys = Array.from({ length: count }, place)
  const zs = xs.map((x, i) => 8 * x - 3 * ys[i]! + x * x - 0.7 * ys[i]! ** 2 + 0.3 * random())
  return { xs, ys, zs }
}

describe('the minimum zone against a linear programme', () => {
  it.each(Array.from({ length: 30 }, (_, k) => k + 1))('agrees on seeded set %i', (seed) => {
    const { xs, ys, zs } = places(seed)
    const expected = widthByProgramme(xs, ys, zs)
    expect(Math.abs(minimumZone(xs, ys, zs).width - expected) / expected).toBeLessThan(1e-7)
  })
})
