import { type Reading, readingSchema } from '@shared/schemas/readings'
import { isEditable } from '@shared/workflow/reading-states'
import { departuresFromFace } from '@shared/workflow/template-departures'
import { useMutation } from '@tanstack/react-query'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { toast } from 'sonner'
import { Button } from '@/components/button'
import { DepartureDialog } from '@/components/departure-dialog'
import { api } from '@/lib/api-client'
import { refreshReadings } from '@/lib/queries/readings'
import { sendReading } from '@/lib/queries/reviews'
import { useMay } from '@/lib/session'

/** What the one who took it may do with a reading as it stands. */
export function ReadingActions({ reading }: { reading: Reading }) {
  const { t } = useTranslation('readings')
  const move = useMove(reading.id)
  const [asking, setAsking] = useState(false)
  const { id, mayEdit, maySend, state, photos, face, marks, pieceId } = reading
  const hasFigure = reading.fullResult?.figure != null && !reading.figureIsStale
  // What has left draft is never changed: a correction is a new reading that names it.
  const mayCorrect = useMay('reading:create') && !isEditable(state)
  const departs = departuresFromFace(face, marks).length > 0
  return (
    <>
      {maySend && hasFigure && (
        <Button disabled={move.isPending} onClick={() => (departs ? setAsking(true) : move.mutate('send'))}>
          {t('page.send')}
        </Button>
      )}
      {mayEdit && state === 'sentBack' && (
        <Button disabled={move.isPending} onClick={() => move.mutate('reopen')}>
          {t('page.reopen')}
        </Button>
      )}
      {asking && (
        <DepartureDialog
          onSubmit={async (reason) => {
            await sendReading(id, reason)
            toast(t('page.sent'))
          }}
          onClose={() => setAsking(false)}
        />
      )}
      {mayCorrect && (
        <Button asChild>
          <Link to={`/readings/new?piece=${pieceId}&face=${face.id}&corrects=${id}`}>
            {t('page.correct')}
          </Link>
        </Button>
      )}
      {mayEdit && photos.length > 0 && (
        <Button asChild kind="main">
          <Link to={`/readings/${id}/table`}>{t('page.toTable')}</Link>
        </Button>
      )}
    </>
  )
}

function useMove(readingId: string) {
  const { t } = useTranslation('readings')
  return useMutation({
    mutationFn: (move: 'send' | 'reopen') => api('POST', `/readings/${readingId}/${move}`, readingSchema),
    onSuccess: (_reading, move) => {
      refreshReadings()
      toast(move === 'send' ? t('page.sent') : t('page.reopened'))
    },
    onError: (error) => toast.error(error.message),
  })
}
