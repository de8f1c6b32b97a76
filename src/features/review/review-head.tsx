import type { Reading } from '@shared/schemas/readings'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { Button } from '@/components/button'
import { Facts } from '@/components/facts'
import { PageHead } from '@/components/page-head'
import { useFaceWords } from '@/components/readings/face-words'
import { formatMoment } from '@/lib/format-when'
import { useWaitingForReview } from '@/lib/queries/reviews'
import { useSession } from '@/lib/session'

/** What is reviewed, and the way to the next that waits. */
export function ReviewHead({ reading }: { reading: Reading }) {
  const { t } = useTranslation('review')
  const words = useFaceWords()
  const next = useNextWaiting(reading.id)
  const { number, partNumber, serial, partName, face, takenBy, createdAt } = reading
  return (
    <PageHead
      margin={
        <>
          <span className="block">{t('readings:page.taken', { when: formatMoment(createdAt) })}</span>
          {t('readings:page.by', { name: takenBy.name })}
        </>
      }
      title={
        <span className="text-title">
          <span className="font-semibold">
            {partNumber} · {serial}
          </span>{' '}
          <span className="ml-1 font-light">{t('desk.lead', { part: partName, number })}</span>
        </span>
      }
      actions={
        <>
          <Button asChild>
            <Link to={`/readings/${reading.id}`}>{t('desk.toReading')}</Link>
          </Button>
          {next && (
            <Button asChild>
              <Link to={`/review/${next}`}>{t('desk.next')}</Link>
            </Button>
          )}
        </>
      }
    >
      <div className="mt-3">
        <Facts
          facts={[
            { name: t('readings:page.facts.state'), value: t(`common:state.${reading.state}`) },
            { name: t('readings:page.facts.face'), value: `${face.name}, ${words.size(face)}` },
            { name: t('readings:page.facts.tolerance'), value: words.typedTolerance(face.tolerance) },
            { name: t('readings:page.facts.rule'), value: words.rule(face.rule) },
            { name: t('readings:page.facts.customer'), value: reading.customerName },
          ]}
        />
      </div>
    </PageHead>
  )
}

/** The oldest other one that waits for the signed-in reviewer. */
function useNextWaiting(readingId: string): string | undefined {
  const session = useSession()
  const waiting = useWaitingForReview()
  return waiting.data?.pages
    .flatMap(({ rows }) => rows)
    .find(({ id, takenBy }) => id !== readingId && takenBy.id !== session.data?.id)?.id
}
