import type { RuleScale } from '@shared/look/rule-scale'
import { type RuleMeasures, whiskerPx } from './rule-measures'
import type { RuleFacts, RuleState } from './rule-state'

interface Props {
  facts: RuleFacts & { resultUm: number }
  state: RuleState
  scale: RuleScale
  measures: RuleMeasures
  widthPx: number
}

const toneOf: Record<RuleState, string> = {
  conforms: 'var(--bottle)',
  neitherProven: 'var(--ink)',
  doesNotConform: 'var(--chestnut)',
  farOut: 'var(--chestnut)',
  noTolerance: 'var(--ink)',
  noUncertainty: 'var(--ink)',
  noVerdict: 'var(--ink)',
  notRead: 'var(--ink)',
}

/** Stem, head and whisker at the result; off the scale, what points there. */
export function RuleResult({ facts, state, scale, measures, widthPx }: Props) {
  const xPx = scale.toX(facts.resultUm)
  const tone = toneOf[state]
  if (xPx > widthPx || xPx < 0) {
    return <Beyond state={state} tone={tone} measures={measures} widthPx={widthPx} toRight={xPx > widthPx} />
  }
  const { whiskerYPx: y, baselineYPx, stemPx } = measures
  const dotted = state === 'noUncertainty'
  return (
    <g
      data-testid="rule-result"
      className="transition-transform duration-[120ms] ease-out"
      style={{ transform: `translateX(${xPx}px)` }}
      stroke={tone}
      fill="none"
    >
      <line y1={baselineYPx} y2={y} strokeWidth={stemPx} strokeDasharray={dotted ? '1.5 2' : undefined} />
      {dotted ? (
        <line x1={-7} x2={7} y1={y} y2={y} strokeWidth={whiskerPx} strokeDasharray="1.5 2" />
      ) : (
        <Whisker facts={facts} scale={scale} measures={measures} widthPx={widthPx} xPx={xPx} />
      )}
      <Head state={state} draft={facts.draft} yPx={y} radiusPx={measures.headRadiusPx} tone={tone} />
    </g>
  )
}

function Whisker({ facts, scale, measures, widthPx, xPx }: Omit<Props, 'state'> & { xPx: number }) {
  const u = facts.expandedUncertaintyUm ?? 0
  const { whiskerYPx: y, capPx } = measures
  const left = scale.toX(facts.resultUm - u)
  const right = scale.toX(facts.resultUm + u)
  const from = Math.max(0, left) - xPx
  const to = Math.min(widthPx, right) - xPx
  return (
    <g strokeWidth={whiskerPx}>
      <line x1={from} x2={to} y1={y} y2={y} />
      {/* A whisker that runs off the scale has no cap there. */}
      {left >= 0 && <line x1={from} x2={from} y1={y - capPx / 2} y2={y + capPx / 2} />}
      {right <= widthPx && <line x1={to} x2={to} y1={y - capPx / 2} y2={y + capPx / 2} />}
    </g>
  )
}

interface HeadProps {
  state: RuleState
  draft: boolean
  yPx: number
  radiusPx: number
  tone: string
}

/** Filled round, open round and diamond say a verdict; where there is none the stem ends at the whisker. */
function Head({ state, draft, yPx, radiusPx, tone }: HeadProps) {
  switch (state) {
    case 'conforms':
      return <circle data-head="filled" cy={yPx} r={radiusPx} fill={tone} stroke="none" />
    case 'neitherProven':
      return <OpenHead yPx={yPx} radiusPx={radiusPx} />
    case 'noUncertainty':
      return draft ? null : <OpenHead yPx={yPx} radiusPx={radiusPx} />
    case 'doesNotConform':
      return <Diamond xPx={0} yPx={yPx} radiusPx={radiusPx} tone={tone} />
    default:
      return null
  }
}

function OpenHead({ yPx, radiusPx }: { yPx: number; radiusPx: number }) {
  return <circle data-head="open" cy={yPx} r={radiusPx} fill="var(--ground)" strokeWidth={1.5} />
}

function Diamond({ xPx, yPx, radiusPx, tone }: { xPx: number; yPx: number; radiusPx: number; tone: string }) {
  const r = radiusPx * 1.2
  return (
    <path
      data-head="diamond"
      d={`M${xPx} ${yPx - r}L${xPx + r} ${yPx}L${xPx} ${yPx + r}L${xPx - r} ${yPx}Z`}
      fill={tone}
      stroke="none"
    />
  )
}

interface BeyondProps {
  state: RuleState
  tone: string
  measures: RuleMeasures
  widthPx: number
  toRight: boolean
}

/** Past the end of the scale: a chevron, and before it the diamond where the verdict stands. */
function Beyond({ state, tone, measures, widthPx, toRight }: BeyondProps) {
  const { whiskerYPx: y, headRadiusPx: r } = measures
  const tip = toRight ? widthPx - 1 : 1
  const back = toRight ? -r * 1.3 : r * 1.3
  return (
    <g data-testid="rule-beyond">
      <path
        d={`M${tip + back} ${y - r * 0.9}L${tip} ${y}L${tip + back} ${y + r * 0.9}`}
        stroke={tone}
        strokeWidth={1.6}
        fill="none"
      />
      {state === 'farOut' && <Diamond xPx={tip + back * 2.6} yPx={y} radiusPx={r} tone={tone} />}
    </g>
  )
}
