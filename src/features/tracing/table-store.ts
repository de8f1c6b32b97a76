import { createContext, useContext, useSyncExternalStore } from 'react'
import { stepTable, type TableEvent, type TableState } from './table-state'

export interface TableStore {
  get: () => TableState
  dispatch: (event: TableEvent) => void
  subscribe: (onChange: () => void) => () => void
}

/** Events that change marks; without the right to edit they are not taken. */
const looksOnly: readonly TableEvent['type'][] = ['select', 'setOptions', 'replace', 'pointerLeave', 'cancel']

/** Holds the table's state; parts of the page hear of it and draw only what they look at. */
export function createTableStore(first: TableState, mayEdit = true): TableStore {
  let state = first
  const listeners = new Set<() => void>()
  return {
    get: () => state,
    dispatch: (event) => {
      if (!mayEdit && !isLooking(state, event)) return
      const next = stepTable(state, event, newMarkId)
      if (next === state) return
      state = next
      for (const listener of listeners) listener()
    },
    subscribe: (onChange) => {
      listeners.add(onChange)
      return () => listeners.delete(onChange)
    },
  }
}

/** Selecting and looking along a line change no marks. */
function isLooking(state: TableState, event: TableEvent): boolean {
  if (looksOnly.includes(event.type)) return true
  if (event.type === 'chooseTool') return event.tool === 'pick' || event.tool === 'profile'
  if (event.type === 'pointerDown') return state.tool.tool === 'profile' || !event.shift
  if (event.type === 'pointerUp') return true
  // What is pressed may not be dragged; where the pointer is may be shown.
  return event.type === 'pointerMove' && (state.tool.tool === 'profile' || state.tool.phase === 'idle')
}

/** Not crypto.randomUUID, which browsers give only on encrypted pages. */
export function newMarkId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(9))
  return Array.from(bytes, (byte) => byte.toString(36).padStart(2, '0')).join('')
}

const TableContext = createContext<TableStore | null>(null)
export const TableProvider = TableContext.Provider

export function useTableStore(): TableStore {
  const store = useContext(TableContext)
  if (!store) throw new Error('useTableStore outside the tracing table')
  return store
}

/** One part of the table's state. Selectors return what the state holds, or plain values, never new objects. */
export function useTable<T>(select: (state: TableState) => T): T {
  const store = useTableStore()
  return useSyncExternalStore(store.subscribe, () => select(store.get()))
}
