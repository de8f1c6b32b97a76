import type { PointPx } from '@shared/schemas/shapes'
import { isDrag, type Scene, type Step, type ToolEvent } from './tool'

export type ArrowState =
  | { tool: 'pressArrow'; phase: 'idle' }
  | { tool: 'pressArrow'; phase: 'pressing'; from: PointPx }

export const idleArrow: ArrowState = { tool: 'pressArrow', phase: 'idle' }

/** Dragged from where the finger presses, the way the bands travel there. */
export function stepArrow(state: ArrowState, event: ToolEvent, { marks }: Scene): Step<ArrowState> {
  switch (event.type) {
    case 'pointerDown':
      return { state: { tool: 'pressArrow', phase: 'pressing', from: event.place } }
    case 'pointerMove': {
      if (state.phase === 'idle' || !isDrag(state.from, event)) return { state }
      const [x, y] = state.from
      return {
        state,
        marks: { ...marks, pressArrow: { x, y, dx: event.place[0] - x, dy: event.place[1] - y } },
      }
    }
    default:
      return { state: idleArrow }
  }
}
