import { certificateStateSchema } from '@shared/schemas/certificates'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { CertificateLine, certificateColumns } from '@/components/certificates/certificate-line'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { SelectField } from '@/components/fields/select-field'
import { FilterBar } from '@/components/filter-bar'
import { ListSearch } from '@/components/list-search'
import { Loading } from '@/components/loading'
import { MoreRows } from '@/components/more-rows'
import { PageHead } from '@/components/page-head'
import { Section } from '@/components/section'
import { queryString } from '@/lib/api-client'
import { useCertificateList } from '@/lib/queries/certificates'
import { useDocumentTitle } from '@/lib/use-document-title'
import { useFilterParams } from '@/lib/use-filter-params'
import { useHeights } from '@/lib/use-heights'

/** Every certificate that was ever issued. */
export function CertificatesPage() {
  const { t } = useTranslation('certificate')
  const params = useFilterParams()
  const filters = { state: params.get('state') || undefined, search: params.get('search') || undefined }
  const list = useCertificateList(filters)
  useDocumentTitle(t('title'))
  const total = list.data?.pages[0].total
  return (
    <>
      <PageHead
        title={t('title')}
        actions={
          <Button asChild>
            <a href={`/api/certificates.csv${queryString(filters)}`} download>
              {t('list.csv')}
            </a>
          </Button>
        }
      />
      <FilterBar>
        <ListSearch
          label={t('search')}
          value={params.get('search')}
          onChange={(value) => params.set('search', value)}
        />
        <SelectField
          label={t('stateFilter')}
          value={params.get('state')}
          onChange={(value) => params.set('state', value)}
          choices={[
            { value: '', label: t('anyState') },
            ...certificateStateSchema.options.map((state) => ({ value: state, label: t(`state.${state}`) })),
          ]}
          className="w-44"
        />
      </FilterBar>
      <div className="desk:pl-margin">
        <Heads />
      </div>
      <Section
        title={t('list.title')}
        note={
          <>
            {t('list.note')}
            {total !== undefined && <span className="block">{t('list.count', { count: total })}</span>}
          </>
        }
      >
        {list.isPending && <Loading />}
        {list.isError && <ErrorState error={list.error} retry={list.refetch} />}
        {total === 0 && <EmptyState>{t('list.empty')}</EmptyState>}
        <ul>
          {list.data?.pages
            .flatMap(({ rows }) => rows)
            .map((certificate) => (
              <CertificateLine key={certificate.id} certificate={certificate} />
            ))}
        </ul>
        <MoreRows
          hasMore={list.hasNextPage}
          isLoading={list.isFetchingNextPage}
          load={() => list.fetchNextPage()}
        />
      </Section>
    </>
  )
}

function Heads() {
  const { t } = useTranslation('certificate')
  const { unit } = useHeights(null)
  const flatness = t('common:heads.flatness', { unit: t(`common:unit.${unit}`) })
  return (
    <div aria-hidden="true" className={`${certificateColumns} pb-2 text-axis text-muted`}>
      <span>{t('heads.number')}</span>
      <span>{t('heads.piece')}</span>
      <span>{t('heads.customer')}</span>
      <span className="text-right">{flatness}</span>
      <span>{t('common:heads.verdict')}</span>
      <span>{t('heads.state')}</span>
    </div>
  )
}
