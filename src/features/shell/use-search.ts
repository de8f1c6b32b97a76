import { foundSchema } from '@shared/schemas/search'
import { keepPreviousData, useQuery } from '@tanstack/react-query'
import { api, queryString } from '@/lib/api-client'
import { queryKeys } from '@/lib/query-keys'
import { useSettled } from '@/lib/use-settled'

const pauseMs = 150

/** Asks once typing pauses; nothing is asked for an empty field. */
export function useSearch(text: string) {
  const q = useSettled(text.trim(), pauseMs)
  return useQuery({
    queryKey: queryKeys.search(q),
    queryFn: ({ signal }) => api('GET', `/search${queryString({ q })}`, foundSchema, { signal }),
    enabled: q !== '',
    placeholderData: keepPreviousData,
  })
}
