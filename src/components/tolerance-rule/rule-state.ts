import type { Tolerance } from '@shared/schemas/parts'
import type { Verdict } from '@shared/schemas/results'

export interface RuleFacts {
  tolerance: Tolerance
  /** Guard band w = factor × U. */
  guardFactor: number
  /** The figure that the rule compares: signed (plus is high) for a signed tolerance. */
  resultUm: number | null
  expandedUncertaintyUm: number | null
  verdict: Verdict
  /** A draft has no verdict, whatever the figure. */
  draft: boolean
}

export type RuleState =
  | 'conforms'
  | 'neitherProven'
  | 'doesNotConform'
  | 'farOut'
  | 'noTolerance'
  | 'noUncertainty'
  | 'noVerdict'
  | 'notRead'

/** Which of the rule's pictures stands for the facts; beyond the scale is told apart by `isBeyond`. */
export function ruleState(facts: RuleFacts, isBeyond: boolean): RuleState {
  if (facts.resultUm === null) return 'notRead'
  if (facts.expandedUncertaintyUm === null) return 'noUncertainty'
  if (facts.tolerance.kind === 'none') return 'noTolerance'
  if (facts.draft) return 'noVerdict'
  switch (facts.verdict) {
    case 'conforms':
    case 'neitherProven':
      return facts.verdict
    case 'doesNotConform':
      return isBeyond ? 'farOut' : 'doesNotConform'
    case 'noTolerance':
      return 'noTolerance'
    case 'noVerdict':
      return 'noVerdict'
  }
}
