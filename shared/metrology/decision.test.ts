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
})
