import { type NewPerson, type PersonChange, personSchema } from '@shared/schemas/people'
import { useQuery } from '@tanstack/react-query'
import { z } from 'zod'
import { api } from '../api-client'
import { queryClient } from '../query-client'
import { queryKeys } from '../query-keys'

export function usePeople() {
  return useQuery({
    queryKey: queryKeys.people,
    queryFn: () => api('GET', '/people', z.object({ rows: z.array(personSchema) })),
  })
}

export async function addPerson(person: NewPerson) {
  await api('POST', '/people', personSchema, { body: person })
  await queryClient.invalidateQueries({ queryKey: queryKeys.people })
}

/** One's own roles may have changed with it, so the session is asked again. */
export async function changePerson(id: string, change: PersonChange) {
  await api('PATCH', `/people/${id}`, personSchema, { body: change })
  await Promise.all([
    queryClient.invalidateQueries({ queryKey: queryKeys.people }),
    queryClient.invalidateQueries({ queryKey: queryKeys.session }),
  ])
}
