import { useTranslation } from 'react-i18next'
import { useParams } from 'react-router-dom'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { ChangeSetUp } from '@/features/new-reading/change-set-up'
import { PhotoUploader } from '@/features/photos/photo-uploader'
import { BudgetSection } from '@/features/readings/budget-section'
import { EventsSection } from '@/features/readings/events-section'
import { FindingsSection } from '@/features/readings/findings-section'
import { MapSection } from '@/features/readings/map-section'
import { PhotoSection } from '@/features/readings/photo-section'
import { ReadingHead } from '@/features/readings/reading-head'
import { ResultSection } from '@/features/readings/result-section'
import { ConditionsSection, SetUpSection } from '@/features/readings/set-up-section'
import { useReading } from '@/lib/queries/readings'
import { useDocumentTitle } from '@/lib/use-document-title'

/** One reading, to be read: nothing is marked here, the table is for that. */
export function ReadingPage() {
  const { id = '' } = useParams()
  const { t } = useTranslation('readings')
  const query = useReading(id)
  const reading = query.data
  useDocumentTitle(
    reading && `${reading.partNumber} · ${reading.serial}, ${t('page.title', { number: reading.number })}`,
  )
  if (query.isPending) return <Loading />
  if (query.isError) return <ErrorState error={query.error} retry={query.refetch} />
  const { fullResult, mayEdit } = query.data
  return (
    <>
      <ReadingHead reading={query.data} />
      <ResultSection reading={query.data} />
      {fullResult?.figure && <MapSection figure={fullResult.figure} />}
      {fullResult && <FindingsSection findings={fullResult.findings} />}
      {fullResult?.figure && <BudgetSection figure={fullResult.figure} />}
      <PhotoSection reading={query.data} uploader={mayEdit && <PhotoUploader readingId={id} />} />
      <SetUpSection reading={query.data} change={mayEdit && <ChangeSetUp reading={query.data} />} />
      <ConditionsSection reading={query.data} />
      <EventsSection readingId={id} />
    </>
  )
}
