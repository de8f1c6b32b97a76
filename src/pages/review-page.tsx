import { useTranslation } from 'react-i18next'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { MoreRows } from '@/components/more-rows'
import { PageHead } from '@/components/page-head'
import { LineHeads } from '@/components/readings/line-heads'
import { ReadingLine } from '@/components/readings/reading-line'
import { Section } from '@/components/section'
import { formatSince } from '@/lib/format-when'
import { useWaitingForReview } from '@/lib/queries/reviews'
import { useDocumentTitle } from '@/lib/use-document-title'

/** What waits for review, oldest first. */
export function ReviewPage() {
  const { t } = useTranslation('review')
  useDocumentTitle(t('title'))
  return (
    <>
      <PageHead title={t('title')}>
        <p className="mt-1 text-muted">{t('lead')}</p>
      </PageHead>
      <div className="desk:pl-margin">
        <LineHeads what={t('heads.what')} when={t('heads.when')} />
      </div>
      <Section title={t('list.title')} note={t('list.note')}>
        <WaitingRows />
      </Section>
    </>
  )
}

function WaitingRows() {
  const { t } = useTranslation('review')
  const list = useWaitingForReview()
  if (list.isPending) return <Loading />
  if (list.isError) return <ErrorState error={list.error} retry={list.refetch} />
  const rows = list.data.pages.flatMap((page) => page.rows)
  if (rows.length === 0) return <EmptyState>{t('list.empty')}</EmptyState>
  return (
    <>
      <ul>
        {rows.map((reading) => (
          <ReadingLine
            key={reading.id}
            reading={reading}
            to={`/review/${reading.id}`}
            what={t('list.what', { number: reading.number, face: reading.faceName })}
            note={t('list.whatNote', { name: reading.takenBy.name, customer: reading.customerName })}
            when={formatSince(reading.updatedAt)}
          />
        ))}
      </ul>
      <MoreRows
        hasMore={list.hasNextPage}
        isLoading={list.isFetchingNextPage}
        load={() => list.fetchNextPage()}
      />
    </>
  )
}
