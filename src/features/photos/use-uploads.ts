import type { Photo } from '@shared/schemas/readings'
import { useEffect, useReducer, useRef } from 'react'
import { useTranslation } from 'react-i18next'
import { isApiFailure } from '@/lib/api-failure'
import { refreshReadings } from '@/lib/queries/readings'
import { queryClient } from '@/lib/query-client'
import { queryKeys } from '@/lib/query-keys'
import { type Sending, sendPhoto } from './send-photo'
import { isUnderway, type Upload, uploadsReducer } from './uploads'

/** So many at once: more would only share the same line. */
const mostAtOnce = 2

/** Several photographs at once, each by itself: one that fails leaves the others alone. */
export function useUploads(readingId: string) {
  const { t } = useTranslation()
  const [uploads, dispatch] = useReducer(uploadsReducer, [])
  const sendings = useRef(new Map<number, Sending>())
  const nextKey = useRef(0)

  const start = (upload: Upload) => {
    const { key } = upload
    dispatch({ type: 'set', key, state: { kind: 'sending', share: 0 } })
    const sending = sendPhoto(readingId, upload.file, upload.role, (share) =>
      dispatch({ type: 'set', key, state: { kind: 'sending', share } }),
    )
    sendings.current.set(key, sending)
    sending.done
      .then((photo) => {
        dispatch({ type: 'set', key, state: { kind: 'kept', photo } })
        void queryClient.invalidateQueries({ queryKey: queryKeys.reading(readingId) })
        refreshReadings()
      })
      .catch((error: unknown) => {
        const sentence = error instanceof Error ? error.message : t('unexpected')
        const cancelled = isApiFailure(error, 'cancelled')
        dispatch({
          type: 'set',
          key,
          state: cancelled ? { kind: 'cancelled' } : { kind: 'failed', sentence },
        })
      })
      .finally(() => sendings.current.delete(key))
  }

  const active = uploads.filter(({ state }) => state.kind === 'sending').length
  const next = uploads.find(({ state }) => state.kind === 'waiting')
  // biome-ignore lint/correctness/useExhaustiveDependencies: one more starts whenever a place is free
  useEffect(() => {
    if (next && active < mostAtOnce && !sendings.current.has(next.key)) start(next)
  }, [next?.key, active])

  useEffect(() => {
    const running = sendings.current
    return () => {
      for (const sending of running.values()) sending.cancel()
    }
  }, [])

  return {
    uploads,
    isBusy: uploads.some(isUnderway),
    add: (files: readonly File[], role: Photo['role']) => {
      const added = files.map((file) => ({
        key: nextKey.current++,
        file,
        role,
        state: { kind: 'waiting' as const },
      }))
      dispatch({ type: 'add', uploads: added })
    },
    cancel: (key: number) => {
      const sending = sendings.current.get(key)
      if (sending) sending.cancel()
      else dispatch({ type: 'set', key, state: { kind: 'cancelled' } })
    },
    retry: (key: number) => dispatch({ type: 'set', key, state: { kind: 'waiting' } }),
  }
}
