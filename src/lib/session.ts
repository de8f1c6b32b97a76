import { may, type Permission } from '@shared/access/permissions'
import { type Me, meSchema } from '@shared/schemas/people'
import { useQuery } from '@tanstack/react-query'
import { api } from './api-client'
import { isApiFailure } from './api-failure'
import { queryKeys } from './query-keys'

/** Who is signed in; null when nobody is. */
async function fetchSession(): Promise<Me | null> {
  try {
    return await api('GET', '/session', meSchema)
  } catch (error) {
    if (isApiFailure(error, 'notSignedIn')) return null
    throw error
  }
}

export function useSession() {
  return useQuery({ queryKey: queryKeys.session, queryFn: fetchSession, staleTime: 60_000 })
}

/** The person signed in. Only below the shell, which shows the sign-in page to anybody else. */
export function useMe(): Me {
  const { data } = useSession()
  if (!data) throw new Error('useMe outside the signed-in pages')
  return data
}

export function useMay(permission: Permission): boolean {
  const { data } = useSession()
  return data ? may(data.roles, permission) : false
}
