import { describe, expect, it } from 'vitest'
import type { Tolerance } from '../schemas/parts'
import { graduations, niceStep, ruleScale, stepDecimals } from './rule-scale'

const um = (valueUm: number) => ({ valueUm, typed: `${valueUm} um` })
const plain: Tolerance = { kind: 'plain', max: um(0.6) }

describe('the scale of a tolerance rule', () => {
  it('puts the gate of a plain tolerance at five eighths, whatever it is', () => {
    for (const valueUm of [0.05, 0.6, 12]) {
      const { toX, gatesUm } = ruleScale({ kind: 'plain', max: um(valueUm) }, null, 800)
      expect(toX(gatesUm[0]!)).toBeCloseTo(500, 9)
    }
  })

  it('shows as much beyond either limit of a signed one', () => {
    const { toX, gatesUm } = ruleScale({ kind: 'signed', least: um(-0.6), most: um(-0.2) }, -0.4, 320)
    const [least, most] = gatesUm.map(toX)
    expect(least).toBeCloseTo(320 - most!, 9)
    expect(toX(-0.4)).toBeCloseTo(160, 9)
  })

  it('goes by the result where there is no tolerance, and by 1 µm where there is neither', () => {
    expect(ruleScale({ kind: 'none' }, 0.5, 160).mostUm).toBeCloseTo(0.8, 12)
    expect(ruleScale({ kind: 'none' }, null, 160).mostUm).toBeCloseTo(1.6, 12)
  })
})

describe('graduations', () => {
  it('stand in steps of 1, 2 or 5 from end to end, long ones in whole numbers of short ones', () => {
    const { leastUm, mostUm } = ruleScale(plain, null, 272)
    const marks = graduations(leastUm, mostUm, 272)
    expect(marks[0]).toEqual({ value: 0, major: true })
    expect(marks.at(-1)!.value).toBeLessThanOrEqual(mostUm + 1e-9)
    const step = marks[1]!.value - marks[0]!.value
    expect([1, 2, 5]).toContain(Math.round(step / 10 ** Math.floor(Math.log10(step) + 1e-9)))
  })
})

describe('a nice step', () => {
  it.each([
    [0.03, 0.05],
    [0.05, 0.05],
    [0.6, 1],
    [1.1, 2],
    [7, 10],
  ])('of at least %d is %d', (wanted, step) => {
    expect(niceStep(wanted)).toBeCloseTo(step, 12)
  })

  it('needs as many decimals as its first figure stands behind the point', () => {
    expect([0.05, 0.1, 0.002, 1, 20].map(stepDecimals)).toEqual([2, 1, 3, 0, 0])
  })
})
