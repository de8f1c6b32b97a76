import { readingListSchema, readingSchema } from '@shared/schemas/readings'
import {
  dispositionSchema,
  type NewDisposition,
  type NewRemark,
  remarkSchema,
  reviewSchema,
} from '@shared/schemas/reviews'
import { useInfiniteQuery, useQuery } from '@tanstack/react-query'
import { z } from 'zod'
import { api, queryString } from '../api-client'
import { queryClient } from '../query-client'
import { queryKeys } from '../query-keys'
import { refreshReadings } from './readings'

const remarkListSchema = z.object({ rows: z.array(remarkSchema) })
const dispositionListSchema = z.object({ rows: z.array(dispositionSchema) })

/** What waits for review, oldest first. */
export function useWaitingForReview() {
  const filters = { state: 'sentForReview', order: 'oldest' }
  return useInfiniteQuery({
    queryKey: queryKeys.readingList(filters),
    queryFn: ({ pageParam, signal }) =>
      api('GET', `/readings${queryString({ ...filters, before: pageParam })}`, readingListSchema, { signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (last) => last.next,
  })
}

export function useReview(readingId: string) {
  return useQuery({
    queryKey: queryKeys.review(readingId),
    queryFn: () => api('GET', `/readings/${readingId}/review`, reviewSchema),
  })
}

export async function addRemark(readingId: string, remark: NewRemark) {
  await api('POST', `/readings/${readingId}/remarks`, remarkListSchema, { body: remark })
  await refreshReview(readingId)
}

export async function answerRemark(readingId: string, remarkId: string, text: string) {
  await api('POST', `/remarks/${remarkId}/answers`, remarkListSchema, { body: { text } })
  await refreshReview(readingId)
}

export async function closeRemark(readingId: string, remarkId: string) {
  await api('POST', `/remarks/${remarkId}/close`, remarkListSchema)
  await refreshReview(readingId)
}

export async function agreeReading(readingId: string) {
  await api('POST', `/readings/${readingId}/agree`, readingSchema)
  await refreshReview(readingId)
}

export async function sendBackReading(readingId: string, reason: string) {
  await api('POST', `/readings/${readingId}/send-back`, readingSchema, { body: { reason } })
  await refreshReview(readingId)
}

export async function setAsideReading(readingId: string, cause: string) {
  await api('POST', `/readings/${readingId}/set-aside`, readingSchema, { body: { cause } })
  await refreshReview(readingId)
}

export async function sendReading(readingId: string, departureReason: string) {
  await api('POST', `/readings/${readingId}/send`, readingSchema, { body: { departureReason } })
  await refreshReview(readingId)
}

export async function decideDisposition(pieceId: string, disposition: NewDisposition) {
  await api('POST', `/pieces/${pieceId}/dispositions`, dispositionListSchema, { body: disposition })
  await queryClient.invalidateQueries({ queryKey: queryKeys.pieces })
}

async function refreshReview(readingId: string): Promise<void> {
  refreshReadings()
  await Promise.all([
    queryClient.invalidateQueries({ queryKey: queryKeys.reading(readingId) }),
    queryClient.invalidateQueries({ queryKey: queryKeys.review(readingId) }),
    queryClient.invalidateQueries({ queryKey: queryKeys.events('reading', readingId) }),
  ])
}
