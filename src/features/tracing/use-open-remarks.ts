import type { Reading } from '@shared/schemas/readings'
import { useMemo } from 'react'
import { useReview } from '@/lib/queries/reviews'
import type { Problem } from './problems'

const none: readonly Problem[] = []

/** Remarks that a reviewer pinned and that are still open: shown where they are, beside the mistakes. */
export function useOpenRemarks({ id }: Pick<Reading, 'id'>): readonly Problem[] {
  const { data } = useReview(id)
  return useMemo(() => {
    const pinned = (data?.remarks ?? []).flatMap(({ text, place, author, closed }): Problem[] =>
      place && !closed
        ? [
            {
              code: 'reviewRemark',
              params: { text, name: author.name },
              place: [place.x, place.y],
              traceIds: [],
            },
          ]
        : [],
    )
    return pinned.length > 0 ? pinned : none
  }, [data])
}
