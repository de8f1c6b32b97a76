import type { RuleScale } from '@shared/look/rule-scale'
import { useId } from 'react'
import type { RuleMeasures } from './rule-measures'
import type { RuleFacts, RuleState } from './rule-state'

interface Props {
  facts: RuleFacts
  state: RuleState
  scale: RuleScale
  measures: RuleMeasures
  widthPx: number
}

interface Span {
  fromPx: number
  toPx: number
}

/** Zone, guard bands and the solid bar of what doesn't conform. All on whole pixels. */
export function RuleBar({ facts, state, scale, measures, widthPx }: Props) {
  const hatchId = useId()
  const top = measures.baselineYPx - measures.barPx
  const guardUm = facts.resultUm === null ? 0 : facts.guardFactor * (facts.expandedUncertaintyUm ?? 0)
  const span = (fromUm: number, toUm: number) => clipped(scale.toX(fromUm), scale.toX(toUm), widthPx)
  const zone = zoneSpan(scale, guardUm, span)
  const beyond = beyondSpan(facts, state, scale, span)
  return (
    <g>
      <defs>
        <pattern
          id={hatchId}
          width="4"
          height="4"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <line x1="1" x2="1" y1="0" y2="4" stroke="var(--ink)" strokeWidth="1" />
        </pattern>
      </defs>
      {zone && <Bar span={zone} yPx={top} heightPx={measures.barPx} fill="var(--zone)" name="zone" />}
      {guardUm > 0 &&
        scale.gatesUm.map((gateUm) => (
          <Bar
            key={gateUm}
            span={span(gateUm - guardUm, gateUm + guardUm)}
            yPx={top}
            heightPx={measures.barPx}
            fill={`url(#${hatchId})`}
            name="guard"
          />
        ))}
      {beyond && (
        <Bar span={beyond} yPx={top} heightPx={measures.barPx} fill="var(--chestnut)" name="beyond" />
      )}
      {beyond && state === 'farOut' && <Break span={beyond} measures={measures} />}
    </g>
  )
}

type SpanOf = (fromUm: number, toUm: number) => Span

function zoneSpan(scale: RuleScale, guardUm: number, span: SpanOf): Span | null {
  const [first, second] = scale.gatesUm
  if (first === undefined) return null
  if (second === undefined) return span(0, Math.max(0, first - guardUm))
  return first + guardUm < second - guardUm ? span(first + guardUm, second - guardUm) : null
}

/** From the limit that is passed to the result. */
function beyondSpan(facts: RuleFacts, state: RuleState, scale: RuleScale, span: SpanOf): Span | null {
  if (facts.resultUm === null || (state !== 'doesNotConform' && state !== 'farOut')) return null
  const low = scale.gatesUm[0]
  const high = scale.gatesUm[scale.gatesUm.length - 1]
  if (facts.resultUm > high) return span(high, facts.resultUm)
  return facts.resultUm < low ? span(facts.resultUm, low) : null
}

function clipped(fromPx: number, toPx: number, widthPx: number): Span {
  const within = (px: number) => Math.round(Math.min(widthPx, Math.max(0, px)))
  return { fromPx: within(fromPx), toPx: within(toPx) }
}

interface BarProps {
  span: Span
  yPx: number
  heightPx: number
  fill: string
  name: string
}

function Bar({ span, yPx, heightPx, fill, name }: BarProps) {
  return (
    <rect
      data-bar={name}
      x={span.fromPx}
      y={yPx}
      width={Math.max(0, span.toPx - span.fromPx)}
      height={heightPx}
      fill={fill}
    />
  )
}

/** Two slants that say: the bar is longer than is drawn. */
function Break({ span, measures }: { span: Span; measures: RuleMeasures }) {
  const x = Math.round((span.fromPx + span.toPx) / 2)
  const top = measures.baselineYPx - measures.barPx - 3
  const foot = measures.baselineYPx + 3
  return (
    <g>
      <path d={`M${x - 2} ${foot}L${x + 1} ${top}h5L${x + 3} ${foot}Z`} fill="var(--ground)" />
      <path
        d={`M${x - 2} ${foot}L${x + 1} ${top}M${x + 3} ${foot}L${x + 6} ${top}`}
        stroke="var(--chestnut)"
        strokeWidth="1.2"
      />
    </g>
  )
}
