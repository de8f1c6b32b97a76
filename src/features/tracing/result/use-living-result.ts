import { useEffect, useMemo, useRef, useState } from 'react'
import { marksOf } from '../table-state'
import type { TableStore } from '../table-store'
import { useTable } from '../table-store'
import { type LatestRead, type LatestReader, startLatestReader } from './latest-reader'
import type { Circumstances, MarksRead } from './read-marks'
import ResultWorker from './result-worker?worker'

export interface LivingResult {
  read: MarksRead | null
  /** False while the marks have gone on and the figure is still of those before. */
  isCurrent: boolean
}

/** What the marks on the table come to, read beside the page as they change. */
export function useLivingResult(store: TableStore, circumstances: Circumstances): LivingResult {
  const marks = useTable(marksOf)
  const [latest, setLatest] = useState<LatestRead | null>(null)
  const reader = useRef<LatestReader | null>(null)

  useEffect(() => {
    const started = startLatestReader(new ResultWorker(), setLatest)
    reader.current = started
    return () => {
      started.stop()
      reader.current = null
    }
  }, [])

  useEffect(() => {
    const ask = () => reader.current?.ask(marksOf(store.get()), circumstances)
    ask()
    return store.subscribe(ask)
  }, [store, circumstances])

  const read = latest?.read ?? null
  const isCurrent = latest !== null && latest.marks === marks && latest.circumstances === circumstances
  return useMemo(() => ({ read, isCurrent }), [read, isCurrent])
}
