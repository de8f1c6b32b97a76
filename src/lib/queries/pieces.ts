import { type NewPiece, pieceSchema } from '@shared/schemas/parts'
import { pieceListSchema, piecePageSchema } from '@shared/schemas/pieces'
import { keepPreviousData, useInfiniteQuery, useQuery } from '@tanstack/react-query'
import { api, queryString } from '../api-client'
import { queryClient } from '../query-client'
import { queryKeys } from '../query-keys'

/** Newest first, page after page, each with its latest reading. */
export function usePieceList(filters: { search?: string; partId?: string }) {
  return useInfiniteQuery({
    queryKey: queryKeys.pieceList(filters),
    queryFn: ({ pageParam, signal }) =>
      api('GET', `/pieces${queryString({ ...filters, before: pageParam })}`, pieceListSchema, { signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (last) => last.next,
    placeholderData: keepPreviousData,
  })
}

export function usePiece(id: string | null) {
  return useQuery({
    queryKey: queryKeys.piece(id ?? ''),
    queryFn: () => api('GET', `/pieces/${id}`, piecePageSchema),
    enabled: id !== null,
  })
}

export async function addPiece(piece: NewPiece) {
  const added = await api('POST', '/pieces', pieceSchema, { body: piece })
  await Promise.all([
    queryClient.invalidateQueries({ queryKey: queryKeys.pieces }),
    queryClient.invalidateQueries({ queryKey: queryKeys.parts }),
  ])
  return added
}
