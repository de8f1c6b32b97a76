import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { useNavigate } from 'react-router-dom'
import { Button } from '@/components/button'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { FilterBar } from '@/components/filter-bar'
import { ListSearch } from '@/components/list-search'
import { Loading } from '@/components/loading'
import { PageHead } from '@/components/page-head'
import { Section } from '@/components/section'
import { CustomerList } from '@/features/parts/customer-list'
import { PartDialog } from '@/features/parts/part-dialog'
import { PartHeads, PartLine } from '@/features/parts/part-list'
import { usePartList } from '@/lib/queries/parts'
import { useMay } from '@/lib/session'
import { useDocumentTitle } from '@/lib/use-document-title'
import { useFilterParams } from '@/lib/use-filter-params'

export function PartsPage() {
  const { t } = useTranslation('parts')
  const filters = useFilterParams()
  const search = filters.get('search')
  useDocumentTitle(t('title'))
  return (
    <>
      <PageHead title={t('title')} actions={<AddPart />} />
      <FilterBar>
        {/* A search that a link brings is another search: the field starts anew with it. */}
        <ListSearch label={t('search')} value={search} onChange={(value) => filters.set('search', value)} />
      </FilterBar>
      <div className="desk:pl-margin">
        <PartHeads />
      </div>
      <Section title={t('list.title')} note={t('list.note')}>
        <PartRows search={search} />
      </Section>
      <CustomerList />
    </>
  )
}

function AddPart() {
  const { t } = useTranslation('parts')
  const navigate = useNavigate()
  const [isOpen, setOpen] = useState(false)
  if (!useMay('part:edit')) return null
  return (
    <>
      <Button kind="main" onClick={() => setOpen(true)}>
        {t('part.add')}
      </Button>
      {isOpen && (
        <PartDialog onClose={() => setOpen(false)} onSaved={(part) => navigate(`/parts/${part.id}`)} />
      )}
    </>
  )
}

function PartRows({ search }: { search: string }) {
  const { t } = useTranslation('parts')
  const list = usePartList(search)
  if (list.isPending) return <Loading />
  if (list.isError) return <ErrorState error={list.error} retry={list.refetch} />
  if (list.data.rows.length === 0) return <EmptyState>{t('empty')}</EmptyState>
  return (
    <ul>
      {list.data.rows.map((part) => (
        <PartLine key={part.id} part={part} />
      ))}
    </ul>
  )
}
