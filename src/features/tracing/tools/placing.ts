import type { PointPx } from '@shared/schemas/shapes'
import { isDrag, type ToolEvent } from './tool'

/**
 * Places set one after another by clicks. `pressing`: the last one still follows the hand, so that it can be
 * put exactly before letting go.
 */
export interface Placing {
  phase: 'idle' | 'placing' | 'pressing'
  points: readonly PointPx[]
  hover: PointPx | null
}

export const nothingPlaced: Placing = { phase: 'idle', points: [], hover: null }

/** One event of setting places; pressing on the last place takes hold of it again. */
export function placePoints<S extends Placing>(state: S, event: ToolEvent, fixed = 0): S {
  switch (event.type) {
    case 'pointerDown': {
      const last = state.points.at(-1)
      const again = last !== undefined && !isDrag(last, event) && state.points.length > fixed
      const points = again ? state.points : [...state.points, event.place]
      return { ...state, phase: 'pressing', points, hover: null }
    }
    case 'pointerMove':
      if (state.phase === 'placing') return { ...state, hover: event.place }
      if (state.phase !== 'pressing') return state
      return { ...state, points: [...state.points.slice(0, -1), event.place] }
    case 'pointerUp':
      return state.phase === 'pressing' ? { ...state, phase: 'placing' } : state
    case 'back': {
      if (state.points.length <= fixed) return state
      const points = state.points.slice(0, -1)
      return { ...state, points, phase: points.length > fixed ? 'placing' : 'idle' }
    }
    default:
      return state
  }
}

/** Whether the pointer goes down on the first place of three or more, which closes a polygon. */
export function closesPolygon({ points }: Placing, event: ToolEvent): boolean {
  return event.type === 'pointerDown' && points.length >= 3 && !isDrag(points[0], event)
}
