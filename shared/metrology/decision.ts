import type { DecisionRule, Tolerance } from '../schemas/parts'
import type { Verdict } from '../schemas/results'

export interface DecisionInput {
  tolerance: Tolerance
  rule: Pick<DecisionRule, 'guardFactor'>
  /** The figure by the face's reference, µm; null when the reading was refused. */
  flatnessUm: number | null
  expandedUncertaintyUm: number | null
  /** Middle over rim, plus is high; null when the sign is unknown. */
  sagittaUm: number | null
  sagittaUUm: number | null
  supportedShare: number
  leastSupportedShare: number
}

export interface Decision {
  verdict: Verdict
  /** w = guard factor × U; null without U. */
  guardBandUm: number | null
  /** Distance to the nearer limit less the guard band: positive to spare, negative beyond; null without a verdict. */
  spareUm: number | null
  /** Why there is no plain answer; its sentence stands under `readings.decision.<reason>`. */
  reason: 'noTolerance' | 'notRead' | 'noUncertainty' | 'tooLittleSupported' | 'signUnknown' | null
}

/**
 * The shop's rule with guard band w = r·U (ISO 14253-1, JCGM 106): at most T − w conforms, above T + w does not,
 * between them neither is proven. A signed tolerance compares the signed flatness (plus for a high middle, minus
 * for a hollow) with both limits; where the sign can't be told, the verdict stands only if both signs give it.
 */
export function decide(input: DecisionInput): Decision {
  const { tolerance, flatnessUm, expandedUncertaintyUm: uUm } = input
  if (flatnessUm === null) return without('notRead', null)
  const guardBandUm = uUm === null ? null : input.rule.guardFactor * uUm
  if (tolerance.kind === 'none') return { ...without('noTolerance', guardBandUm), verdict: 'noTolerance' }
  if (guardBandUm === null) return without('noUncertainty', null)
  if (input.supportedShare < input.leastSupportedShare) return without('tooLittleSupported', guardBandUm)
  switch (tolerance.kind) {
    case 'plain':
      return judged(tolerance.max.valueUm - flatnessUm, guardBandUm)
    case 'signed':
      return decideSigned(input, tolerance, flatnessUm, guardBandUm)
  }
}

function without(reason: NonNullable<Decision['reason']>, guardBandUm: number | null): Decision {
  return { verdict: 'noVerdict', guardBandUm, spareUm: null, reason }
}

/** `inside` is the distance to the limit, positive within it. */
function judged(inside: number, guardBandUm: number): Decision {
  const verdict =
    inside >= guardBandUm ? 'conforms' : inside < -guardBandUm ? 'doesNotConform' : 'neitherProven'
  return { verdict, guardBandUm, spareUm: inside - guardBandUm, reason: null }
}

function decideSigned(
  { sagittaUm, sagittaUUm }: DecisionInput,
  tolerance: Extract<Tolerance, { kind: 'signed' }>,
  flatnessUm: number,
  guardBandUm: number,
): Decision {
  const at = (signedUm: number) =>
    judged(Math.min(signedUm - tolerance.least.valueUm, tolerance.most.valueUm - signedUm), guardBandUm)
  const told = sagittaUm !== null && Math.abs(sagittaUm) > (sagittaUUm ?? 0)
  if (told) return at(Math.sign(sagittaUm) * flatnessUm)
  const high = at(flatnessUm)
  const hollow = at(-flatnessUm)
  const worse = (high.spareUm ?? 0) < (hollow.spareUm ?? 0) ? high : hollow
  if (high.verdict === hollow.verdict)
    return { ...worse, reason: worse.verdict === 'neitherProven' ? 'signUnknown' : null }
  return { ...worse, verdict: 'neitherProven', reason: 'signUnknown' }
}

/** Chance that a face said to conform lies outside, at most, under a normal model and one limit: Φ(−2 r) with k = 2. */
export function riskOfAcceptance(guardFactor: number): number {
  return normalTail(2 * guardFactor)
}

/** 1 − Φ(x) by the complementary error function's rational form (Abramowitz and Stegun 7.1.26, error below 1.5e-7). */
function normalTail(x: number): number {
  const z = Math.abs(x) / Math.SQRT2
  const t = 1 / (1 + 0.3275911 * z)
  const series =
    t * (0.254829592 + t * (-0.284496736 + t * (1.421413741 + t * (-1.453152027 + t * 1.061405429))))
  const tail = (series * Math.exp(-z * z)) / 2
  return x >= 0 ? tail : 1 - tail
}
