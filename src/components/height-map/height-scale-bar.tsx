import { heightColour } from '@shared/look/height-scale'
import { niceStep } from '@shared/look/rule-scale'
import type { DisplayUnit } from '@shared/schemas/settings'
import { formatNumber, fromUm } from '@shared/units/height'
import { useId } from 'react'
import { useTranslation } from 'react-i18next'
import type { MapRange } from './draw-height-map'

interface Props {
  range: MapRange
  unit: DisplayUnit
  bandUm?: number
  /** At least 96. */
  heightPx?: number
}

const barPx = 14
const topPx = 20
const stops = Array.from({ length: 17 }, (_, i) => i / 16)

/** The bar beside a map: low dark, high light, figures with their sign, the plane as the one named tick. */
export function HeightScale({ range, unit: wanted, bandUm, heightPx = 120 }: Props) {
  const { t } = useTranslation()
  const gradientId = useId()
  const unit = wanted === 'bands' && !bandUm ? 'um' : wanted
  const least = fromUm(range.leastUm, unit, bandUm)
  const most = fromUm(range.mostUm, unit, bandUm)
  const yOf = (value: number) => topPx + ((most - value) / (most - least)) * heightPx
  const ticks = scaleTicks(least, most)
  // The plane's tick is left out, so two neighbours may stand two steps apart: the least distance is the step.
  const steps = ticks.slice(1).map((value, i) => value - ticks[i])
  const decimals = steps.length > 0 ? decimalsOf(Math.min(...steps)) : 1
  const unitWord = t(`common:unitWord.${unit}`)
  return (
    <svg
      role="img"
      aria-label={t('common:map.scale', {
        least: formatNumber(least, decimals + 1, true),
        most: formatNumber(most, decimals + 1, true),
        unit: unitWord,
      })}
      width="92"
      height={heightPx + topPx * 2}
      className="block text-second"
      fill="var(--muted)"
    >
      <defs>
        <linearGradient id={gradientId} x1="0" x2="0" y1="1" y2="0">
          {stops.map((t01) => (
            <stop key={t01} offset={t01} stopColor={heightColour(t01)} />
          ))}
        </linearGradient>
      </defs>
      <text x="0" y={topPx - 7}>
        {t('common:map.high')}
      </text>
      <rect
        x="0.5"
        y={topPx}
        width={barPx}
        height={heightPx}
        fill={`url(#${gradientId})`}
        stroke="var(--ink)"
        strokeWidth="0.75"
      />
      {ticks.map((value) => (
        <g key={value}>
          <path d={`M${barPx + 1} ${yOf(value)}h4`} stroke="var(--graduation)" />
          <text x={barPx + 8} y={yOf(value) + 4}>
            {formatNumber(value, decimals, true)}
          </text>
        </g>
      ))}
      {least <= 0 && most >= 0 && (
        <g>
          <path d={`M${barPx + 1} ${yOf(0)}h7`} stroke="var(--ink)" strokeWidth="1.3" />
          <text x={barPx + 11} y={yOf(0) + 4} fill="var(--ink)">
            {t('common:map.plane')}
          </text>
        </g>
      )}
      <text x="0" y={topPx + heightPx + 15}>
        {t('common:map.low')}
      </text>
    </svg>
  )
}

/** Four to six figures in steps of 1, 2 or 5, without the plane, which has its own tick. */
export function scaleTicks(least: number, most: number): number[] {
  const step = niceStep((most - least) / 6)
  const first = Math.ceil(least / step - 1e-9)
  const last = Math.floor(most / step + 1e-9)
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => (first + i) * step).filter(
    (value) => Math.abs(value) > step / 2,
  )
}

function decimalsOf(step: number): number {
  return Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
}
