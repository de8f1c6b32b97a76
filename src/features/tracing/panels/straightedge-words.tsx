import { useTranslation } from 'react-i18next'
import { useHeights } from '@/lib/use-heights'
import { readStraightedge } from '../geometry/straightedge-reading'
import { marksOf } from '../table-state'
import { useTable } from '../table-store'

/** Bow ÷ spacing × band height, as one would with a ruler on paper. */
export function StraightedgeWords({ bandUm }: { bandUm: number | null }) {
  const { t } = useTranslation('table')
  const edge = useTable((table) => marksOf(table).straightedge)
  const heights = useHeights(bandUm)
  const read = edge && readStraightedge(edge)
  if (!read || bandUm === null) return null
  return (
    <section className="text-second" data-testid="straightedge">
      <p className="flex justify-between">
        <span className="font-semibold text-muted">{t('straightedge.title')}</span>
        <span>{t('straightedge.reading', { height: heights.plain(read.bands * bandUm) })}</span>
      </p>
      <p className="text-axis text-muted">
        {t('straightedge.how', {
          bow: read.bowPx.toFixed(1),
          spacing: read.spacingPx.toFixed(1),
          band: heights.plain(bandUm),
        })}
      </p>
    </section>
  )
}
