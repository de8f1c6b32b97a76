// Band heights: λ ÷ 2 of each line, and λ ÷ (2 cos θ) seen at an angle. Wavelengths in air: helium d 587.5618 nm and
// mercury e 546.0740 nm from the spectral line class of a public optics manual, the others from memory.
import { bandHeightUm } from '@shared/metrology/band-height'
import { fitForm } from '@shared/metrology/form-terms'
import { fromUm, toUm } from '@shared/units/height'
import { describe, expect, it } from 'vitest'

describe('the height of one band', () => {
  it.each([
    ['helium d', 587.5618, 0.2937809, 11.5662],
    ['sodium D2', 588.995, 0.2944975, 11.5944],
    ['sodium D1', 589.592, 0.294796, 11.6061],
    ['mercury e', 546.074, 0.273037, 10.7495],
    ['helium–neon', 632.816, 0.316408, 12.457],
    ['cadmium red', 643.847, 0.3219235, 12.6742],
    ['sodium, mean of both lines', 589.2935, 0.29464675, 11.6003],
    ['doubled Nd laser', 532, 0.266, 10.4724],
    // Nominal wavelengths of LEDs: common practice.
    ['LED 470', 470, 0.235, 9.252],
    ['LED 525', 525, 0.2625, 10.3346],
    ['LED 590', 590, 0.295, 11.6142],
    ['LED 625', 625, 0.3125, 12.3031],
    ['LED 660', 660, 0.33, 12.9921],
  ])('of %s light', (_light, wavelengthNm, um, microinches) => {
    expect(bandHeightUm(wavelengthNm, 0)).toBeCloseTo(um, 7)
    expect(fromUm(bandHeightUm(wavelengthNm, 0), 'uin')).toBeCloseTo(microinches, 4)
  })

  it.each([
    [0, 1, 11.566],
    [10, 1.01543, 11.745],
    [15, 1.03528, 11.974],
    [20, 1.06418, 12.308],
    [30, 1.1547, 13.355],
    [40, 1.30541, 15.099],
    [45, Math.SQRT2, 16.357],
    [50, 1.55572, 17.994],
    [60, 2, 23.132],
    [70, 2.9238, 33.817],
  ])('of helium light seen %s° off the normal', (angleDeg, factor, microinches) => {
    const height = bandHeightUm(587.5618, angleDeg)
    expect(height / bandHeightUm(587.5618, 0)).toBeCloseTo(factor, 5)
    expect(fromUm(height, 'uin')).toBeCloseTo(microinches, 3)
  })

  // Derived here: 1 − 1/factor of the true height.
  it.each([
    [10, 1.52],
    [30, 13.4],
    [45, 29.29],
    [60, 50],
    [70, 65.8],
  ])('reads low when %s° is forgotten', (angleDeg, percent) => {
    const low = 1 - bandHeightUm(587.5618, 0) / bandHeightUm(587.5618, angleDeg)
    expect(100 * low).toBeCloseTo(percent, 1)
  })

  // Shop arithmetic, derived here from 1 inch = 25.4 mm exactly.
  it.each([
    ['helium d', 587.5618, 3.4039, 8.6459],
    ['sodium D2', 588.995, 3.39561, 8.6249],
    ['sodium D1', 589.592, 3.39218, 8.6161],
    ['sodium mean', 589.2935, 3.39389, 8.6205],
    ['mercury e', 546.074, 3.66251, 9.3028],
    ['helium–neon', 632.816, 3.16048, 8.0276],
    ['cadmium red', 643.847, 3.10633, 7.8901],
    ['doubled Nd laser', 532, 3.7594, 9.5489],
  ])('%s: bands to a micrometre and to a tenth', (_light, wavelengthNm, perUm, perTenth) => {
    const bandUm = bandHeightUm(wavelengthNm, 0)
    expect(fromUm(1, 'bands', bandUm)).toBeCloseTo(perUm, 5)
    expect(fromUm(toUm(1, 'tenths'), 'bands', bandUm)).toBeCloseTo(perTenth, 4)
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

/** A true sphere of a radius over a disc of a diameter, in µm; measured along the spokes of a wheel. */
function sphere(radiusM: number, diameterMm: number) {
  const radiusUm = radiusM * 1e6
  const spokes = Array.from({ length: 24 }, (_, k) => (k * Math.PI) / 12)
  const places = spokes.flatMap((angle) =>
    Array.from({ length: 40 }, (_, k) => {
      const r = ((k + 0.5) / 80) * diameterMm
      return [r * Math.cos(angle), r * Math.sin(angle), r] as const
    }),
  )
  return {
    xMm: Float64Array.from(places, ([x]) => x),
    yMm: Float64Array.from(places, ([, y]) => y),
    weightMm2: Float64Array.from(places, ([, , r]) => r),
    // R − √(R² − r²) without the loss of digits.
    heightUm: Float64Array.from(places, ([, , r]) => {
      const um = r * 1e3
      return -(um * um) / (radiusUm + Math.sqrt(radiusUm * radiusUm - um * um))
    }),
    rimDistanceMm: Float64Array.from(places, ([, , r]) => diameterMm / 2 - r),
  }
}

// s = R − √(R² − D²/4), derived here: one helium band on 100 mm is a radius of 4254.87 m, 0.58756 µm is 2127.442 m, one band on 50 mm
// 1063.718 m; a kilometre is 1.2500 µm on 100 mm; the earth (6371 km) 1.77 nm on 300 mm and 0.196 nm on 100 mm.
describe('the sagitta of a sphere', () => {
  it.each([
    [4254.87, 100, 0.2937809, 6],
    [2127.442, 100, 0.58756, 6],
    [1063.718, 50, 0.2937809, 6],
    [1000, 100, 1.25, 6],
    [6_371_000, 300, 0.00177, 5],
    [6_371_000, 100, 0.000196, 6],
  ])('of radius %s m over %s mm', (radiusM, diameterMm, sagittaUm, digits) => {
    const fit = fitForm(sphere(radiusM, diameterMm), { acrossMm: diameterMm, edgeBandMm: 0 })
    expect(fit?.sagittaUm).toBeCloseTo(sagittaUm, digits)
  })
})
