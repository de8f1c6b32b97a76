import { describe, expect, it } from 'vitest'
import { createMinimumZoneSolver, minimumZone } from './minimum-zone'
import { flatnessParameters } from './parameters'

const grid = [-1, 0, 1].flatMap((y) => [-1, 0, 1].map((x) => [x, y] as const))
const xs = Float64Array.from(grid, ([x]) => x)
const ys = Float64Array.from(grid, ([, y]) => y)
const even = new Float64Array(9).fill(1)

describe('the minimum zone', () => {
  // Sets on a 3 × 3 grid, rows y = −1, 0, 1; answers derived by linear programming and enumeration.
  it.each([
    ['A', [0, 1, 0, 1, 4, 1, 0, 1, 0], 4, 4, 28 / 9, 8 / 9, 1.1967],
    ['B', [0, 0, 0, 0, 0, 0, 0, 0, 4], 3, 10 / 3, 20 / 9, 10 / 9, 0.993808],
    ['C', [1, 0, -1, 0, 0, 0, -1, 0, 1], 2, 2, 1, 1, 0.66667],
    ['D', [1, 5, 3, 6, 10, 2, 4, 9, 8], 31 / 4, 25 / 3, 14 / 3, 11 / 3, 2.479546],
  ])('set %s: both reference planes', (_name, z, zone, leastSquares, peak, valley, rms) => {
    const { flatness } = flatnessParameters(xs, ys, Float64Array.from(z), even)
    expect(flatness.minimumZoneUm).toBeCloseTo(zone, 9)
    expect(flatness.leastSquaresUm).toBeCloseTo(leastSquares, 9)
    expect(flatness.peakUm).toBeCloseTo(peak, 9)
    expect(flatness.valleyUm).toBeCloseTo(valley, 9)
    expect(flatness.rmsUm).toBeCloseTo(rms, 5)
  })

  it('is nothing for a tilted plane', () => {
    expect(
      minimumZone(
        xs,
        ys,
        grid.map(([x, y]) => 3 * x - 2 * y + 1),
      ).width,
    ).toBeLessThan(1e-9)
  })

  it('holds two by two and three by one', () => {
    expect(minimumZone([0, 4, 0, 4], [0, 4, 4, 0], [0, 0, 2, 2]).width).toBeCloseTo(2, 9)
    expect(minimumZone([0, 4, 0, 1], [0, 0, 4, 1], [0, 0, 0, 3]).width).toBeCloseTo(3, 9)
  })

  it('finds the middle plane of set D', () => {
    const { plane } = minimumZone(xs, ys, [1, 5, 3, 6, 10, 2, 4, 9, 8])
    expect(plane.a).toBeCloseTo(-1 / 4, 6)
    expect(plane.b).toBeCloseTo(3 / 2, 6)
    expect(plane.c).toBeCloseTo(49 / 8, 6)
  })

  it('refuses places on one line, and heights that are too few', () => {
    expect(() => minimumZone([0, 1, 2, 3], [0, 1, 2, 3], [0, 1, 0, 1])).toThrow(RangeError)
    expect(() => createMinimumZoneSolver(xs, ys).solve([1, 2, 3])).toThrow(RangeError)
  })

  // Derived here: z = x² − y² and z = x² + y² over x, y = −2 … 2 both stand 8 apart.
  it('of a saddle and of a bowl on a 5 × 5 grid is 8, ties and all', () => {
    const places = [-2, -1, 0, 1, 2].flatMap((y) => [-2, -1, 0, 1, 2].map((x) => [x, y] as const))
    const solver = createMinimumZoneSolver(
      places.map(([x]) => x),
      places.map(([, y]) => y),
    )
    expect(solver.solve(places.map(([x, y]) => 0.5 * x - 0.25 * y + 3 + x * x - y * y)).width).toBeCloseTo(
      8,
      9,
    )
    expect(solver.solve(places.map(([x, y]) => x * x + y * y)).width).toBeCloseTo(8, 9)
  })

  // Derived here: by turning symmetry the middle plane is level.
  it('of a cap sampled on its rim and in its middle is its sagitta', () => {
    const rim = Array.from({ length: 360 }, (_, k) => [
      20 * Math.cos((k * Math.PI) / 180),
      20 * Math.sin((k * Math.PI) / 180),
    ])
    const zone = minimumZone(
      [0, ...rim.map(([x]) => x!)],
      [0, ...rim.map(([, y]) => y!)],
      [0.7, ...rim.map(() => 0)],
    )
    expect(zone.width).toBeCloseTo(0.7, 9)
  })

  it('of three places is nothing, and the plane goes through them', () => {
    const { width, plane } = minimumZone([0, 1, 0], [0, 0, 1], [5, 7, 4])
    expect(width).toBe(0)
    expect(plane).toEqual({ a: expect.closeTo(2, 9), b: expect.closeTo(-1, 9), c: expect.closeTo(5, 9) })
  })

  it('holds every place between its planes, from whatever contacts it starts', () => {
    const z = [1, 5, 3, 6, 10, 2, 4, 9, 8]
    const solver = createMinimumZoneSolver(xs, ys)
    for (const start of [undefined, [0, 1, 3, 4], [8, 7, 5, 4], [0, 1, 2, 3], [0, 0, 0, 0]]) {
      const { width, plane } = solver.solve(z, start)
      expect(width).toBeCloseTo(31 / 4, 9)
      grid.forEach(([x, y], i) => {
        expect(Math.abs(z[i]! - plane.a * x - plane.b * y - plane.c)).toBeLessThan(width / 2 + 1e-6)
      })
    }
  })

  it('refuses two places, and three on a line', () => {
    expect(() => minimumZone([0, 1], [0, 1], [0, 1])).toThrow(RangeError)
    expect(() => minimumZone([0, 1, 2], [0, 1, 2], [0, 1, 0])).toThrow(RangeError)
    expect(() => createMinimumZoneSolver([0, 1, 2], [0, 1])).toThrow(RangeError)
  })
})
