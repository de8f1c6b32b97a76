import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { flatnessParameters } from './parameters'

function over(places: readonly (readonly [number, number])[], z: readonly number[]) {
  return flatnessParameters(
    Float64Array.from(places, ([x]) => x),
    Float64Array.from(places, ([, y]) => y),
    Float64Array.from(z),
    new Float64Array(z.length).fill(1),
  )
}

const grid3 = [-1, 0, 1].flatMap((y) => [-1, 0, 1].map((x) => [x, y] as const))
const grid5 = [-2, -1, 0, 1, 2].flatMap((y) => [-2, -1, 0, 1, 2].map((x) => [x, y] as const))

// ISO 12781-1 (from memory): FLTt, FLTp, FLTv, FLTq about the least squares plane. Values derived here.
describe('flatness parameters', () => {
  it('of a saddle on a 5 × 5 grid, tilted: both references give 8, FLTq 2.366432', () => {
    const { flatness, lsPlane } = over(
      grid5,
      grid5.map(([x, y]) => 0.5 * x - 0.25 * y + 3 + x * x - y * y),
    )
    expect(flatness.minimumZoneUm).toBeCloseTo(8, 9)
    expect(flatness.leastSquaresUm).toBeCloseTo(8, 9)
    expect(flatness.rmsUm).toBeCloseTo(2.366432, 6)
    expect(lsPlane).toEqual({
      a: expect.closeTo(0.5, 12),
      b: expect.closeTo(-0.25, 12),
      c: expect.closeTo(3, 12),
    })
  })

  it('of a bowl on a 5 × 5 grid: peak to valley 8 about the plane at 4', () => {
    const { flatness, lsPlane, valleyIndex } = over(
      grid5,
      grid5.map(([x, y]) => x * x + y * y),
    )
    expect(flatness.minimumZoneUm).toBeCloseTo(8, 9)
    expect(flatness.peakUm).toBeCloseTo(4, 9)
    expect(flatness.valleyUm).toBeCloseTo(4, 9)
    expect(lsPlane.c).toBeCloseTo(4, 12)
    expect(valleyIndex).toBe(12)
  })

  it('of four places, three by one and two by two', () => {
    const threeByOne = over(
      [
        [0, 0],
        [4, 0],
        [0, 4],
        [1, 1],
      ],
      [0, 0, 0, 3],
    ).flatness
    expect(threeByOne.leastSquaresUm).toBeCloseTo(3.272727, 6)
    expect(threeByOne.minimumZoneUm).toBeCloseTo(3, 9)
    const twoByTwo = over(
      [
        [0, 0],
        [4, 4],
        [0, 4],
        [4, 0],
      ],
      [0, 0, 2, 2],
    ).flatness
    expect(twoByTwo.leastSquaresUm).toBeCloseTo(2, 9)
    expect(twoByTwo.minimumZoneUm).toBeCloseTo(2, 9)
    expect(twoByTwo.rmsUm).toBeCloseTo(1, 9)
  })

  it('of set D names the places of peak and valley', () => {
    const { peakIndex, valleyIndex, flatness } = over(grid3, [1, 5, 3, 6, 10, 2, 4, 9, 8])
    expect(peakIndex).toBe(4)
    // Departures −11/3 at (1, 0): 2 − 1/3 − 16/3.
    expect(valleyIndex).toBe(5)
    expect(flatness.leastSquaresUm).toBeCloseTo(flatness.peakUm + flatness.valleyUm, 12)
  })

  it('counts places of weight 0 for the extremes, not for plane and root mean square', () => {
    const places = [...grid3, [1.5, 0] as const]
    const weights = Float64Array.from(places, (_, i) => (i < 9 ? 1 : 0))
    const { flatness } = flatnessParameters(
      Float64Array.from(places, ([x]) => x),
      Float64Array.from(places, ([, y]) => y),
      Float64Array.from([0, 1, 0, 1, 4, 1, 0, 1, 0, -3]),
      weights,
    )
    expect(flatness.valleyUm).toBeCloseTo(3 + 8 / 9, 9)
    expect(flatness.rmsUm).toBeCloseTo(1.1967, 4)
  })

  it('of places on one line is refused', () => {
    expect(() =>
      over(
        [
          [0, 0],
          [1, 1],
          [2, 2],
          [3, 3],
        ],
        [0, 1, 0, 1],
      ),
    ).toThrow(RangeError)
  })

  // Properties, no outside source.
  it('do not change with a tilt, turn over with the face, and grow with it', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -5, max: 5, noNaN: true }), { minLength: 9, maxLength: 9 }),
        fc.double({ min: -3, max: 3, noNaN: true }),
        fc.double({ min: 0.1, max: 4, noNaN: true }),
        (z, tilt, factor) => {
          const plain = over(grid3, z).flatness
          const tilted = over(
            grid3,
            z.map((v, i) => factor * v + tilt * grid3[i]![0] - 2 * tilt * grid3[i]![1] + 1),
          ).flatness
          const over180 = over(
            grid3,
            z.map((v) => -v),
          ).flatness
          for (const key of ['leastSquaresUm', 'peakUm', 'valleyUm', 'rmsUm'] as const)
            expect(Math.abs(tilted[key] - factor * plain[key])).toBeLessThan(1e-9)
          // Near ties are settled by a displacement of 1e-7 of the extent, so the width is good to that share.
          expect(Math.abs(tilted.minimumZoneUm - factor * plain.minimumZoneUm)).toBeLessThan(1e-6)
          expect(Math.abs(over180.peakUm - plain.valleyUm)).toBeLessThan(1e-8)
          expect(Math.abs(over180.minimumZoneUm - plain.minimumZoneUm)).toBeLessThan(1e-6)
          expect(plain.minimumZoneUm).toBeLessThanOrEqual(plain.leastSquaresUm)
          expect(plain.rmsUm).toBeLessThanOrEqual(plain.leastSquaresUm + 1e-12)
        },
      ),
      { seed: 1 },
    )
  })
})
