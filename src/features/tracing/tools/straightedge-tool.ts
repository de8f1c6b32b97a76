import type { PointPx } from '@shared/schemas/shapes'
import { nothingPlaced, type Placing, placePoints } from './placing'
import { isDrag, type Scene, type Step, type ToolEvent } from './tool'

export interface StraightedgeState extends Placing {
  tool: 'straightedge'
}

export const idleStraightedge: StraightedgeState = { tool: 'straightedge', ...nothingPlaced }

/** Chord end, chord end (by a drag or two clicks), the place of the greatest bow, a place on the next band. */
export function stepStraightedge(
  state: StraightedgeState,
  event: ToolEvent,
  { marks }: Scene,
): Step<StraightedgeState> {
  if (event.type === 'end') return { state: idleStraightedge }
  const next = isChordDrag(state, event) ? dragChord(state, event) : placePoints(state, event)
  if (next.phase !== 'placing' || next.points.length < 4) return { state: next }
  const [from, to, bowAt, nextBandAt] = next.points as [PointPx, PointPx, PointPx, PointPx]
  return {
    state: idleStraightedge,
    marks: { ...marks, straightedge: { from, to, bowAt, nextBandAt } },
    selection: { kind: 'straightedge', point: null },
  }
}

type Moving = Extract<ToolEvent, { type: 'pointerMove' | 'pointerUp' }>

function isChordDrag({ phase, points }: StraightedgeState, event: ToolEvent): event is Moving {
  const moves = event.type === 'pointerMove' || event.type === 'pointerUp'
  return phase === 'pressing' && points.length === 1 && moves
}

function dragChord(state: StraightedgeState, event: Moving): StraightedgeState {
  if (event.type === 'pointerMove') return { ...state, hover: event.place }
  const points = isDrag(state.points[0], event) ? [state.points[0], event.place] : state.points
  return { ...state, phase: 'placing', points, hover: null }
}
