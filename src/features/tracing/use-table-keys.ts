import { type RefObject, useEffect, useRef } from 'react'
import type { TableStore } from './table-store'
import type { ToolName } from './tools/tool'

/** The key of each tool, shown beside its word. */
export const toolKeys: Record<ToolName, string> = {
  pick: 'V',
  face: 'F',
  leaveOut: 'L',
  copies: 'C',
  edgeBand: 'E',
  pressArrow: 'A',
  datum: 'D',
  band: 'B',
  number: 'N',
  straightedge: 'S',
  profile: 'P',
}

const toolOfKey = new Map(
  Object.entries(toolKeys).map(([tool, key]) => [key.toLowerCase(), tool as ToolName]),
)

const arrows: Readonly<Record<string, readonly [number, number]>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
}

/** Photo pixels that Shift and an arrow key move. */
const longNudgePx = 10

export interface KeyActions {
  zoomBy: (factor: number) => void
  fitPhoto: () => void
  toggleMarks: () => void
}

interface Parts {
  store: TableStore
  areaRef: RefObject<HTMLElement | null>
  isPanning: RefObject<boolean>
  actions: KeyActions
}

/** All keys of the table. Typing in a field or in a dialog is never a command. */
export function useTableKeys({ store, areaRef, isPanning, actions }: Parts): void {
  const latest = useRef(actions)
  latest.current = actions
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.defaultPrevented || isTyping(event)) return
      const atPhoto = event.target === areaRef.current || event.target === document.body
      if (event.key === ' ' && atPhoto) {
        isPanning.current = true
        event.preventDefault()
        return
      }
      if (command(event, store, latest.current, atPhoto)) event.preventDefault()
    }
    const onKeyUp = (event: KeyboardEvent) => {
      if (event.key === ' ') isPanning.current = false
    }
    document.addEventListener('keydown', onKeyDown)
    document.addEventListener('keyup', onKeyUp)
    return () => {
      document.removeEventListener('keydown', onKeyDown)
      document.removeEventListener('keyup', onKeyUp)
    }
  }, [store, areaRef, isPanning])
}

function isTyping({ target }: KeyboardEvent): boolean {
  if (document.querySelector('[role="dialog"], [role="alertdialog"]') !== null) return true
  return target instanceof Element && target.closest('input, textarea, select') !== null
}

/** True when the key was one of the table's. */
function command(event: KeyboardEvent, store: TableStore, actions: KeyActions, atPhoto: boolean): boolean {
  if (event.altKey) return false
  if (event.ctrlKey || event.metaKey) return historyKey(event, store)
  return (
    typedDigit(event, store) ||
    editKey(event, store, atPhoto) ||
    viewKey(event.key, actions) ||
    toolKey(event, store)
  )
}

function historyKey({ key, shiftKey }: KeyboardEvent, store: TableStore): boolean {
  const letter = key.toLowerCase()
  if (letter === 'z') store.dispatch({ type: shiftKey ? 'redo' : 'undo' })
  else if (letter === 'y') store.dispatch({ type: 'redo' })
  else return false
  return true
}

/** With the number tool and a band chosen, digits are its number. */
function typedDigit({ key }: KeyboardEvent, store: TableStore): boolean {
  const { tool, selection } = store.get()
  if (tool.tool !== 'number' || selection?.kind !== 'trace' || !/^[-\d]$/.test(key)) return false
  store.dispatch({ type: 'digit', digit: key })
  return true
}

function editKey({ key, shiftKey }: KeyboardEvent, store: TableStore, atPhoto: boolean): boolean {
  const arrow = arrows[key]
  if (arrow) {
    if (!atPhoto || !store.get().selection) return false
    const step = shiftKey ? longNudgePx : 1
    store.dispatch({ type: 'nudge', dx: arrow[0] * step, dy: arrow[1] * step })
    return true
  }
  switch (key) {
    case 'Enter':
      if (atPhoto) store.dispatch({ type: 'end' })
      return atPhoto
    case 'Escape':
      store.dispatch({ type: 'cancel' })
      return true
    case 'Backspace':
      store.dispatch(isSetting(store) ? { type: 'back' } : { type: 'delete' })
      return true
    case 'Delete':
      store.dispatch({ type: 'delete' })
      return true
    default:
      return false
  }
}

/** While places are set, or a number is typed, Backspace takes the last one back; else it deletes. */
function isSetting(store: TableStore): boolean {
  const { tool } = store.get()
  return tool.phase === 'placing' || tool.tool === 'number'
}

function viewKey(key: string, { zoomBy, fitPhoto, toggleMarks }: KeyActions): boolean {
  switch (key) {
    case '+':
    case '=':
      zoomBy(1.25)
      return true
    case '-':
    case '\u2212':
      zoomBy(0.8)
      return true
    case '0':
      fitPhoto()
      return true
    case 'm':
    case 'M':
      toggleMarks()
      return true
    default:
      return false
  }
}

function toolKey({ key, shiftKey }: KeyboardEvent, store: TableStore): boolean {
  const tool = shiftKey ? undefined : toolOfKey.get(key.toLowerCase())
  if (!tool) return false
  store.dispatch({ type: 'chooseTool', tool })
  return true
}
