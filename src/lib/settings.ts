import { type DisplayUnit, settingsSchema } from '@shared/schemas/settings'
import { useQuery } from '@tanstack/react-query'
import { api } from './api-client'
import { queryKeys } from './query-keys'

export function useSettings() {
  return useQuery({
    queryKey: queryKeys.settings,
    queryFn: () => api('GET', '/settings', settingsSchema),
    staleTime: 60_000,
  })
}

/** The unit that this shop reads heights in. */
export function useDisplayUnit(): DisplayUnit {
  return useSettings().data?.displayUnit ?? 'um'
}
