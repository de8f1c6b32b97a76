import { describe, expect, it } from 'vitest'
import { parseLength } from './length'

describe('lengths of a drawing', () => {
  // 1 inch = 25.4 mm exactly (international yard and pound agreement, 1959; from memory).
  it.each([
    ['40', 40],
    ['40 mm', 40],
    ['40,5', 40.5],
    ['.5 mm', 0.5],
    [' 4 CM ', 40],
    ['0.04 m', 40],
    ['1 in', 25.4],
    ['2 inches', 50.8],
    ['1,575"', 40.005],
    ['1.575 inch', 40.005],
  ])('“%s” is read in millimetres', (text, expected) => {
    const parsed = parseLength(text)
    expect(parsed).toMatchObject({ ok: true, typed: text.trim() })
    if (parsed.ok) expect(parsed.valueMm).toBeCloseTo(expected, 12)
  })

  it.each([
    ['  ', 'empty'],
    ['wide', 'notANumber'],
    // No side of a drawing is below nothing.
    ['-40 mm', 'notANumber'],
    ['\u221240 mm', 'notANumber'],
    ['40 ells', 'unitUnknown'],
    ['1.2.3', 'unitUnknown'],
    ['40 constructor', 'unitUnknown'],
  ])('“%s” is refused and says why', (text, reason) => {
    expect(parseLength(text)).toEqual({ ok: false, reason })
  })
})
