import {
  certificateCheckSchema,
  certificateListSchema,
  certificateSchema,
  type IssueCertificate,
  type WithdrawCertificate,
} from '@shared/schemas/certificates'
import { pageDescriptionSchema } from '@shared/schemas/page-description'
import { keepPreviousData, useInfiniteQuery, useQuery } from '@tanstack/react-query'
import { api, queryString } from '../api-client'
import { queryClient } from '../query-client'
import { queryKeys } from '../query-keys'
import { refreshReadings } from './readings'

export interface CertificateFilters {
  state?: string
  search?: string
}

/** Newest first, page after page. */
export function useCertificateList(filters: CertificateFilters) {
  return useInfiniteQuery({
    queryKey: queryKeys.certificateList(filters),
    queryFn: ({ pageParam, signal }) =>
      api('GET', `/certificates${queryString({ ...filters, before: pageParam })}`, certificateListSchema, {
        signal,
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (last) => last.next,
    placeholderData: keepPreviousData,
  })
}

export function useCertificate(id: string) {
  return useQuery({
    queryKey: queryKeys.certificate(id),
    queryFn: () => api('GET', `/certificates/${id}`, certificateSchema),
  })
}

/** The printed page as it was issued: it never changes. */
export function useCertificatePage(id: string) {
  return useQuery({
    queryKey: queryKeys.certificatePage(id),
    queryFn: () => api('GET', `/certificates/${id}/page`, pageDescriptionSchema),
    staleTime: Number.POSITIVE_INFINITY,
  })
}

export async function issueCertificate(readingId: string, input: IssueCertificate) {
  const issued = await api('POST', `/readings/${readingId}/certificate`, certificateSchema, { body: input })
  refreshCertificates()
  return issued
}

export async function withdrawCertificate(id: string, input: WithdrawCertificate) {
  const withdrawn = await api('POST', `/certificates/${id}/withdraw`, certificateSchema, { body: input })
  refreshCertificates()
  return withdrawn
}

/** Asked for by whoever holds a code; a wrong one is no fault to try again. */
export function useCheck(code: string) {
  return useQuery({
    queryKey: queryKeys.check(code),
    queryFn: () => api('GET', `/check/${encodeURIComponent(code)}`, certificateCheckSchema),
    enabled: code !== '',
    retry: false,
    staleTime: 0,
  })
}

function refreshCertificates(): void {
  void queryClient.invalidateQueries({ queryKey: queryKeys.certificates })
  refreshReadings()
}
