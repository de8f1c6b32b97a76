import { type Reading, readingSchema } from '@shared/schemas/readings'
import { readingResultSchema } from '@shared/schemas/results'
import { useMutation } from '@tanstack/react-query'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { useNavigate } from 'react-router-dom'
import { toast } from 'sonner'
import { api } from '@/lib/api-client'
import { ApiFailure } from '@/lib/api-failure'
import { findingWords } from '@/lib/finding-words'
import { refreshReadings } from '@/lib/queries/readings'

/**
 * Saves, has the server compute the figure, and sends the reading; a refusal is said and nothing is sent. Where the
 * server asks why the marks depart from the face, `asksReason` is true until it is sent with one or given up.
 */
export function useSend(reading: Reading, flush: () => Promise<boolean>) {
  const { t } = useTranslation('table')
  const navigate = useNavigate()
  const [asksReason, setAsksReason] = useState(false)
  const mutation = useMutation({
    mutationFn: async (departureReason: string) => {
      if (!(await flush())) throw new Error(t('send.unsaved'))
      const result = await api('POST', `/readings/${reading.id}/compute`, readingResultSchema)
      if (result.outcome === 'refused') {
        const reason = result.findings.filter(({ severity }) => severity === 'refusal')
        throw new Error(t('send.refused', { reason: reason.map((f) => findingWords(t, f)).join(' ') }))
      }
      return api('POST', `/readings/${reading.id}/send`, readingSchema, { body: { departureReason } })
    },
    onSuccess: () => {
      refreshReadings()
      toast(t('send.sent'))
      navigate(`/readings/${reading.id}`)
    },
    onError: (error, departureReason) => {
      if (error instanceof ApiFailure && error.fields.departureReason && departureReason === '') {
        setAsksReason(true)
      } else if (departureReason === '') toast.error(error.message)
    },
  })
  return {
    isPending: mutation.isPending,
    isSuccess: mutation.isSuccess,
    send: () => mutation.mutate(''),
    asksReason,
    sendWithReason: async (departureReason: string) => {
      await mutation.mutateAsync(departureReason)
    },
    giveUp: () => setAsksReason(false),
  }
}

/** When the table is left with newer marks than the last figure, the server reads them, so that lists show the figure. */
export async function computeAfterLeaving(readingId: string, flush: () => Promise<boolean>): Promise<void> {
  try {
    if (await flush()) await api('POST', `/readings/${readingId}/compute`, readingResultSchema)
  } catch {
    // It is computed again when it is sent; leaving needs no answer.
  } finally {
    refreshReadings()
  }
}
