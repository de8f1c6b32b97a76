import type { Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { insertPoint } from '../geometry/edit-marks'
import { moveSelected } from '../geometry/handles'
import { hitTest } from '../geometry/hit-test'
import { isDrag, type PointerAt, type Scene, type Selection, type Step, type ToolEvent } from './tool'

export type PickState =
  | { tool: 'pick'; phase: 'idle' }
  /** Down on a mark, not yet moved; `movable` tells a first click, which only selects, from a grip. */
  | {
      tool: 'pick'
      phase: 'pressing' | 'dragging'
      grip: Selection
      movable: boolean
      from: PointPx
      before: Marks
    }

export const idlePick: PickState = { tool: 'pick', phase: 'idle' }

/** Select, drag a handle or the whole, insert a point by a double click or with Shift held. */
export function stepPick(state: PickState, event: ToolEvent, scene: Scene): Step<PickState> {
  switch (event.type) {
    case 'pointerDown':
      return event.shift ? insertAndHold(event, scene) : press(event, scene)
    case 'pointerMove':
      return drag(state, event)
    case 'pointerUp':
      return { state: idlePick }
    case 'doubleClick': {
      const inserted = insertAt(event, scene)
      return inserted
        ? { state: idlePick, marks: inserted.marks, selection: inserted.selection }
        : { state: idlePick }
    }
    default:
      return { state: idlePick }
  }
}

function press(event: PointerAt, { marks, selection }: Scene): Step<PickState> {
  const grip = hitTest(marks, selection, event.place, event.reachPx)
  if (!grip) return { state: idlePick, selection: null }
  const movable = grip.point !== null || isSame(grip, selection) || isSmall(grip)
  return {
    state: { tool: 'pick', phase: 'pressing', grip, movable, from: event.place, before: marks },
    selection: grip,
  }
}

function drag(state: PickState, event: PointerAt): Step<PickState> {
  if (state.phase === 'idle' || !state.movable) return { state }
  if (state.phase === 'pressing' && !isDrag(state.from, event)) return { state }
  const [dx, dy] = [event.place[0] - state.from[0], event.place[1] - state.from[1]]
  return { state: { ...state, phase: 'dragging' }, marks: moveSelected(state.before, state.grip, dx, dy) }
}

function insertAndHold(event: PointerAt, scene: Scene): Step<PickState> {
  const inserted = insertAt(event, scene)
  if (!inserted) return press(event, scene)
  const { marks, selection } = inserted
  const held = { grip: selection, movable: true, from: event.place, before: marks }
  return { state: { tool: 'pick', phase: 'dragging', ...held }, marks, selection }
}

function insertAt({ place, reachPx }: PointerAt, { marks, selection }: Scene) {
  const hit = hitTest(marks, selection, place, reachPx)
  if (!hit || hit.point !== null || !isSame(hit, selection)) return null
  return insertPoint(marks, hit, place)
}

/** Marks so small that a first drag can only mean to move them. */
function isSmall({ kind }: Selection): boolean {
  return kind === 'datum' || kind === 'pressArrow' || kind === 'straightedge'
}

function isSame(a: Selection, b: Selection | null): boolean {
  if (!b || a.kind !== b.kind) return false
  return !('id' in a) || !('id' in b) || a.id === b.id
}
