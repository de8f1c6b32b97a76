import type { Figure } from '@shared/schemas/results'
import { useMemo } from 'react'
import { useTranslation } from 'react-i18next'
import { HeightMap } from '@/components/height-map/height-map'
import { HeightScale } from '@/components/height-map/height-scale-bar'
import { commonRange } from '@/components/height-map/map-range'
import { ProfileChart } from '@/components/profile-chart'
import { useHeights } from '@/lib/use-heights'
import { useWidth } from '@/lib/use-width'
import { heightsAlong, type LineMm, lengthOf, middleLine } from '../result/profile-along'

interface Props {
  figure: Figure
  /** Drawn on the photograph; null is the middle from left to right. */
  line: LineMm | null
  sizePx: number
}

/** The height map with its scale, and the profile along A–B. */
export function FigureMap({ figure, line, sizePx }: Props) {
  const { t } = useTranslation('table')
  const heights = useHeights(figure.bandUm)
  const range = useMemo(() => commonRange([figure.map]), [figure.map])
  const shownLine = line ?? middleLine(figure.map)
  const [ref, widthPx] = useWidth<HTMLDivElement>()
  const profile = useMemo(() => heightsAlong(figure.map, shownLine), [figure.map, shownLine])
  return (
    <div ref={ref}>
      <div className="flex items-center justify-between gap-2 px-2">
        <div className="relative">
          <HeightMap
            map={figure.map}
            peak={figure.peak}
            valley={figure.valley}
            sizePx={sizePx}
            range={range}
            label={t('result.mapLabel', {
              peak: heights.signed(figure.peak.heightUm),
              valley: heights.signed(figure.valley.heightUm),
            })}
          />
          <LineOnMap map={figure.map} line={shownLine} sizePx={sizePx} />
        </div>
        <HeightScale range={range} unit={heights.unit} bandUm={heights.band} heightPx={sizePx - 28} />
      </div>
      {widthPx > 0 && (
        <div className="mt-3">
          <ProfileChart
            lines={[{ tone: 'after', heightsUm: profile, uUm: figure.expandedUncertaintyUm }]}
            lengthMm={lengthOf(shownLine)}
            unit={heights.unit}
            bandUm={heights.band}
            widthPx={widthPx}
            heightPx={Math.round(Math.min(150, widthPx * 0.4))}
            label={t('result.profileLabel')}
          />
          <p aria-hidden="true" className="flex justify-between pr-1 pl-12 font-semibold text-axis">
            <span>A</span>
            <span>B</span>
          </p>
        </div>
      )}
      {figure.supportedShare < 0.995 && <p className="mt-1 text-axis text-muted">{t('result.hatched')}</p>}
    </div>
  )
}

function LineOnMap({ map, line, sizePx }: { map: Figure['map']; line: LineMm; sizePx: number }) {
  const cellPx = sizePx / Math.max(map.columns, map.rows)
  const toPx = ([xMm, yMm]: LineMm['from']) => ({
    x: ((xMm - map.x0Mm) / map.stepMm + 0.5) * cellPx,
    y: ((yMm - map.y0Mm) / map.stepMm + 0.5) * cellPx,
  })
  const [a, b] = [toPx(line.from), toPx(line.to)]
  const length = Math.hypot(b.x - a.x, b.y - a.y) || 1
  const [ux, uy] = [(b.x - a.x) / length, (b.y - a.y) / length]
  return (
    <svg aria-hidden="true" className="pointer-events-none absolute inset-0 size-full overflow-visible">
      <path d={`M${a.x} ${a.y}L${b.x} ${b.y}`} stroke="#fff" strokeWidth="1.1" strokeDasharray="4 3" />
      <g className="text-axis font-semibold" fill="var(--ink)" textAnchor="middle">
        <text x={a.x - 9 * ux} y={a.y - 9 * uy + 4}>
          A
        </text>
        <text x={b.x + 9 * ux} y={b.y + 9 * uy + 4}>
          B
        </text>
      </g>
    </svg>
  )
}
