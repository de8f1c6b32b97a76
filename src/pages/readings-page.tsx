import { verdictSchema } from '@shared/schemas/results'
import { readingStateSchema } from '@shared/workflow/reading-states'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { CheckboxField } from '@/components/fields/checkbox-field'
import { SelectField } from '@/components/fields/select-field'
import { TextField } from '@/components/fields/text-field'
import { FilterBar } from '@/components/filter-bar'
import { ListSearch } from '@/components/list-search'
import { Loading } from '@/components/loading'
import { MoreRows } from '@/components/more-rows'
import { NewReadingLink } from '@/components/new-reading-link'
import { PageHead } from '@/components/page-head'
import { LineHeads } from '@/components/readings/line-heads'
import { PlainReadingLine } from '@/components/readings/plain-reading-line'
import { Section } from '@/components/section'
import { queryString } from '@/lib/api-client'
import { useCustomers } from '@/lib/queries/parts'
import { type ReadingFilters, useReadingList } from '@/lib/queries/readings'
import { useDocumentTitle } from '@/lib/use-document-title'
import { useFilterParams } from '@/lib/use-filter-params'

export function ReadingsPage() {
  const { t } = useTranslation('readings')
  const filters = useFilterParams()
  const total = useReadingList(asked(filters)).data?.pages[0].total
  useDocumentTitle(t('title'))
  return (
    <>
      <PageHead
        title={t('title')}
        actions={
          <>
            <Button asChild>
              <a href={`/api/readings.csv${queryString({ ...asked(filters) })}`} download>
                {t('csv')}
              </a>
            </Button>
            <NewReadingLink />
          </>
        }
      />
      <FilterFields />
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
        <ReadingRows />
      </Section>
    </>
  )
}

function FilterFields() {
  const { t } = useTranslation('readings')
  const filters = useFilterParams()
  const customers = useCustomers()
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
      <SelectField
        label={t('verdictFilter')}
        value={filters.get('verdict')}
        onChange={(value) => filters.set('verdict', value)}
        choices={[
          { value: '', label: t('anyVerdict') },
          ...verdictSchema.options.map((verdict) => ({
            value: verdict,
            label: t(`common:verdict.${verdict}`),
          })),
        ]}
        className="w-44"
      />
      <SelectField
        label={t('customerFilter')}
        value={filters.get('customer')}
        onChange={(value) => filters.set('customer', value)}
        choices={[
          { value: '', label: t('anyCustomer') },
          ...(customers.data?.rows ?? []).map(({ id, name }) => ({ value: id, label: name })),
        ]}
        className="w-56"
      />
      <TextField
        label={t('from')}
        type="date"
        value={filters.get('from')}
        onChange={(event) => filters.set('from', event.target.value)}
        className="w-36"
      />
      <TextField
        label={t('to')}
        type="date"
        value={filters.get('to')}
        onChange={(event) => filters.set('to', event.target.value)}
        className="w-36"
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

/** What the address asks for. */
function asked({ get }: Pick<ReturnType<typeof useFilterParams>, 'get'>): ReadingFilters {
  return {
    search: get('search') || undefined,
    state: get('state') || undefined,
    mine: get('mine') === 'true' ? 'true' : undefined,
    customerId: get('customer') || undefined,
    verdict: get('verdict') || undefined,
    from: get('from') || undefined,
    to: get('to') || undefined,
  }
}

function ReadingRows() {
  const { t } = useTranslation('readings')
  const filters = useFilterParams()
  const list = useReadingList(asked(filters))
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
