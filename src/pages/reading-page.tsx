import type { Reading } from '@shared/schemas/readings'
import { useTranslation } from 'react-i18next'
import { Link, useParams } from 'react-router-dom'
import { Button } from '@/components/button'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { IssueButton } from '@/features/certificates/issue-button'
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
import { usePiece } from '@/lib/queries/pieces'
import { useReading } from '@/lib/queries/readings'
import { useMay } from '@/lib/session'
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
      <ReadingHead reading={query.data} more={<OthersActions reading={query.data} />} />
      <ResultSection reading={query.data} />
      {fullResult?.figure && <MapSection figure={fullResult.figure} />}
      {fullResult && <FindingsSection findings={fullResult.findings} />}
      {fullResult?.figure && <BudgetSection figure={fullResult.figure} />}
      <PhotoSection reading={query.data} uploader={mayEdit && <PhotoUploader readingId={id} />} />
      <SetUpSection reading={query.data} change={mayEdit && <ChangeSetUp reading={query.data} />} />
      <ConditionsSection reading={query.data} />
      <EventsSection of="reading" id={id} />
    </>
  )
}

/** The way to the review desk, and the certificate for QA. */
function OthersActions({ reading }: { reading: Reading }) {
  const { t } = useTranslation('readings')
  const mayIssue = useMay('certificate:issue')
  const hasReview = reading.state !== 'draft' || reading.sentBackReason !== null
  const piece = usePiece(mayIssue ? reading.pieceId : null)
  return (
    <>
      {hasReview && (
        <Button asChild>
          <Link to={`/review/${reading.id}`}>{t('page.toReview')}</Link>
        </Button>
      )}
      {piece.data && <IssueButton reading={reading} certificates={piece.data.certificates} />}
    </>
  )
}
