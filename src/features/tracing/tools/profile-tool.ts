import type { PointPx } from '@shared/schemas/shapes'
import { isDrag, type Step, type ToolEvent } from './tool'

export type ProfileState =
  | { tool: 'profile'; phase: 'idle' }
  | { tool: 'profile'; phase: 'pressing'; from: PointPx }

export const idleProfile: ProfileState = { tool: 'profile', phase: 'idle' }

/** Dragged from A to B; it is looked along and not kept with the marks. */
export function stepProfile(state: ProfileState, event: ToolEvent): Step<ProfileState> {
  switch (event.type) {
    case 'pointerDown':
      return { state: { tool: 'profile', phase: 'pressing', from: event.place } }
    case 'pointerMove':
      if (state.phase === 'idle' || !isDrag(state.from, event)) return { state }
      return { state, profile: { from: state.from, to: event.place } }
    default:
      return { state: idleProfile }
  }
}
