import type { Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { removeSelected } from './geometry/edit-marks'
import { handlesOf, moveSelected } from './geometry/handles'
import {
  cancelGesture,
  canRedo,
  canUndo,
  change,
  closeGesture,
  during,
  type History,
  redo,
  settledOf,
  startHistory,
  undo,
} from './marks-history'
import { idleTool, stepTool, type ToolState } from './tools/step-tool'
import type { PointerAt, ProfileLine, Selection, Step, ToolEvent, ToolName, ToolOptions } from './tools/tool'

/** Everything at the table that a hand changes, as plain data. */
export interface TableState {
  history: History<Marks>
  tool: ToolState
  selection: Selection | null
  options: ToolOptions
  /** null is the line from left to right through the middle. */
  profile: ProfileLine | null
  /** Where the pointer is, for the magnifier and the status line. */
  pointer: PointPx | null
}

export type TableEvent =
  | ToolEvent
  | { type: 'chooseTool'; tool: ToolName }
  /** Escape: the whole gesture, else the selection. */
  | { type: 'cancel' }
  | { type: 'undo' }
  | { type: 'redo' }
  | { type: 'delete' }
  | { type: 'nudge'; dx: number; dy: number }
  | { type: 'select'; selection: Selection | null }
  /** A change from a field beside the photograph. */
  | { type: 'edit'; marks: Marks }
  | { type: 'setOptions'; options: Partial<ToolOptions> }
  /** Marks from elsewhere: what is here is forgotten. */
  | { type: 'replace'; marks: Marks }
  /** Ends what can be ended and drops the rest, as when leaving. */
  | { type: 'settle' }
  | { type: 'pointerLeave' }

export function startTable(marks: Marks, options: ToolOptions, tool: ToolName = 'pick'): TableState {
  return {
    history: startHistory(marks),
    tool: idleTool(tool),
    selection: null,
    options,
    profile: null,
    pointer: null,
  }
}

export function marksOf(table: TableState): Marks {
  return table.history.present
}

/** The marks that are to be kept: without the gesture that is still open. */
export function marksToKeep(table: TableState): Marks {
  return settledOf(table.history)
}

export function isGestureOpen(table: TableState): boolean {
  return table.tool.phase !== 'idle'
}

/** What the table becomes by an event. */
export function stepTable(table: TableState, event: TableEvent, newId: () => string): TableState {
  switch (event.type) {
    case 'chooseTool':
      return table.tool.tool === event.tool
        ? table
        : { ...settle(table, newId), tool: idleTool(event.tool), pointer: table.pointer }
    case 'cancel':
      return cancel(table)
    case 'undo':
      return undoAtTable(table, newId)
    case 'redo':
      return canRedo(table.history) ? calm({ ...table, history: redo(table.history) }) : table
    case 'delete':
      return deleteSelected(table)
    case 'nudge':
      return nudge(table, event.dx, event.dy)
    case 'select':
      return { ...settle(table, newId), selection: event.selection }
    case 'edit':
      return withHistory(settle(table, newId), event.marks)
    case 'setOptions':
      return { ...settle(table, newId), options: { ...table.options, ...event.options } }
    case 'replace':
      return { ...calm(table), history: startHistory(event.marks), selection: null }
    case 'settle':
      return settle(table, newId)
    case 'pointerLeave':
      return { ...table, pointer: null }
    default:
      return handTool(table, event, newId)
  }
}

function handTool(table: TableState, event: ToolEvent, newId: () => string): TableState {
  const { selection, options } = table
  const step = stepTool(table.tool, event, { marks: marksOf(table), selection, options, newId })
  return afterStep('place' in event ? pointed(table, event) : table, step)
}

function pointed(table: TableState, { place }: PointerAt): TableState {
  return { ...table, pointer: place }
}

function afterStep(table: TableState, step: Step<ToolState>): TableState {
  const moved = step.marks ? during(table.history, step.marks) : table.history
  return {
    ...table,
    tool: step.state,
    history: step.state.phase === 'idle' ? closeGesture(moved) : moved,
    selection: step.selection === undefined ? table.selection : step.selection,
    profile: step.profile === undefined ? table.profile : step.profile,
  }
}

/** What is drawn far enough to stand is kept, a drag half way is not. */
function settle(table: TableState, newId: () => string): TableState {
  if (!isGestureOpen(table)) return { ...table, tool: idleTool(table.tool.tool) }
  const ended = handTool(table, { type: 'end' }, newId)
  return isGestureOpen(ended) ? calm(ended) : ended
}

/** The tool laid down, its gesture undone. */
function calm(table: TableState): TableState {
  return { ...table, history: cancelGesture(table.history), tool: idleTool(table.tool.tool) }
}

function cancel(table: TableState): TableState {
  const rests = table.tool === idleTool(table.tool.tool)
  return rests ? { ...table, selection: null } : calm(table)
}

/** While places are being set, undo takes the last one back; else it goes a step back. */
function undoAtTable(table: TableState, newId: () => string): TableState {
  if (table.tool.phase === 'placing') return handTool(table, { type: 'back' }, newId)
  if (isGestureOpen(table)) return calm(table)
  if (!canUndo(table.history)) return table
  return stillThere(calm({ ...table, history: undo(table.history) }))
}

function deleteSelected(table: TableState): TableState {
  const { selection } = table
  if (!selection || isGestureOpen(table)) return table
  const marks = removeSelected(marksOf(table), selection)
  return stillThere({ ...withHistory(table, marks), selection: { ...selection, point: null } as Selection })
}

/** A selection is dropped with what it selected. */
function stillThere(table: TableState): TableState {
  const { selection } = table
  if (!selection || handlesOf(marksOf(table), selection).length > 0) return table
  return { ...table, selection: null }
}

function nudge(table: TableState, dx: number, dy: number): TableState {
  if (!table.selection || isGestureOpen(table)) return table
  return withHistory(table, moveSelected(marksOf(table), table.selection, dx, dy))
}

function withHistory(table: TableState, marks: Marks): TableState {
  return { ...table, history: change(table.history, marks) }
}
