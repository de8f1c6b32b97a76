// Band heights: λ ÷ 2 of each line, and λ ÷ (2 cos θ) seen at an angle. Wavelengths in air: helium d 587.5618 nm and
// mercury e 546.0740 nm from the spectral line class of a public optics manual, the others from memory.
import { bandHeightUm } from '@shared/metrology'
import { fromUm } from '@shared/units/height'
import { describe, expect, it } from 'vitest'

describe('the height of one band', () => {
  it.each([
    ['helium d', 587.5618, 0.2937809, 11.5662],
    ['sodium D2', 588.995, 0.2944975, 11.5944],
    ['sodium D1', 589.592, 0.294796, 11.6061],
    ['mercury e', 546.074, 0.273037, 10.7495],
    ['helium–neon', 632.816, 0.316408, 12.457],
    ['cadmium red', 643.847, 0.3219235, 12.6742],
    ['doubled Nd laser', 532, 0.266, 10.4724],
  ])('of %s light', (_light, wavelengthNm, um, microinches) => {
    expect(bandHeightUm(wavelengthNm, 0)).toBeCloseTo(um, 7)
    expect(fromUm(bandHeightUm(wavelengthNm, 0), 'uin')).toBeCloseTo(microinches, 4)
  })

  it.each([
    [0, 1, 11.566],
    [10, 1.01543, 11.745],
    [20, 1.06418, 12.308],
    [30, 1.1547, 13.355],
    [45, Math.SQRT2, 16.357],
    [60, 2, 23.132],
    [70, 2.9238, 33.817],
  ])('of helium light seen %s° off the normal', (angleDeg, factor, microinches) => {
    const height = bandHeightUm(587.5618, angleDeg)
    expect(height / bandHeightUm(587.5618, 0)).toBeCloseTo(factor, 5)
    expect(fromUm(height, 'uin')).toBeCloseTo(microinches, 3)
  })

  it('is not to be had without a wavelength or seen from the side', () => {
    expect(() => bandHeightUm(0, 0)).toThrow(RangeError)
    expect(() => bandHeightUm(589, 90)).toThrow(RangeError)
  })

  // A US Army course (MM0478) prints nine bands as 104.4 µin at 11.6 µin a band; helium d exactly gives 104.10.
  it('of nine helium bands is 104.10 µin, 2.6440 µm', () => {
    expect(9 * bandHeightUm(587.5618, 0)).toBeCloseTo(2.644, 4)
    expect(fromUm(9 * bandHeightUm(587.5618, 0), 'uin')).toBeCloseTo(104.1, 1)
  })
})
