import { describe, expect, it } from 'vitest'
import {
  formatHeight,
  formatNumber,
  formatWithUncertainty,
  fromUm,
  parseHeight,
  roundParts,
  toUm,
} from './height'

/** Helium d in air, 587.5618 nm: one band is half of it. */
const heliumBandUm = 0.2937809

function um(text: string, bandUm?: number): number {
  const parsed = parseHeight(text, { bandUm })
  if (!parsed.ok) throw new Error(parsed.reason)
  return parsed.value.valueUm
}

describe('heights as people type them', () => {
  it.each([
    ['0.3 um', 0.3],
    ['0,3 µm', 0.3],
    ['0.3 \u03bcm', 0.3],
    ['−0.2 µm', -0.2],
    ['300 nm', 0.3],
    ['0.0003 mm', 0.3],
    // 1 inch = 25.4 mm exactly.
    ['11.6 µin', 11.6 * 0.0254],
    ['11.6 uin', 11.6 * 0.0254],
    ['2 tenths', 5.08],
    ['1 thou', 25.4],
    ['2 millionths', 0.0508],
  ])('%s is read with its unit', (text, expected) => {
    expect(um(text)).toBeCloseTo(expected, 12)
  })

  it('bands mean a height only with a wavelength', () => {
    expect(um('1.5 bands', heliumBandUm)).toBeCloseTo(0.44067135, 9)
    expect(parseHeight('1.5 bands')).toEqual({ ok: false, reason: 'bandsNeedWavelength' })
  })

  it.each([
    ['', 'empty'],
    ['flat', 'notANumber'],
    ['0.3', 'unitMissing'],
    ['0.3 furlongs', 'unitUnknown'],
    ['0.3 constructor', 'unitUnknown'],
  ])('“%s” is refused and says why', (text, reason) => {
    expect(parseHeight(text)).toEqual({ ok: false, reason })
  })

  it('a bare number takes the unit that the field names', () => {
    expect(parseHeight('0.3', { defaultUnit: 'um' })).toMatchObject({ ok: true, value: { valueUm: 0.3 } })
  })

  it('there and back again is the same height in every unit', () => {
    for (const unit of ['um', 'nm', 'mm', 'uin', 'in', 'thou', 'tenths', 'millionths', 'bands'] as const) {
      expect(fromUm(toUm(0.4321, unit, heliumBandUm), unit, heliumBandUm)).toBeCloseTo(0.4321, 12)
    }
  })

  // Shop arithmetic, derived from 1 inch = 25.4 mm and helium d: 1 thou = 86.459 bands, 1 tenth = 8.6459 bands.
  it('thou and tenths stand in helium bands as the handbooks’ arithmetic has them', () => {
    expect(fromUm(25.4, 'bands', heliumBandUm)).toBeCloseTo(86.459, 3)
    expect(fromUm(2.54, 'bands', heliumBandUm)).toBeCloseTo(8.6459, 4)
    expect(fromUm(heliumBandUm, 'uin')).toBeCloseTo(11.5662, 4)
  })
})

describe('heights as people read them', () => {
  it('minus is U+2212, and nought has no sign', () => {
    expect(formatNumber(-0.25, 2)).toBe('\u22120.25')
    expect(formatNumber(-0.0004, 3)).toBe('0.000')
    expect(formatNumber(0.1, 1, true)).toBe('+0.1')
  })

  it('a figure takes two digits of its uncertainty, and U is rounded up', () => {
    expect(formatWithUncertainty(0.4638, 0.04061, 'um')).toEqual({ value: '0.464', u: '±0.041', unit: 'µm' })
    expect(formatWithUncertainty(1.7923, 0.11, 'um')).toEqual({ value: '1.79', u: '±0.11', unit: 'µm' })
  })

  it('names the unit', () => {
    expect(formatHeight(0.2937809, 'uin')).toBe('11.6 µin')
  })

  it('printed peak and valley add up to the printed sum', () => {
    for (let k = 0; k < 500; k++) {
      const [first, second] = [((k * 0.6180339) % 1) * 0.7, ((k * 0.7548776) % 1) * 0.5]
      const parts = roundParts(first, second, 3)
      expect(parts.first + parts.second).toBeCloseTo(parts.sum, 9)
      expect(Math.abs(parts.first - first)).toBeLessThan(0.0016)
      expect(Math.abs(parts.second - second)).toBeLessThan(0.0016)
    }
  })
})
