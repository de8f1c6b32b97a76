import type { ReadingRow } from '@shared/schemas/readings'
import { formatHeight } from '@shared/units/height'
import { useTranslation } from 'react-i18next'
import { EmptyState } from '@/components/empty-state'
import { contourStepUm } from '@/components/height-map/map-range'
import { Section } from '@/components/section'
import { useDisplayUnit } from '@/lib/settings'
import { useWidth } from '@/lib/use-width'
import { MapRow, rangeOf, useWholeReadings } from './map-row'
import { Timeline } from './timeline'

/** More maps than this don't stand in one row. */
const mostShown = 6

/** Time line and maps of one face's readings; set aside ones don't count. */
export function FaceHistory({ readings }: { readings: readonly ReadingRow[] }) {
  const { t } = useTranslation('pieces')
  const unit = useDisplayUnit()
  const [ref, widthPx] = useWidth<HTMLDivElement>()
  const read = readings.filter(({ state, result }) => state !== 'setAside' && result?.outcome === 'figure')
  const shown = read.slice(-mostShown)
  const note = t('page.timeline.note', { unit: t(`common:unit.${unit === 'bands' ? 'um' : unit}`) })
  const more =
    read.length > shown.length
      ? `; ${t('page.timeline.latest', { count: shown.length, of: read.length })}`
      : ''
  if (shown.length === 0) {
    return (
      <Section title={t('page.timeline.title')} note={note}>
        <EmptyState>{t('page.timeline.empty')}</EmptyState>
      </Section>
    )
  }
  return (
    <>
      <Section title={t('page.timeline.title')} note={note + more}>
        <div ref={ref} className="pl-9">
          {widthPx > 0 && <Timeline readings={shown} unit={unit} widthPx={widthPx - 36} />}
        </div>
      </Section>
      <Section
        title={t('page.maps.title')}
        note={<MapsNote readings={shown} />}
        className="border-t-0 desk:-mt-4"
      >
        <div className="pl-9">{widthPx > 0 && <MapRow readings={shown} widthPx={widthPx - 36} />}</div>
      </Section>
    </>
  )
}

function MapsNote({ readings }: { readings: readonly ReadingRow[] }) {
  const { t } = useTranslation('pieces')
  const range = rangeOf(useWholeReadings(readings))
  if (!range) return null
  const step = contourStepUm(range)
  return t('page.maps.note', { step: formatHeight(step, 'um', { decimals: step < 0.01 ? 3 : 2 }) })
}
