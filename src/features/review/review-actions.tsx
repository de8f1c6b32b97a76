import type { Reading } from '@shared/schemas/readings'
import type { Review } from '@shared/schemas/reviews'
import { mayMove } from '@shared/workflow/reading-states'
import { useMutation } from '@tanstack/react-query'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { Button } from '@/components/button'
import { ReasonDialog } from '@/components/reason-dialog'
import { formatMoment } from '@/lib/format-when'
import { agreeReading, sendBackReading, setAsideReading } from '@/lib/queries/reviews'

/** Agree, send back or set aside; why one can't be done is said in its place. */
export function ReviewActions({ reading, review }: { reading: Reading; review: Review }) {
  const { t } = useTranslation('review')
  const [asking, setAsking] = useState<'sendBack' | 'setAside' | null>(null)
  const { id, state, takenBy } = reading
  const { refusal, mayReview, maySetAside, agreed } = review
  const agree = useMutation({
    mutationFn: () => agreeReading(id),
    onSuccess: () => toast(t('actions.agreed')),
    onError: (error) => toast.error(error.message),
  })
  const maySendBack = mayReview && refusal !== 'ownReading' && mayMove(state, 'sentBack')
  return (
    <div className="flex flex-col gap-3">
      {agreed && <p>{t('actions.agreedBy', { name: agreed.by.name, when: formatMoment(agreed.at) })}</p>}
      {mayReview && refusal && (refusal !== 'illegalMove' || !agreed) && (
        <p className="text-muted text-second">{t(`actions.refusal.${refusal}`)}</p>
      )}
      <div className="flex flex-wrap gap-2.5">
        {mayReview && refusal !== 'illegalMove' && (
          <Button kind="main" disabled={refusal !== null || agree.isPending} onClick={() => agree.mutate()}>
            {t('actions.agree')}
          </Button>
        )}
        {maySendBack && <Button onClick={() => setAsking('sendBack')}>{t('actions.sendBack')}</Button>}
        {maySetAside && (
          <Button kind="grave" onClick={() => setAsking('setAside')}>
            {t('actions.setAside')}
          </Button>
        )}
      </div>
      {asking === 'sendBack' && (
        <ReasonDialog
          title={t('reasonDialog.sendBack')}
          note={t('reasonDialog.sendBackNote', { name: takenBy.name })}
          label={t('reasonDialog.reason')}
          field="reason"
          submitLabel={t('actions.sendBack')}
          onSubmit={async (reason) => {
            await sendBackReading(id, reason)
            toast(t('actions.sentBack'))
          }}
          onClose={() => setAsking(null)}
        />
      )}
      {asking === 'setAside' && (
        <ReasonDialog
          title={t('reasonDialog.setAside')}
          note={t('reasonDialog.setAsideNote')}
          label={t('reasonDialog.cause')}
          field="cause"
          submitLabel={t('actions.setAside')}
          onSubmit={async (cause) => {
            await setAsideReading(id, cause)
            toast(t('actions.setAsideDone'))
          }}
          onClose={() => setAsking(null)}
        />
      )}
    </div>
  )
}
