import type { Reading, ReadingRow } from '@shared/schemas/readings'
import { formatHeight } from '@shared/units/height'
import { useQueries } from '@tanstack/react-query'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import type { MapRange } from '@/components/height-map/draw-height-map'
import { HeightMap } from '@/components/height-map/height-map'
import { HeightScale } from '@/components/height-map/height-scale-bar'
import { commonRange, contourStepUm } from '@/components/height-map/map-range'
import { Quantity } from '@/components/quantity'
import { ReadingRule } from '@/components/tolerance-rule/reading-rule'
import { formatMoment } from '@/lib/format-when'
import { fetchReading } from '@/lib/queries/readings'
import { queryKeys } from '@/lib/query-keys'
import { useDisplayUnit } from '@/lib/settings'

interface Props {
  readings: readonly ReadingRow[]
  widthPx: number
}

const scalePx = 118

/** The whole readings, since rows carry no map. */
export function useWholeReadings(readings: readonly ReadingRow[]): Reading[] {
  return useQueries({
    queries: readings.map(({ id }) => ({ queryKey: queryKeys.reading(id), queryFn: () => fetchReading(id) })),
    combine: (results) => results.flatMap(({ data }) => (data ? [data] : [])),
  })
}

export function rangeOf(wholes: readonly Reading[]): MapRange | null {
  const maps = wholes.flatMap(({ fullResult }) => (fullResult?.figure ? [fullResult.figure.map] : []))
  return maps.length === 0 ? null : commonRange(maps)
}

/** Maps in the columns of the time line, all on one scale, each with its figure and rule. */
export function MapRow({ readings, widthPx }: Props) {
  const wholes = useWholeReadings(readings)
  const range = rangeOf(wholes)
  const unit = useDisplayUnit()
  const columnPx = Math.floor((widthPx - scalePx) / readings.length)
  const sizePx = Math.min(144, columnPx - 24)
  return (
    <div className="flex pt-3">
      <ul className="flex" style={{ width: widthPx - scalePx }}>
        {readings.map((reading) => (
          <li key={reading.id} className="flex flex-col items-center gap-2" style={{ width: columnPx }}>
            <MapOf whole={wholes.find(({ id }) => id === reading.id)} range={range} sizePx={sizePx} />
            {reading.result?.flatnessUm != null && (
              <Quantity
                valueUm={reading.result.flatnessUm}
                uUm={reading.result.expandedUncertaintyUm}
                bandUm={reading.result.bandUm}
              />
            )}
            <ReadingRule reading={reading} size="tiny" widthPx={Math.min(150, columnPx - 20)} />
            <Link
              to={`/readings/${reading.id}`}
              className="text-center text-axis text-muted underline decoration-hairline underline-offset-3 hover:decoration-ink"
            >
              {formatMoment(reading.createdAt)}
            </Link>
          </li>
        ))}
      </ul>
      {range && <HeightScale range={range} unit={unit === 'bands' ? 'um' : unit} heightPx={96} />}
    </div>
  )
}

interface MapOfProps {
  whole: Reading | undefined
  range: MapRange | null
  sizePx: number
}

function MapOf({ whole, range, sizePx }: MapOfProps) {
  const { t } = useTranslation()
  const figure = whole?.fullResult?.figure
  if (!figure || !range) return <div style={{ width: sizePx, height: sizePx }} />
  const height = (um: number) => formatHeight(um, 'um', { signed: true })
  return (
    <HeightMap
      map={figure.map}
      sizePx={sizePx}
      range={range}
      stepUm={contourStepUm(range)}
      label={t('map.label', { peak: height(figure.peak.heightUm), valley: height(figure.valley.heightUm) })}
    />
  )
}
