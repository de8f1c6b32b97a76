import type { DisplayUnit } from '@shared/schemas/settings'
import { formatHeight, formatNumber, formatWithUncertainty, fromUm } from '@shared/units/height'
import type { TFunction } from 'i18next'
import { gateDecimals } from './rule-graduations'
import type { RuleFacts, RuleState } from './rule-state'

/** What a rule says to somebody who doesn't see it. */
export function ruleSentence(
  t: TFunction,
  facts: RuleFacts,
  state: RuleState,
  unit: DisplayUnit,
  bandUm: number | undefined,
): string {
  const limit = limitWords(t, facts, unit, bandUm)
  const unitWord = t(`common:unitWord.${unit}`)
  if (facts.resultUm === null)
    return t('common:rule.notRead', { context: limit ? '' : 'free', limit, unit: unitWord })
  const { value, u } = figureWords(facts.resultUm, facts.expandedUncertaintyUm, unit, bandUm)
  const verdict = t(`common:rule.${facts.draft && state === 'noVerdict' ? 'draft' : state}`)
  const figure = u ? t('common:rule.figureWithU', { value, u }) : value
  return t(limit ? 'common:rule.sentence' : 'common:rule.sentenceFree', {
    figure,
    limit,
    unit: unitWord,
    verdict,
  })
}

function figureWords(resultUm: number, uUm: number | null, unit: DisplayUnit, bandUm: number | undefined) {
  if (uUm === null) return { value: formatHeight(resultUm, unit, { bandUm, bare: true }), u: null }
  const { value, u } = formatWithUncertainty(resultUm, uUm, unit, bandUm)
  return { value, u: u.replace('±', '') }
}

function limitWords(
  t: TFunction,
  { tolerance }: RuleFacts,
  unit: DisplayUnit,
  bandUm: number | undefined,
): string {
  const number = (valueUm: number) => {
    const value = fromUm(valueUm, unit, bandUm)
    return formatNumber(value, gateDecimals(value), tolerance.kind === 'signed')
  }
  switch (tolerance.kind) {
    case 'none':
      return ''
    case 'plain':
      return number(tolerance.max.valueUm)
    case 'signed':
      return t('common:rule.range', {
        least: number(tolerance.least.valueUm),
        most: number(tolerance.most.valueUm),
      })
  }
}
