import type { Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { withNumber } from '../geometry/edit-marks'
import { traceAt } from '../geometry/hit-test'
import { numberAlong } from '../geometry/number-along'
import { distance } from '../geometry/paths'
import { isDrag, type PointerAt, type Scene, type Step, type ToolEvent } from './tool'

export type NumberState =
  /** `typed` is what was typed so far for the selected band. */
  | { tool: 'number'; phase: 'idle'; typed: string }
  | { tool: 'number'; phase: 'pressing'; path: readonly PointPx[]; before: Marks }

export const idleNumber: NumberState = { tool: 'number', phase: 'idle', typed: '' }

/** Orders that can be kept have at most four digits. */
const mostDigits = 4

/** A drag across bands numbers them in a row; a click chooses one band, whose number is then typed. */
export function stepNumber(state: NumberState, event: ToolEvent, scene: Scene): Step<NumberState> {
  switch (event.type) {
    case 'pointerDown':
      return {
        state: { tool: 'number', phase: 'pressing', path: [event.place], before: scene.marks },
        selection: null,
      }
    case 'pointerMove':
      return state.phase === 'pressing' ? dragOn(state, event, scene) : { state }
    case 'pointerUp':
      return state.phase === 'pressing' ? letGo(state, event, scene) : { state }
    case 'digit':
      return state.phase === 'idle' ? type(state.typed + event.digit, scene) : { state }
    case 'back':
      return state.phase === 'idle' ? type(state.typed.slice(0, -1), scene) : { state: idleNumber }
    default:
      return { state: idleNumber }
  }
}

type Pressing = Extract<NumberState, { phase: 'pressing' }>

/** Pixels between the places of a drag that are kept. */
const stridePx = 2

function dragOn(state: Pressing, { place }: PointerAt, { options }: Scene): Step<NumberState> {
  if (distance(state.path[state.path.length - 1], place) < stridePx) return { state }
  const path = [...state.path, place]
  return { state: { ...state, path }, marks: numberAlong(state.before, path, options.firstNumber) }
}

function letGo(state: Pressing, event: PointerAt, scene: Scene): Step<NumberState> {
  if (state.path.length > 1 && isDrag(state.path[0], event)) {
    const path = [...state.path, event.place]
    return { state: idleNumber, marks: numberAlong(state.before, path, scene.options.firstNumber) }
  }
  const id = traceAt(scene.marks, event.place, event.reachPx)
  return { state: idleNumber, selection: id === null ? null : { kind: 'trace', id, point: null } }
}

function type(text: string, { marks, selection }: Scene): Step<NumberState> {
  if (selection?.kind !== 'trace') return { state: idleNumber }
  if (!/^-?\d*$/.test(text) || text.replace('-', '').length > mostDigits) return { state: idleNumber }
  const typed: NumberState = { tool: 'number', phase: 'idle', typed: text }
  const order = /\d/.test(text) ? Number(text) : null
  return { state: typed, marks: withNumber(marks, selection.id, order) }
}
