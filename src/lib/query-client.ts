import { QueryCache, QueryClient } from '@tanstack/react-query'
import { isApiFailure } from './api-failure'
import { queryKeys } from './query-keys'

const retriesOnNetwork = 2

/** One store of what was loaded. A session that has ended anywhere shows the sign-in page everywhere. */
export const queryClient: QueryClient = new QueryClient({
  queryCache: new QueryCache({
    onError: (error, query) => {
      if (!isApiFailure(error, 'notSignedIn') || query.queryKey[0] === queryKeys.session[0]) return
      queryClient.setQueryData(queryKeys.session, null)
    },
  }),
  defaultOptions: {
    queries: {
      staleTime: 10_000,
      retry: (count, error) => isApiFailure(error, 'unreachable') && count < retriesOnNetwork,
    },
  },
})
