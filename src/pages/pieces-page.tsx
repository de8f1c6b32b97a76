import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { FilterBar } from '@/components/filter-bar'
import { ListSearch } from '@/components/list-search'
import { Loading } from '@/components/loading'
import { MoreRows } from '@/components/more-rows'
import { NewReadingLink } from '@/components/new-reading-link'
import { PageHead } from '@/components/page-head'
import { LineHeads } from '@/components/readings/line-heads'
import { PieceLine } from '@/components/readings/piece-line'
import { Section } from '@/components/section'
import { queryString } from '@/lib/api-client'
import { usePieceList } from '@/lib/queries/pieces'
import { useDocumentTitle } from '@/lib/use-document-title'
import { useFilterParams } from '@/lib/use-filter-params'

export function PiecesPage() {
  const { t } = useTranslation('pieces')
  const filters = useFilterParams()
  const search = filters.get('search') || undefined
  const total = usePieceList({ search }).data?.pages[0].total
  useDocumentTitle(t('title'))
  return (
    <>
      <PageHead
        title={t('title')}
        actions={
          <>
            <Button asChild>
              <a href={`/api/pieces.csv${queryString({ search })}`} download>
                {t('csv')}
              </a>
            </Button>
            <NewReadingLink />
          </>
        }
      />
      <FilterBar>
        <ListSearch
          label={t('search')}
          value={filters.get('search')}
          onChange={(value) => filters.set('search', value)}
        />
      </FilterBar>
      <div className="desk:pl-margin">
        <LineHeads what={t('heads.what')} when={t('heads.when')} />
      </div>
      <Section
        title={t('list.title')}
        note={
          <>
            {t('list.note')}
            {total !== undefined && <span className="block">{t('count', { count: total })}</span>}
          </>
        }
      >
        <PieceRows search={filters.get('search')} />
      </Section>
    </>
  )
}

function PieceRows({ search }: { search: string }) {
  const { t } = useTranslation('pieces')
  const list = usePieceList({ search: search || undefined })
  if (list.isPending) return <Loading />
  if (list.isError) return <ErrorState error={list.error} retry={list.refetch} />
  const rows = list.data.pages.flatMap((page) => page.rows)
  if (rows.length === 0) return <EmptyState>{t('empty')}</EmptyState>
  return (
    <>
      <ul>
        {rows.map((piece) => (
          <PieceLine key={piece.id} piece={piece} />
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
