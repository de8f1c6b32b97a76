import type { Marks } from '@shared/schemas/marks'
import type { Reading } from '@shared/schemas/readings'
import { useCallback, useEffect, useRef, useState } from 'react'
import { fetchReading } from '@/lib/queries/readings'
import { marksToKeep } from '../table-state'
import type { TableStore } from '../table-store'
import { type Autosave, type SaveState, type StaleSave, startAutosave } from './autosave'
import { copyInBrowser } from './copy-in-browser'
import { sendMarks } from './send-marks'

/** Somebody saved meanwhile. `theirs` is there once it was asked for and is on the table. */
export interface Conflict {
  stale: StaleSave
  mine: Marks
  theirs: Reading | null
}

export interface Saving {
  state: SaveState
  conflict: Conflict | null
  /** Saves what is waiting; true when nothing is left. */
  flush: () => Promise<boolean>
  version: () => number
  /** Puts theirs on the table, to be looked at. */
  showTheirs: () => Promise<void>
  keepTheirs: () => void
  keepMine: () => void
}

/** Last saves of tables that were left, begun once it is sure that the page is gone. */
const leaving = new Map<string, { timer: ReturnType<typeof setTimeout>; through: Promise<unknown> }>()

function leave(readingId: string, lastSave: () => Promise<unknown>): void {
  let timer: ReturnType<typeof setTimeout> | undefined
  const through = new Promise((resolve) => {
    timer = setTimeout(() => resolve(lastSave()), 0)
  })
  if (timer) leaving.set(readingId, { timer, through })
}

function stay(readingId: string): void {
  clearTimeout(leaving.get(readingId)?.timer)
  leaving.delete(readingId)
}

/** Resolves once the last save of an earlier visit is through, so that a new one starts from what it saved. */
export async function whenLastSaveIsThrough(readingId: string): Promise<void> {
  await leaving.get(readingId)?.through
  leaving.delete(readingId)
}

/** Saves the marks on the table as one works. */
export function useAutosave(
  store: TableStore,
  reading: Reading,
  overtaken: { mine: Marks; stale: StaleSave } | null,
): Saving {
  const [state, setState] = useState<SaveState>(
    overtaken ? { kind: 'stale', stale: overtaken.stale } : { kind: 'saved', savedAt: null },
  )
  const [conflict, setConflict] = useState<Conflict | null>(overtaken && { ...overtaken, theirs: null })
  const autosave = useRef<Autosave | null>(null)
  const seen = useRef(reading.marks)
  const halted = useRef(conflict !== null)
  halted.current = conflict !== null

  useEffect(() => {
    if (!reading.mayEdit) return
    stay(reading.id)
    // Kept when the page is put up a second time in a row, as React does while developing.
    autosave.current ??= startAutosave({
      version: reading.marksVersion,
      send: (save) => sendMarks(reading.id, save),
      copyHere: copyInBrowser(reading.id),
      onState: (next) => {
        setState(next)
        if (next.kind !== 'stale') return
        // At once, so that nothing put on the table from now on is taken for mine.
        halted.current = true
        setConflict({ stale: next.stale, mine: marksToKeep(store.get()), theirs: null })
      },
    })
    const saving = autosave.current
    const look = () => {
      const marks = marksToKeep(store.get())
      if (marks === seen.current) return
      seen.current = marks
      if (!halted.current) saving.changed(marks)
    }
    look()
    const unsubscribe = store.subscribe(look)
    const whenHidden = () => {
      if (document.visibilityState !== 'hidden') return
      store.dispatch({ type: 'settle' })
      void saving.flush()
    }
    document.addEventListener('visibilitychange', whenHidden)
    return () => {
      store.dispatch({ type: 'settle' })
      unsubscribe()
      document.removeEventListener('visibilitychange', whenHidden)
      leave(reading.id, () => saving.flush().finally(saving.stop))
    }
  }, [store, reading])

  const flush = useCallback(async () => {
    store.dispatch({ type: 'settle' })
    return (await autosave.current?.flush()) ?? true
  }, [store])

  const showTheirs = async () => {
    if (!conflict) return
    const theirs = await fetchReading(reading.id)
    setConflict({ ...conflict, theirs })
    store.dispatch({ type: 'edit', marks: theirs.marks })
  }
  /** Each choice is a step on the table, so that the other can be had back by undo. */
  const settleWith = (marks: 'mine' | 'theirs') => {
    if (!conflict?.theirs) return
    const { theirs, mine, stale } = conflict
    if (marks === 'mine') store.dispatch({ type: 'edit', marks: mine })
    halted.current = false
    setConflict(null)
    autosave.current?.resolve(theirs.marksVersion, stale.savedAt, marks === 'mine' ? mine : null)
  }
  return {
    state,
    conflict,
    flush,
    version: () => autosave.current?.version() ?? reading.marksVersion,
    showTheirs,
    keepTheirs: () => settleWith('theirs'),
    keepMine: () => settleWith('mine'),
  }
}
