import { type RuleScale, ruleScale } from '@shared/look/rule-scale'
import type { DisplayUnit } from '@shared/schemas/settings'
import { useTranslation } from 'react-i18next'
import { RuleBar } from './rule-bar'
import { RuleGraduations } from './rule-graduations'
import { type RuleMeasures, type RuleSize, ruleMeasures } from './rule-measures'
import { RuleResult } from './rule-result'
import { ruleSentence } from './rule-sentence'
import { type RuleFacts, ruleState } from './rule-state'

export interface ToleranceRuleProps extends RuleFacts {
  size: RuleSize
  /** Other than the size's own width, in whole pixels. */
  widthPx?: number
  unit?: DisplayUnit
  /** Height of one band, for a shop that reads in bands. */
  bandUm?: number | null
}

/** A scale past the tolerance, a gate at it, the result and its uncertainty. The words stand beside it. */
export function ToleranceRule({ size, widthPx, unit = 'um', bandUm, ...facts }: ToleranceRuleProps) {
  const { t } = useTranslation()
  const measures = ruleMeasures[size]
  const width = widthPx ?? measures.widthPx
  const band = bandUm ?? undefined
  const shownUnit = unit === 'bands' && band === undefined ? 'um' : unit
  const scale = ruleScale(facts.tolerance, facts.resultUm, width)
  const { resultUm } = facts
  const state = ruleState(facts, resultUm !== null && isBeyond(scale, resultUm))
  const shared = { facts, state, scale, measures, widthPx: width }
  return (
    <svg
      role="img"
      aria-label={ruleSentence(t, facts, state, shownUnit, band)}
      data-state={state}
      width={width}
      height={measures.heightPx}
      viewBox={`0 0 ${width} ${measures.heightPx}`}
      className="block max-w-full overflow-visible"
    >
      <RuleBar {...shared} />
      <RuleGraduations
        scale={scale}
        size={size}
        measures={measures}
        widthPx={width}
        unit={shownUnit}
        bandUm={band}
      />
      <Gates scale={scale} measures={measures} />
      {resultUm !== null && <RuleResult {...shared} facts={{ ...facts, resultUm }} />}
    </svg>
  )
}

function isBeyond(scale: RuleScale, resultUm: number): boolean {
  return resultUm > scale.mostUm || resultUm < scale.leastUm
}

function Gates({ scale, measures }: { scale: RuleScale; measures: RuleMeasures }) {
  const { baselineYPx, barPx, gateBelowPx, gatePx } = measures
  return scale.gatesUm.map((gateUm) => {
    const x = Math.round(scale.toX(gateUm))
    return (
      <line
        key={gateUm}
        data-gate
        x1={x}
        x2={x}
        y1={baselineYPx - barPx - 4}
        y2={baselineYPx + gateBelowPx - 1}
        stroke="var(--ink)"
        strokeWidth={gatePx}
      />
    )
  })
}
