import { niceStep } from '@shared/look/rule-scale'
import type { DisplayUnit } from '@shared/schemas/settings'
import { formatNumber, fromUm } from '@shared/units/height'

export interface ProfileLine {
  tone: 'before' | 'after'
  /** Evenly spaced heights; null where nothing is measured, and the line is open there. */
  heightsUm: readonly (number | null)[]
  uUm: number | null
}

interface Props {
  lines: readonly ProfileLine[]
  /** Length of the line over the face. */
  lengthMm: number
  unit: DisplayUnit
  bandUm?: number
  widthPx?: number
  heightPx?: number
  label: string
}

const leftPx = 52
const footPx = 24

/** Heights along a line: before dashed chestnut, after solid bottle, ± U shaded. */
export function ProfileChart({
  lines,
  lengthMm,
  unit: wanted,
  bandUm,
  widthPx = 520,
  heightPx = 150,
  label,
}: Props) {
  const unit = wanted === 'bands' && !bandUm ? 'um' : wanted
  const shown = (um: number) => fromUm(um, unit, bandUm)
  const { least, most } = extentOf(lines, shown)
  const plot = { width: widthPx - leftPx - 8, height: heightPx - footPx - 8 }
  const yOf = (value: number) => 8 + ((most - value) / (most - least)) * plot.height
  const xOf = (share: number) => leftPx + share * plot.width
  return (
    <svg
      role="img"
      aria-label={label}
      width={widthPx}
      height={heightPx}
      viewBox={`0 0 ${widthPx} ${heightPx}`}
      className="block h-auto max-w-full text-axis"
      fill="var(--muted)"
    >
      <HeightAxis least={least} most={most} yOf={yOf} rightPx={leftPx + plot.width} />
      <LengthAxis lengthMm={lengthMm} xOf={xOf} yPx={8 + plot.height} />
      {lines.map((line) => (
        <Line key={line.tone} line={line} xOf={xOf} yOf={(um) => yOf(shown(um))} />
      ))}
    </svg>
  )
}

function extentOf(lines: readonly ProfileLine[], shown: (um: number) => number) {
  const values = lines.flatMap(({ heightsUm, uUm }) =>
    heightsUm.flatMap((um) => (um === null ? [] : [shown(um - (uUm ?? 0)), shown(um + (uUm ?? 0))])),
  )
  const least = Math.min(0, ...values)
  const most = Math.max(0, ...values)
  const margin = (most - least || 1) * 0.06
  return { least: least - margin, most: most + margin }
}

interface HeightAxisProps {
  least: number
  most: number
  yOf: (value: number) => number
  rightPx: number
}

function HeightAxis({ least, most, yOf, rightPx }: HeightAxisProps) {
  const step = niceStep((most - least) / 5)
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
  const first = Math.ceil(least / step)
  const count = Math.floor(most / step) - first + 1
  return Array.from({ length: count }, (_, i) => (first + i) * step).map((value) => {
    const isPlane = Math.abs(value) < step / 2
    const y = Math.round(yOf(value)) + 0.5
    return (
      <g key={value}>
        <path
          d={isPlane ? `M${leftPx} ${y}H${rightPx}` : `M${leftPx - 4} ${y}h4`}
          stroke={isPlane ? 'var(--ink)' : 'var(--graduation)'}
          strokeWidth={isPlane ? 0.75 : 1}
        />
        <text x={leftPx - 8} y={y + 4} textAnchor="end">
          {isPlane ? '0' : formatNumber(value, decimals, true)}
        </text>
      </g>
    )
  })
}

function LengthAxis({
  lengthMm,
  xOf,
  yPx,
}: {
  lengthMm: number
  xOf: (share: number) => number
  yPx: number
}) {
  const step = niceStep(lengthMm / 6)
  const marks = Array.from({ length: Math.floor(lengthMm / step + 1e-9) + 1 }, (_, i) => i * step)
  return (
    <g>
      <path
        d={`M${leftPx} ${yPx + 0.5}H${xOf(1)}M${leftPx + 0.5} 8V${yPx}`}
        stroke="var(--graduation)"
        fill="none"
      />
      {marks.map((mm, i) => (
        <text key={mm} x={xOf(mm / lengthMm)} y={yPx + 17} textAnchor="middle">
          {i === marks.length - 1 ? `${Number(mm.toPrecision(3))} mm` : Number(mm.toPrecision(3))}
        </text>
      ))}
    </g>
  )
}

interface LineProps {
  line: ProfileLine
  xOf: (share: number) => number
  yOf: (um: number) => number
}

function Line({ line, xOf, yOf }: LineProps) {
  const colour = line.tone === 'before' ? 'var(--chestnut)' : 'var(--bottle)'
  const stretches = stretchesOf(line.heightsUm)
  const last = line.heightsUm.length - 1
  const point = (i: number, um: number) => `${xOf(i / last).toFixed(1)} ${yOf(um).toFixed(1)}`
  return (
    <g>
      {stretches.map((stretch) => {
        const path = stretch.map(([i, um]) => point(i, um)).join('L')
        const u = line.uUm ?? 0
        const band = [
          ...stretch.map(([i, um]) => point(i, um + u)),
          ...stretch.toReversed().map(([i, um]) => point(i, um - u)),
        ].join('L')
        return (
          <g key={stretch[0][0]}>
            {u > 0 && <path d={`M${band}Z`} fill={colour} fillOpacity="0.13" />}
            <path
              d={`M${path}`}
              fill="none"
              stroke={colour}
              strokeWidth="1.5"
              strokeDasharray={line.tone === 'before' ? '5 3' : undefined}
            />
          </g>
        )
      })}
    </g>
  )
}

/** Runs of measured places; gaps stay open. */
function stretchesOf(heightsUm: readonly (number | null)[]): [number, number][][] {
  const stretches: [number, number][][] = []
  let current: [number, number][] = []
  heightsUm.forEach((um, i) => {
    if (um !== null) {
      current.push([i, um])
      return
    }
    if (current.length > 1) stretches.push(current)
    current = []
  })
  if (current.length > 1) stretches.push(current)
  return stretches
}
