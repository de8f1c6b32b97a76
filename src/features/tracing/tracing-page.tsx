import { useQuery } from '@tanstack/react-query'
import { useTranslation } from 'react-i18next'
import { useParams } from 'react-router-dom'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { useEquipment } from '@/lib/queries/equipment'
import { fetchReading } from '@/lib/queries/readings'
import { queryKeys } from '@/lib/query-keys'
import { useDocumentTitle } from '@/lib/use-document-title'
import { whenLastSaveIsThrough } from './saving/use-autosave'
import { TracingTable } from './tracing-table'

/** The tracing table of one reading. */
export default function TracingPage() {
  const { id = '' } = useParams()
  const { t } = useTranslation('table')
  const reading = useReadingAsOpened(id)
  const equipment = useEquipment()
  useDocumentTitle(
    reading.data && `${reading.data.partNumber} · ${reading.data.serial}, ${t('title').toLowerCase()}`,
  )
  if (reading.isError || equipment.isError) {
    return (
      <main data-surface="table" className="min-h-screen px-10 py-8">
        <h1 className="text-headline">{t('cantOpen')}</h1>
        <ErrorState
          error={reading.error ?? equipment.error}
          retry={() => void Promise.all([reading.refetch(), equipment.refetch()])}
        />
      </main>
    )
  }
  if (reading.isPending || equipment.isPending) {
    return (
      <main data-surface="table" className="min-h-screen px-10 py-8">
        <Loading />
      </main>
    )
  }
  return <TracingTable key={id} reading={reading.data} equipment={equipment.data.rows} />
}

/** As it is when the table opens: what changes from then on is on the table, and newer marks elsewhere are told of when saving. */
function useReadingAsOpened(id: string) {
  return useQuery({
    queryKey: [...queryKeys.reading(id), 'table'],
    queryFn: async () => {
      await whenLastSaveIsThrough(id)
      return fetchReading(id)
    },
    staleTime: Number.POSITIVE_INFINITY,
    gcTime: 0,
    refetchOnWindowFocus: false,
    refetchOnReconnect: false,
  })
}
