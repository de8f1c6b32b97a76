import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bandHeightUm } from './band-height'

// λ ÷ (2 cos θ), derived here; the tables of lights and angles stand in tests/reference.
describe('the height that one band stands for', () => {
  it('is half a wavelength square on and a whole one at 60°', () => {
    expect(bandHeightUm(587.5618, 0)).toBeCloseTo(0.2937809, 9)
    expect(bandHeightUm(587.5618, 60)).toBeCloseTo(0.5875618, 9)
  })

  it('grows with the angle, the same to either side', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 88, noNaN: true }),
        fc.double({ min: 0.01, max: 1, noNaN: true }),
        (angle, more) => {
          expect(bandHeightUm(546.074, angle + more)).toBeGreaterThan(bandHeightUm(546.074, angle))
          expect(bandHeightUm(546.074, -angle)).toBe(bandHeightUm(546.074, angle))
        },
      ),
      { seed: 1 },
    )
  })

  it.each([
    [0, 0],
    [-589, 0],
    [Number.NaN, 0],
    [589, 90],
    [589, -120],
    [589, Number.NaN],
  ])('is refused for %s nm at %s°', (wavelengthNm, angleDeg) => {
    expect(() => bandHeightUm(wavelengthNm, angleDeg)).toThrow(RangeError)
  })
})
