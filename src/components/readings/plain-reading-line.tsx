import type { ReadingRow } from '@shared/schemas/readings'
import { useTranslation } from 'react-i18next'
import { formatSince } from '@/lib/format-when'
import { ReadingLine } from './reading-line'

/** A reading in a list of readings: which, of what, by whom. */
export function PlainReadingLine({ reading }: { reading: ReadingRow }) {
  const { t } = useTranslation('readings')
  return (
    <ReadingLine
      reading={reading}
      to={`/readings/${reading.id}`}
      what={t('line.what', { number: reading.number, face: reading.faceName })}
      note={t('line.note', { name: reading.takenBy.name, customer: reading.customerName })}
      when={formatSince(reading.createdAt)}
    />
  )
}
