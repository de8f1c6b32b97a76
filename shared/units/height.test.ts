import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  formatHeight,
  formatNumber,
  formatWithUncertainty,
  fromUm,
  type HeightUnit,
  heightUnitSchema,
  parseHeight,
  roundParts,
  toUm,
  unitSymbol,
} from './height'

/** Helium d in air, 587.5618 nm (published, optics manual): one band is half of it (derived here). */
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
    ['0,3 \u00b5m', 0.3],
    ['0.3 \u03bcm', 0.3],
    ['0,3\u03bcm', 0.3],
    ['+0.3 microns', 0.3],
    ['.3 um.', 0.3],
    ['3e-1 um', 0.3],
    ['3e\u22121 um', 0.3],
    ['-0.2 um', -0.2],
    ['\u2212 0,2 µm', -0.2],
    ['−0.2 µm', -0.2],
    ['300 nm', 0.3],
    ['0.0003 mm', 0.3],
    // 1 inch = 25.4 mm exactly.
    ['11.6 µin', 11.6 * 0.0254],
    ['11.6 uin', 11.6 * 0.0254],
    ['11.6 \u03bcin', 11.6 * 0.0254],
    ['11.6 microinches', 11.6 * 0.0254],
    ['0.001 in', 25.4],
    ['0.001"', 25.4],
    ['1 mil', 25.4],
    ['1 tenth', 2.54],
    ['2 tenths', 5.08],
    ['1 thou', 25.4],
    ['2 millionths', 0.0508],
  ])('%s is read with its unit', (text, expected) => {
    expect(um(text)).toBeCloseTo(expected, 12)
  })

  it('bands mean a height only with a wavelength', () => {
    expect(um('1.5 bands', heliumBandUm)).toBeCloseTo(0.44067135, 9)
    expect(um('1 band', heliumBandUm)).toBe(heliumBandUm)
    expect(parseHeight('1.5 bands', { bandUm: 0 })).toEqual({ ok: false, reason: 'bandsNeedWavelength' })
    expect(() => toUm(1, 'bands')).toThrow(RangeError)
    expect(() => fromUm(1, 'bands', Number.NaN)).toThrow(RangeError)
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

  // Property, no outside source: a conversion and its reverse undo each other, whatever the number.
  it('there and back again is the same height for any number, unit and wavelength', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e4, max: 1e4, noNaN: true }),
        fc.constantFrom(...heightUnitSchema.options),
        fc.double({ min: 0.2, max: 0.4, noNaN: true }),
        (value, unit, bandUm) => {
          const back = fromUm(toUm(value, unit, bandUm), unit, bandUm)
          expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-14 * Math.abs(value) + 1e-300)
        },
      ),
      { seed: 1 },
    )
  })

  // Property, no outside source.
  it('what is written is read again as the same height, to the decimals written', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -50, max: 50, noNaN: true }),
        fc.constantFrom<HeightUnit>('um', 'nm', 'uin', 'millionths', 'tenths', 'bands'),
        (valueUm, unit) => {
          const written = formatHeight(valueUm, unit, { decimals: 6, bandUm: heliumBandUm })
          expect(Math.abs(um(written, heliumBandUm) - valueUm)).toBeLessThanOrEqual(
            toUm(0.51e-6, unit, heliumBandUm),
          )
        },
      ),
      { seed: 2 },
    )
  })

  // 1 inch = 25.4 mm exactly (international yard and pound agreement, 1959; from memory).
  it('an inch is 25.4 mm exactly, and its shop parts follow', () => {
    expect(toUm(1, 'in')).toBe(25_400)
    expect(toUm(1, 'thou')).toBe(25.4)
    expect(toUm(1, 'tenths')).toBeCloseTo(2.54, 15)
    expect(toUm(1, 'uin')).toBeCloseTo(0.0254, 15)
    expect(toUm(1, 'millionths')).toBe(toUm(1, 'uin'))
    expect(toUm(1, 'mm')).toBe(1000)
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

  // JCGM 100, 7.2.6 (from memory): two digits of U are enough; rounding U up is common practice.
  it('an uncertainty that is a hair above a step goes up, one that is on it stays', () => {
    expect(formatWithUncertainty(0.5, 0.0401, 'um').u).toBe('±0.041')
    expect(formatWithUncertainty(0.5, 0.04, 'um').u).toBe('±0.040')
    expect(formatWithUncertainty(-0.5, 0.3001, 'um')).toEqual({ value: '\u22120.50', u: '±0.31', unit: 'µm' })
    expect(formatWithUncertainty(2 * heliumBandUm, 0.03, 'bands', heliumBandUm)).toEqual({
      value: '2.00',
      u: '±0.11',
      unit: 'bands',
    })
  })

  // Property, no outside source.
  it('an uncertainty is never printed smaller than it is', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-3, max: 30, noNaN: true }), (u) => {
        const printed = Number(formatWithUncertainty(1, u, 'um').u.slice(1))
        expect(printed).toBeGreaterThanOrEqual(u * (1 - 1e-6))
        expect(printed - u).toBeLessThanOrEqual(Math.max(0.001, 0.1 * u) * 1.001)
      }),
      { seed: 3 },
    )
  })

  it('no number is written with a negative nought', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1, max: 1, noNaN: true }),
        fc.integer({ min: 0, max: 6 }),
        fc.boolean(),
        (value, decimals, signed) => {
          const text = formatNumber(value, decimals, signed)
          expect(text).not.toContain('-')
          expect(text).not.toMatch(/^[+\u2212]0(\.0*)?$/)
        },
      ),
      { seed: 4 },
    )
    expect(formatNumber(-0, 2, true)).toBe('0.00')
  })

  it('names the unit', () => {
    expect(formatHeight(0.2937809, 'uin')).toBe('11.6 µin')
    expect(formatHeight(-0.25, 'um', { bare: true, signed: true })).toBe('\u22120.250')
    expect(unitSymbol('bands')).toBe('bands')
  })

  // Property, no outside source: each printed part stands within one step of the true one.
  it('printed parts add up to the printed sum for any two parts', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 100, noNaN: true }),
        fc.double({ min: 0, max: 100, noNaN: true }),
        fc.integer({ min: 0, max: 6 }),
        (first, second, decimals) => {
          const step = 10 ** -decimals
          const parts = roundParts(first, second, decimals)
          const steps = (value: number) => Math.round(value / step)
          expect(steps(parts.first) + steps(parts.second)).toBe(steps(parts.sum))
          expect(Math.abs(parts.sum - first - second)).toBeLessThanOrEqual(0.5001 * step)
          expect(Math.abs(parts.first - first)).toBeLessThanOrEqual(1.0001 * step)
          expect(Math.abs(parts.second - second)).toBeLessThanOrEqual(1.0001 * step)
        },
      ),
      { seed: 5 },
    )
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
