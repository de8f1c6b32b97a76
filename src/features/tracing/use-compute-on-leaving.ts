import type { Reading } from '@shared/schemas/readings'
import { useEffect, useRef } from 'react'
import { marksToKeep } from './table-state'
import { useTableStore } from './table-store'
import { computeAfterLeaving } from './use-send'

/** On leaving with changed marks that give a figure, the server reads them, so that lists show it. */
export function useComputeOnLeaving(
  reading: Reading,
  flush: () => Promise<boolean>,
  hasFigure: boolean,
  isSent: boolean,
): void {
  const store = useTableStore()
  const latest = useRef({ flush, hasFigure, isSent })
  latest.current = { flush, hasFigure, isSent }
  useEffect(
    () => () => {
      const { flush, hasFigure, isSent } = latest.current
      const isChanged = marksToKeep(store.get()) !== reading.marks
      if (reading.mayEdit && isChanged && hasFigure && !isSent) void computeAfterLeaving(reading.id, flush)
    },
    [reading, store],
  )
}
