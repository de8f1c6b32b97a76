import {
  customerSchema,
  type FaceTemplate,
  faceSchema,
  lotSchema,
  type NewCustomer,
  type NewFace,
  type NewLot,
  type NewPart,
  partSchema,
} from '@shared/schemas/parts'
import { partListSchema, partPageSchema } from '@shared/schemas/pieces'
import { keepPreviousData, useQuery } from '@tanstack/react-query'
import { z } from 'zod'
import { api, queryString } from '../api-client'
import { queryClient } from '../query-client'
import { queryKeys } from '../query-keys'

export function usePartList(search: string) {
  return useQuery({
    queryKey: queryKeys.partList(search),
    queryFn: ({ signal }) => api('GET', `/parts${queryString({ search })}`, partListSchema, { signal }),
    placeholderData: keepPreviousData,
  })
}

export function usePart(id: string) {
  return useQuery({
    queryKey: queryKeys.part(id),
    queryFn: () => api('GET', `/parts/${id}`, partPageSchema),
    enabled: id !== '',
  })
}

export function useCustomers() {
  return useQuery({
    queryKey: queryKeys.customers,
    queryFn: () => api('GET', '/customers', z.object({ rows: z.array(customerSchema) })),
  })
}

export async function saveCustomer(customer: NewCustomer, id?: string) {
  const saved = await api(id ? 'PATCH' : 'POST', id ? `/customers/${id}` : '/customers', customerSchema, {
    body: customer,
  })
  await Promise.all([queryClient.invalidateQueries({ queryKey: queryKeys.customers }), refreshParts()])
  return saved
}

export async function savePart(part: NewPart, id?: string) {
  const saved = await api(id ? 'PATCH' : 'POST', id ? `/parts/${id}` : '/parts', partSchema, { body: part })
  await refreshParts()
  return saved
}

export async function saveFace(partId: string, face: NewFace, id?: string) {
  const saved = await api(id ? 'PATCH' : 'POST', id ? `/faces/${id}` : `/parts/${partId}/faces`, faceSchema, {
    body: face,
  })
  await refreshParts()
  return saved
}

/** Outline and leave-outs of a photograph, kept with the face for those to come. */
export async function keepTemplate(faceId: string, template: FaceTemplate) {
  await api('PATCH', `/faces/${faceId}`, faceSchema, { body: { template } })
  await Promise.all([refreshParts(), queryClient.invalidateQueries({ queryKey: queryKeys.readings })])
}

export async function addLot(lot: NewLot) {
  const added = await api('POST', '/lots', lotSchema, { body: lot })
  await refreshParts()
  return added
}

async function refreshParts(): Promise<void> {
  await Promise.all([
    queryClient.invalidateQueries({ queryKey: queryKeys.parts }),
    queryClient.invalidateQueries({ queryKey: queryKeys.pieces }),
  ])
}
