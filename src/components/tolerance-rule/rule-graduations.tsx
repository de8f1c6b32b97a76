import { type Graduation, graduations, type RuleScale } from '@shared/look/rule-scale'
import type { DisplayUnit } from '@shared/schemas/settings'
import { formatNumber, fromUm, toUm } from '@shared/units/height'
import type { RuleMeasures, RuleSize } from './rule-measures'

interface Props {
  scale: RuleScale
  size: RuleSize
  measures: RuleMeasures
  widthPx: number
  unit: DisplayUnit
  bandUm: number | undefined
}

/** Labels nearer than this to a gate's own would run into it. */
const labelClearPx = 27

/** The base line, its graduations, and on the full rule their figures. */
export function RuleGraduations({ scale, size, measures, widthPx, unit, bandUm }: Props) {
  const y = measures.baselineYPx + 0.5
  const shown = (valueUm: number) => fromUm(valueUm, unit, bandUm)
  const marks = measures.graduationPx ? graduations(shown(scale.leastUm), shown(scale.mostUm), widthPx) : []
  const xOf = (mark: Graduation) => scale.toX(toUm(mark.value, unit, bandUm))
  const lengths = measures.graduationPx ?? { major: 0, minor: 0 }
  return (
    <g stroke="var(--graduation)" strokeWidth="1">
      <line x1="0" x2={widthPx} y1={y} y2={y} />
      {marks.map((mark) => {
        const x = crisp(xOf(mark))
        return (
          <line key={mark.value} x1={x} x2={x} y1={y} y2={y + (mark.major ? lengths.major : lengths.minor)} />
        )
      })}
      {size === 'full' && (
        <Labels
          marks={marks.filter((m) => m.major)}
          xOf={xOf}
          gates={scale.gatesUm.map((um) => ({ value: shown(um), xPx: scale.toX(um) }))}
          widthPx={widthPx}
        />
      )}
    </g>
  )
}

interface LabelProps {
  marks: Graduation[]
  xOf: (mark: Graduation) => number
  gates: { value: number; xPx: number }[]
  widthPx: number
}

function Labels({ marks, xOf, gates, widthPx }: LabelProps) {
  const step = marks.length > 1 ? marks[1].value - marks[0].value : 1
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
  const clear = marks.filter((mark) => gates.every((gate) => Math.abs(gate.xPx - xOf(mark)) > labelClearPx))
  return (
    <g stroke="none" className="text-axis" textAnchor="middle">
      {clear.map((mark) => (
        <text
          key={mark.value}
          x={xOf(mark)}
          y={56}
          fill="var(--muted)"
          textAnchor={anchor(xOf(mark), widthPx)}
        >
          {mark.value === 0 ? '0' : formatNumber(mark.value, decimals)}
        </text>
      ))}
      {gates.map((gate) => (
        <text key={gate.value} x={gate.xPx} y={56} fill="var(--ink)" fontWeight="600">
          {formatNumber(gate.value, gateDecimals(gate.value))}
        </text>
      ))}
    </g>
  )
}

/** As many decimals as a limit on a drawing has: 0.60, 0.3125 and 25. */
export function gateDecimals(value: number): number {
  const least = Math.abs(value) < 10 ? 2 : Math.abs(value) < 100 ? 1 : 0
  const exact = [0, 1, 2, 3, 4].find((n) => Math.abs(value - Number(value.toFixed(n))) < 1e-6)
  return Math.max(least, exact ?? 3)
}

function anchor(xPx: number, widthPx: number): 'start' | 'middle' | 'end' {
  if (xPx < 6) return 'start'
  return xPx > widthPx - 6 ? 'end' : 'middle'
}

function crisp(px: number): number {
  return Math.floor(px) + 0.5
}
