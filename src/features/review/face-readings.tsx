import type { Reading } from '@shared/schemas/readings'
import type { Review } from '@shared/schemas/reviews'
import { useTranslation } from 'react-i18next'
import { ReadingLine } from '@/components/readings/reading-line'
import { Section } from '@/components/section'
import { formatSince } from '@/lib/format-when'

/** Every reading of the face, newest first: nobody reads again until it passes. */
export function FaceReadings({ reading, review }: { reading: Reading; review: Review }) {
  const { t } = useTranslation('review')
  return (
    <Section title={t('face.title')} note={t('face.note')}>
      <ul>
        {review.faceReadings.toReversed().map((row) => {
          const isThis = row.id === reading.id
          const counts = row.counts ? t('face.counts') : t('face.countsNot')
          return (
            <ReadingLine
              key={row.id}
              reading={row}
              to={`/readings/${row.id}`}
              what={
                isThis
                  ? `${t('face.what', { number: row.number })}, ${t('face.this')}`
                  : t('face.what', { number: row.number })
              }
              note={row.setAsideCause ? t('face.setAside', { cause: row.setAsideCause }) : counts}
              when={formatSince(row.createdAt)}
            />
          )
        })}
      </ul>
    </Section>
  )
}
