import { type Reading, readingSchema } from '@shared/schemas/readings'
import { useMutation } from '@tanstack/react-query'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { toast } from 'sonner'
import { Button } from '@/components/button'
import { api } from '@/lib/api-client'
import { refreshReadings } from '@/lib/queries/readings'

/** What the one who took it may do with a reading as it stands. */
export function ReadingActions({ reading }: { reading: Reading }) {
  const { t } = useTranslation('readings')
  const move = useMove(reading.id)
  const { id, mayEdit, maySend, state, photos } = reading
  return (
    <>
      {maySend && (
        <Button disabled={move.isPending} onClick={() => move.mutate('send')}>
          {t('page.send')}
        </Button>
      )}
      {mayEdit && state === 'sentBack' && (
        <Button disabled={move.isPending} onClick={() => move.mutate('reopen')}>
          {t('page.reopen')}
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
