import { readingStateSchema } from '@shared/workflow/reading-states'
import { useTranslation } from 'react-i18next'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { CheckboxField } from '@/components/fields/checkbox-field'
import { SelectField } from '@/components/fields/select-field'
import { FilterBar } from '@/components/filter-bar'
import { ListSearch } from '@/components/list-search'
import { Loading } from '@/components/loading'
import { MoreRows } from '@/components/more-rows'
import { NewReadingLink } from '@/components/new-reading-link'
import { PageHead } from '@/components/page-head'
import { LineHeads } from '@/components/readings/line-heads'
import { PlainReadingLine } from '@/components/readings/plain-reading-line'
import { Section } from '@/components/section'
import { useReadingList } from '@/lib/queries/readings'
import { useDocumentTitle } from '@/lib/use-document-title'
import { useFilterParams } from '@/lib/use-filter-params'

export function ReadingsPage() {
  const { t } = useTranslation('readings')
  useDocumentTitle(t('title'))
  return (
    <>
      <PageHead title={t('title')} actions={<NewReadingLink />} />
      <ReadingFilters />
      <div className="desk:pl-margin">
        <LineHeads what={t('heads.what')} when={t('heads.when')} />
      </div>
      <Section title={t('list.title')} note={t('list.note')}>
        <ReadingRows />
      </Section>
    </>
  )
}

function ReadingFilters() {
  const { t } = useTranslation('readings')
  const filters = useFilterParams()
  const states = readingStateSchema.options.map((state) => ({
    value: state,
    label: t(`common:state.${state}`),
  }))
  return (
    <FilterBar>
      <ListSearch
        label={t('search')}
        value={filters.get('search')}
        onChange={(value) => filters.set('search', value)}
      />
      <SelectField
        label={t('stateFilter')}
        value={filters.get('state')}
        onChange={(value) => filters.set('state', value)}
        choices={[{ value: '', label: t('anyState') }, ...states]}
        className="w-44"
      />
      <CheckboxField
        label={t('mine')}
        checked={filters.get('mine') === 'true'}
        onChange={(checked) => filters.set('mine', checked ? 'true' : '')}
        className="pb-2"
      />
    </FilterBar>
  )
}

function ReadingRows() {
  const { t } = useTranslation('readings')
  const filters = useFilterParams()
  const list = useReadingList({
    search: filters.get('search') || undefined,
    state: filters.get('state') || undefined,
    mine: filters.get('mine') === 'true' ? 'true' : undefined,
  })
  if (list.isPending) return <Loading />
  if (list.isError) return <ErrorState error={list.error} retry={list.refetch} />
  const rows = list.data.pages.flatMap((page) => page.rows)
  if (rows.length === 0) return <EmptyState>{t('empty')}</EmptyState>
  return (
    <>
      <ul>
        {rows.map((reading) => (
          <PlainReadingLine key={reading.id} reading={reading} />
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
