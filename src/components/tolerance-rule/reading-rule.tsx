import type { Face } from '@shared/schemas/parts'
import type { ReadingRow } from '@shared/schemas/readings'
import type { ResultSummary } from '@shared/schemas/results'
import { isEditable } from '@shared/workflow/reading-states'
import { useDisplayUnit } from '@/lib/settings'
import type { RuleSize } from './rule-measures'
import type { RuleFacts } from './rule-state'
import { ToleranceRule } from './tolerance-rule'

interface Props {
  reading: Pick<ReadingRow, 'face' | 'result' | 'state'>
  size: RuleSize
  widthPx?: number
}

/** The rule of a reading as it stands: with its verdict once it has left draft. */
export function ReadingRule({ reading, size, widthPx }: Props) {
  const unit = useDisplayUnit()
  const facts = readingFacts(reading)
  return (
    <ToleranceRule {...facts} size={size} widthPx={widthPx} unit={unit} bandUm={reading.result?.bandUm} />
  )
}

/** What a rule needs of a reading. */
export function readingFacts({ face, result, state }: Props['reading']): RuleFacts {
  return {
    tolerance: face.tolerance,
    guardFactor: face.rule.guardFactor,
    resultUm: comparedUm(face, result),
    expandedUncertaintyUm: result?.expandedUncertaintyUm ?? null,
    verdict: result?.verdict ?? 'noVerdict',
    draft: isEditable(state),
  }
}

/** The flatness; for a signed tolerance with the sign of the sagitta, plus where none is known. */
function comparedUm(face: Face, result: ResultSummary | null): number | null {
  if (!result || result.flatnessUm === null) return null
  const hollow = face.tolerance.kind === 'signed' && result.sagittaUm !== null && result.sagittaUm < 0
  return hollow ? -result.flatnessUm : result.flatnessUm
}
