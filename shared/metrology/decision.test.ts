import { describe, expect, it } from 'vitest'
import { type DecisionInput, decide, riskOfAcceptance } from './decision'

const plain: DecisionInput = {
  tolerance: { kind: 'plain', max: { valueUm: 0.6, typed: '0.6 um' } },
  rule: { guardFactor: 1 },
  flatnessUm: 0.5,
  expandedUncertaintyUm: 0.05,
  sagittaUm: 0.3,
  sagittaUUm: 0.05,
  supportedShare: 1,
  leastSupportedShare: 0.9,
}
const signed: DecisionInput = {
  ...plain,
  // "Hollow 0.2 to 0.6 µm, never high".
  tolerance: {
    kind: 'signed',
    least: { valueUm: -0.6, typed: '-0.6 um' },
    most: { valueUm: -0.2, typed: '-0.2 um' },
  },
  flatnessUm: 0.4,
}

describe('the decision with a guard band w = r·U', () => {
  it.each([
    [0.549, 'conforms'],
    [0.551, 'neitherProven'],
    [0.649, 'neitherProven'],
    [0.651, 'doesNotConform'],
  ])('%s µm of 0.60 with U = 0.05 %s', (flatnessUm, verdict) => {
    expect(decide({ ...plain, flatnessUm }).verdict).toBe(verdict)
  })

  it('simple acceptance knows no doubt', () => {
    expect(decide({ ...plain, rule: { guardFactor: 0 }, flatnessUm: 0.599 }).verdict).toBe('conforms')
    expect(decide({ ...plain, rule: { guardFactor: 0 }, flatnessUm: 0.601 }).verdict).toBe('doesNotConform')
  })

  it('gives no verdict without a tolerance, a figure, an uncertainty or enough support', () => {
    expect(decide({ ...plain, tolerance: { kind: 'none' } }).verdict).toBe('noTolerance')
    expect(decide({ ...plain, flatnessUm: null }).reason).toBe('notRead')
    expect(decide({ ...plain, expandedUncertaintyUm: null }).reason).toBe('noUncertainty')
    expect(decide({ ...plain, supportedShare: 0.5 })).toMatchObject({
      verdict: 'noVerdict',
      reason: 'tooLittleSupported',
    })
  })

  it('a signed tolerance asks for the sign', () => {
    expect(decide({ ...signed, sagittaUm: -0.4 }).verdict).toBe('conforms')
    expect(decide({ ...signed, sagittaUm: 0.4 }).verdict).toBe('doesNotConform')
    expect(decide({ ...signed, sagittaUm: null })).toMatchObject({
      verdict: 'neitherProven',
      reason: 'signUnknown',
    })
  })

  it('a signed tolerance is failed without a sign where both signs fail it', () => {
    expect(decide({ ...signed, flatnessUm: 0.9, sagittaUm: null }).verdict).toBe('doesNotConform')
  })

  // Normal model with k = 2, from the table of the normal distribution: Φ(−1.65) = 4.95 %, Φ(−2) = 2.28 %.
  it('names the risk of each rule', () => {
    expect(riskOfAcceptance(0)).toBeCloseTo(0.5, 6)
    expect(riskOfAcceptance(0.825)).toBeCloseTo(0.0495, 4)
    expect(riskOfAcceptance(1)).toBeCloseTo(0.02275, 4)
  })

  // ISO 14253-1 and JCGM 106 (from memory): the limits themselves count as within. Numbers exact in binary.
  it('a figure on the edge of the guard band conforms inside, and isn’t failed outside', () => {
    const onEdge = {
      ...plain,
      tolerance: { kind: 'plain', max: { valueUm: 0.75, typed: '0.75 um' } },
      expandedUncertaintyUm: 0.25,
    } as const
    expect(decide({ ...onEdge, flatnessUm: 0.5 })).toEqual({
      verdict: 'conforms',
      guardBandUm: 0.25,
      spareUm: 0,
      reason: null,
    })
    expect(decide({ ...onEdge, flatnessUm: 1 }).verdict).toBe('neitherProven')
    expect(decide({ ...onEdge, flatnessUm: 1.0001 }).verdict).toBe('doesNotConform')
  })

  // ILAC-G8 worked figures (arithmetic derived here): T 1.0, U 0.10: limits of acceptance 0.900 and 0.917.
  it.each([
    [1, 0.9],
    [0.83, 0.917],
    [0, 1],
  ])('guard factor %s accepts up to %s of 1.0 µm with U = 0.10', (guardFactor, limit) => {
    const at = (flatnessUm: number) =>
      decide({
        ...plain,
        tolerance: { kind: 'plain', max: { valueUm: 1, typed: '1 um' } },
        rule: { guardFactor },
        expandedUncertaintyUm: 0.1,
        flatnessUm,
      }).verdict
    expect(at(limit - 1e-6)).toBe('conforms')
    expect(at(limit + 1e-6)).not.toBe('conforms')
  })

  it('names the guard band and what is to spare', () => {
    const { guardBandUm, spareUm } = decide(plain)
    expect(guardBandUm).toBeCloseTo(0.05, 12)
    expect(spareUm).toBeCloseTo(0.6 - 0.5 - 0.05, 12)
  })

  it('a sagitta within its own uncertainty tells no sign', () => {
    expect(decide({ ...signed, sagittaUm: -0.04, sagittaUUm: 0.05 }).reason).toBe('signUnknown')
    expect(decide({ ...signed, sagittaUm: -0.06, sagittaUUm: 0.05 }).verdict).toBe('conforms')
  })

  it('a signed tolerance fails a hollow that is too deep and doubts one at its lesser limit', () => {
    expect(decide({ ...signed, flatnessUm: 0.7, sagittaUm: -0.7 }).verdict).toBe('doesNotConform')
    expect(decide({ ...signed, flatnessUm: 0.22, sagittaUm: -0.22 }).verdict).toBe('neitherProven')
    expect(decide({ ...signed, flatnessUm: 0.1, sagittaUm: -0.1 }).verdict).toBe('doesNotConform')
  })

  it('a signed tolerance about nought conforms without a sign where both signs do', () => {
    const either = {
      kind: 'signed',
      least: { valueUm: -0.6, typed: '-0.6 um' },
      most: { valueUm: 0.6, typed: '0.6 um' },
    } as const
    expect(decide({ ...plain, tolerance: either, flatnessUm: 0.3, sagittaUm: null })).toMatchObject({
      verdict: 'conforms',
      reason: null,
    })
  })

  it('support at the least share still counts', () => {
    expect(decide({ ...plain, supportedShare: 0.9 }).verdict).toBe('conforms')
    expect(decide({ ...plain, supportedShare: 0.8999 }).verdict).toBe('noVerdict')
  })

  // Φ(−2 r), from the table of the normal distribution (derived here): 0.5 → 15.87 %, 1.5 → 0.135 %.
  it('names the risk between the usual rules too', () => {
    expect(riskOfAcceptance(0.5)).toBeCloseTo(0.1587, 4)
    expect(riskOfAcceptance(0.83)).toBeCloseTo(0.0485, 4)
    expect(riskOfAcceptance(1.5)).toBeCloseTo(0.00135, 5)
  })
})
