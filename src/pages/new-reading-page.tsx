import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { useNavigate, useSearchParams } from 'react-router-dom'
import { Button } from '@/components/button'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { PageHead } from '@/components/page-head'
import { Section } from '@/components/section'
import { StartReadingForm } from '@/features/new-reading/start-reading-form'
import { PhotoUploader } from '@/features/photos/photo-uploader'
import { AddPieceDialog } from '@/features/pieces/add-piece-dialog'
import { useReading } from '@/lib/queries/readings'
import { useMay } from '@/lib/session'
import { useDocumentTitle } from '@/lib/use-document-title'

/** First the set-up; once the reading is started its address is kept, so that a reload stays with the photographs. */
export function NewReadingPage() {
  const { t } = useTranslation('readings')
  const [params, setParams] = useSearchParams()
  const readingId = params.get('reading')
  const corrects = params.get('corrects')
  const mayStart = useMay('reading:create')
  useDocumentTitle(t('new.title'))
  if (!mayStart) return <EmptyState>{t('errors:notAllowed')}</EmptyState>
  if (readingId) return <PhotographsStep readingId={readingId} />
  return (
    <>
      <PageHead title={t('new.title')}>
        {corrects && <p className="mt-1 text-muted">{t('new.corrects')}</p>}
      </PageHead>
      <StartReadingForm
        pieceId={params.get('piece') ?? ''}
        faceId={params.get('face') ?? ''}
        correctsId={corrects}
        onStarted={(reading) => setParams({ reading: reading.id }, { replace: true })}
        renderAddPiece={(onAdded) => <AddPiece onAdded={onAdded} />}
      />
    </>
  )
}

function AddPiece({ onAdded }: { onAdded: (pieceId: string) => void }) {
  const { t } = useTranslation('readings')
  const [isOpen, setOpen] = useState(false)
  return (
    <>
      <Button onClick={() => setOpen(true)}>{t('new.piece.add')}</Button>
      {isOpen && <AddPieceDialog onClose={() => setOpen(false)} onAdded={(piece) => onAdded(piece.id)} />}
    </>
  )
}

function PhotographsStep({ readingId }: { readingId: string }) {
  const { t } = useTranslation('readings')
  const navigate = useNavigate()
  const reading = useReading(readingId)
  const [isBusy, setBusy] = useState(false)
  if (reading.isPending) return <Loading />
  if (reading.isError) return <ErrorState error={reading.error} retry={reading.refetch} />
  const { number, partNumber, serial, partName, photos } = reading.data
  const mayTrace = photos.some(({ role }) => role === 'bands') && !isBusy
  return (
    <>
      <PageHead margin={partName} title={t('new.title')}>
        <p className="mt-2 text-muted">
          {t('new.photos.lead', { number, piece: `${partNumber} · ${serial}` })}
        </p>
      </PageHead>
      <Section title={t('new.photos.title')}>
        <div className="max-w-[52rem] pt-3">
          <PhotoUploader readingId={readingId} onBusyChange={setBusy} />
          <div className="mt-5 flex items-center gap-4">
            <Button kind="main" disabled={!mayTrace} onClick={() => navigate(`/readings/${readingId}/table`)}>
              {t('new.photos.toTable')}
            </Button>
            <Button kind="quiet" onClick={() => navigate(`/readings/${readingId}`)}>
              {t('new.photos.later')}
            </Button>
          </div>
        </div>
      </Section>
    </>
  )
}
