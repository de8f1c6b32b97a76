import { eventListSchema } from '@shared/schemas/events'
import { homeSchema } from '@shared/schemas/home'
import { type NewReading, readingListSchema, readingSchema } from '@shared/schemas/readings'
import { readingResultSchema } from '@shared/schemas/results'
import { useInfiniteQuery, useQuery } from '@tanstack/react-query'
import { api, queryString } from '../api-client'
import { queryClient } from '../query-client'
import { queryKeys } from '../query-keys'

export function useHome() {
  return useQuery({ queryKey: queryKeys.home, queryFn: () => api('GET', '/home', homeSchema) })
}

export interface ReadingFilters {
  state?: string
  mine?: 'true'
  search?: string
  customerId?: string
  verdict?: string
  from?: string
  to?: string
}

/** Newest first, page after page. */
export function useReadingList(filters: ReadingFilters) {
  return useInfiniteQuery({
    queryKey: queryKeys.readingList(filters),
    queryFn: ({ pageParam, signal }) =>
      api('GET', `/readings${queryString({ ...filters, before: pageParam })}`, readingListSchema, { signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (last) => last.next,
  })
}

export function useReading(id: string) {
  return useQuery({ queryKey: queryKeys.reading(id), queryFn: () => fetchReading(id) })
}

export function fetchReading(id: string) {
  return api('GET', `/readings/${id}`, readingSchema)
}

export async function startReading(reading: NewReading) {
  const started = await api('POST', '/readings', readingSchema, { body: reading })
  queryClient.setQueryData(queryKeys.reading(started.id), started)
  refreshReadings()
  return started
}

/** Changes set-up and conditions; the figure is another one then. */
export async function changeReading(id: string, change: Pick<NewReading, 'setUp' | 'conditions'>) {
  const changed = await api('PATCH', `/readings/${id}`, readingSchema, { body: change })
  queryClient.setQueryData(queryKeys.reading(id), changed)
  refreshReadings()
  return changed
}

/** The server reads the saved marks anew. */
export async function computeReading(id: string) {
  const result = await api('POST', `/readings/${id}/compute`, readingResultSchema)
  await queryClient.invalidateQueries({ queryKey: queryKeys.reading(id) })
  refreshReadings()
  return result
}

/** What shows readings is asked again: the lists, Home, and the piece. */
export function refreshReadings(): void {
  void queryClient.invalidateQueries({ queryKey: queryKeys.home })
  void queryClient.invalidateQueries({ queryKey: queryKeys.readings })
  void queryClient.invalidateQueries({ queryKey: queryKeys.pieces })
}

export function useEvents(subjectType: string, subjectId: string, enabled: boolean) {
  return useQuery({
    queryKey: queryKeys.events(subjectType, subjectId),
    queryFn: () => api('GET', `/events${queryString({ subjectType, subjectId })}`, eventListSchema),
    enabled,
  })
}
