import { describe, expect, it } from 'vitest'
import { fitPlane } from './plane-fit'

const xs = [-1, 0, 1, -1, 0, 1, -1, 0, 1]
const ys = [-1, -1, -1, 0, 0, 0, 1, 1, 1]
const even = new Float64Array(9).fill(1)

describe('the least squares plane', () => {
  // Derived here by the normal equations in fractions.
  it.each([
    ['A', [0, 1, 0, 1, 4, 1, 0, 1, 0], 0, 0, 8 / 9],
    ['B', [0, 0, 0, 0, 0, 0, 0, 0, 4], 2 / 3, 2 / 3, 4 / 9],
    ['C', [1, 0, -1, 0, 0, 0, -1, 0, 1], 0, 0, 0],
    ['D', [1, 5, 3, 6, 10, 2, 4, 9, 8], 1 / 3, 2, 16 / 3],
  ])('of set %s on a 3 × 3 grid', (_name, z, a, b, c) => {
    const plane = fitPlane(xs, ys, z, even)
    expect(plane.a).toBeCloseTo(a, 12)
    expect(plane.b).toBeCloseTo(b, 12)
    expect(plane.c).toBeCloseTo(c, 12)
  })

  it('counts a place of weight two as two places', () => {
    const weights = Float64Array.from(even)
    weights[4] = 2
    const z = [1, 5, 3, 6, 10, 2, 4, 9, 8]
    const twice = fitPlane([...xs, 0], [...ys, 0], [...z, 10], new Float64Array(10).fill(1))
    const weighted = fitPlane(xs, ys, z, weights)
    expect(weighted.a).toBeCloseTo(twice.a, 12)
    expect(weighted.b).toBeCloseTo(twice.b, 12)
    expect(weighted.c).toBeCloseTo(twice.c, 12)
  })

  it('loses no digits far from the origin', () => {
    const z = xs.map((x, i) => 3 * x - 2 * ys[i]! + 0.5)
    const plane = fitPlane(
      xs.map((x) => x + 1e6),
      ys.map((y) => y - 1e6),
      z,
      even,
    )
    expect(plane.a).toBeCloseTo(3, 9)
    expect(plane.b).toBeCloseTo(-2, 9)
  })

  it('is refused for places on a line, for two places, and where only a line of them has weight', () => {
    const line = [0, 1, 2, 3]
    expect(() => fitPlane(line, line, [0, 1, 0, 1], [1, 1, 1, 1])).toThrow(RangeError)
    expect(() => fitPlane([0, 1], [0, 2], [0, 1], [1, 1])).toThrow(RangeError)
    expect(() => fitPlane(xs, ys, xs, [1, 1, 1, 0, 0, 0, 0, 0, 0])).toThrow(RangeError)
    expect(() => fitPlane(xs, ys, xs, new Float64Array(9))).toThrow(RangeError)
  })
})
