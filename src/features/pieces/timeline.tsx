import { niceStep } from '@shared/look/rule-scale'
import type { ReadingRow } from '@shared/schemas/readings'
import type { DisplayUnit } from '@shared/schemas/settings'
import { formatNumber, formatWithUncertainty, fromUm, type HeightUnit } from '@shared/units/height'
import { useTranslation } from 'react-i18next'
import { gateDecimals } from '@/components/tolerance-rule/rule-graduations'
import { formatSince } from '@/lib/format-when'
import { TimelinePoint } from './timeline-point'
import { type TimelineReading, timelineReadings } from './timeline-readings'

interface Props {
  /** Of one face, oldest first, each with a figure. */
  readings: readonly ReadingRow[]
  unit: DisplayUnit
  widthPx: number
}

const heightPx = 268
const topPx = 14
const footPx = 10
const rightPx = 118

/** Flatness of a piece over its readings, falling (it is hoped) into the tolerance. */
export function Timeline({ readings, unit: wanted, widthPx }: Props) {
  const { t } = useTranslation('pieces')
  // One axis for readings by different lights: bands don't compare.
  const unit: HeightUnit = wanted === 'bands' ? 'um' : wanted
  const shown = (um: number) => fromUm(um, unit)
  const { tolerance } = readings[readings.length - 1].face
  const points = timelineReadings(readings)
  const limits = tolerance.kind === 'none' ? [] : limitsOf(tolerance).map(shown)
  const { least, most } = extentOf(points, limits, shown)
  const plotPx = widthPx - rightPx
  const yOf = (value: number) => topPx + ((most - value) / (most - least)) * (heightPx - topPx - footPx)
  const xOf = (index: number) => ((index + 0.5) / points.length) * plotPx
  return (
    <svg
      role="img"
      aria-label={t('page.timeline.label', {
        count: points.length,
        list: points.map((point) => spoken(point, unit)).join('; '),
      })}
      width={widthPx}
      height={heightPx}
      className="block overflow-visible text-second"
      fill="var(--muted)"
    >
      <Zone limits={limits} least={least} yOf={yOf} plotPx={plotPx} />
      <Axis least={least} most={most} yOf={yOf} plotPx={plotPx} />
      <polyline
        points={points.map((point, i) => `${xOf(i)},${yOf(shown(point.valueUm))}`).join(' ')}
        fill="none"
        stroke="var(--edge)"
      />
      {points.map((point, i) => (
        <TimelinePoint key={point.id} point={point} xPx={xOf(i)} yOf={(um) => yOf(shown(um))} />
      ))}
      {limits.map((limit) => (
        <text key={limit} x={plotPx + 14} y={yOf(limit) + 4} fill="var(--ink)">
          <tspan fontWeight="600">{formatNumber(limit, gateDecimals(limit), limits.length > 1)}</tspan>
          <tspan fill="var(--muted)"> {t('page.timeline.tolerance')}</tspan>
        </text>
      ))}
    </svg>
  )
}

function limitsOf(tolerance: ReadingRow['face']['tolerance']): number[] {
  switch (tolerance.kind) {
    case 'none':
      return []
    case 'plain':
      return [tolerance.max.valueUm]
    case 'signed':
      return [tolerance.least.valueUm, tolerance.most.valueUm]
  }
}

function extentOf(
  points: readonly TimelineReading[],
  limits: readonly number[],
  shown: (um: number) => number,
) {
  const ends = points.flatMap(({ valueUm, uUm }) => [
    shown(valueUm - (uUm ?? 0)),
    shown(valueUm + (uUm ?? 0)),
  ])
  const most = Math.max(0, ...ends, ...limits.map((limit) => limit * 1.25))
  const least = Math.min(0, ...ends.filter((_, i) => points[i >> 1].valueUm < 0), ...limits)
  const margin = (most - least) * 0.05
  return { least: least < 0 ? least - margin : 0, most: most + margin }
}

function spoken({ valueUm, uUm, at }: TimelineReading, unit: HeightUnit): string {
  const { value, u, unit: symbol } = formatWithUncertainty(valueUm, uUm ?? 0, unit)
  return `${formatSince(at)}: ${value} ${u} ${symbol}`
}

interface ZoneProps {
  limits: readonly number[]
  least: number
  yOf: (value: number) => number
  plotPx: number
}

function Zone({ limits, least, yOf, plotPx }: ZoneProps) {
  if (limits.length === 0) return null
  const [low, high] = limits.length > 1 ? [limits[0], limits[1]] : [Math.max(0, least), limits[0]]
  return (
    <g>
      <rect
        x="0"
        y={yOf(high)}
        width={plotPx}
        height={yOf(low) - yOf(high)}
        fill="var(--zone)"
        fillOpacity="0.42"
      />
      {limits.map((limit) => (
        <path key={limit} d={`M0 ${yOf(limit)}H${plotPx + 8}`} stroke="var(--ink)" strokeWidth="1.4" />
      ))}
    </g>
  )
}

interface AxisProps {
  least: number
  most: number
  yOf: (value: number) => number
  plotPx: number
}

function Axis({ least, most, yOf, plotPx }: AxisProps) {
  const step = niceStep((most - least) / 5)
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
  const first = Math.ceil(least / step - 1e-9)
  const values = Array.from(
    { length: Math.floor(most / step + 1e-9) - first + 1 },
    (_, i) => (first + i) * step,
  )
  return (
    <g>
      <path d={`M0.5 ${topPx}V${heightPx - footPx}`} stroke="var(--graduation)" />
      <path d={`M0 ${Math.round(yOf(0)) + 0.5}H${plotPx}`} stroke="var(--ink)" />
      {values.map((value) => (
        <g key={value}>
          <path d={`M-5 ${Math.round(yOf(value)) + 0.5}h5`} stroke="var(--graduation)" />
          <text x="-10" y={yOf(value) + 4} textAnchor="end">
            {Math.abs(value) < step / 2 ? '0' : formatNumber(value, decimals)}
          </text>
        </g>
      ))}
    </g>
  )
}
