import { ellipseThroughPoints } from '@shared/geometry/shape'
import type { LeaveOut } from '@shared/schemas/marks'
import type { PointPx, Shape } from '@shared/schemas/shapes'
import { distance } from '../geometry/paths'
import { closesPolygon, nothingPlaced, type Placing, placePoints } from './placing'
import { isDrag, type Scene, type Step, type ToolEvent } from './tool'

export interface LeaveOutState extends Placing {
  tool: 'leaveOut'
}

export const idleLeaveOut: LeaveOutState = { tool: 'leaveOut', ...nothingPlaced }

const ellipseClicks = 5

/** Circles are dragged from their centre; polygons and ellipses are clicked. */
export function stepLeaveOut(state: LeaveOutState, event: ToolEvent, scene: Scene): Step<LeaveOutState> {
  switch (scene.options.leaveOutWay) {
    case 'circle':
      return stepCircle(state, event, scene)
    case 'ellipse':
      return stepEllipse(state, event, scene)
    case 'polygon':
      return stepPolygon(state, event, scene)
  }
}

function stepCircle(state: LeaveOutState, event: ToolEvent, scene: Scene): Step<LeaveOutState> {
  const centre = state.points[0]
  switch (event.type) {
    case 'pointerDown':
      return { state: { ...state, phase: 'pressing', points: [event.place], hover: null } }
    case 'pointerMove':
      return state.phase === 'pressing' ? { state: { ...state, hover: event.place } } : { state }
    case 'pointerUp': {
      if (state.phase !== 'pressing' || !isDrag(centre, event)) return { state: idleLeaveOut }
      const [cx, cy] = centre
      return added({ kind: 'circle', cx, cy, r: distance(centre, event.place) }, scene)
    }
    default:
      return { state: idleLeaveOut }
  }
}

function stepEllipse(state: LeaveOutState, event: ToolEvent, scene: Scene): Step<LeaveOutState> {
  if (ends(event)) return { state: idleLeaveOut }
  const next = placePoints(state, event)
  if (next.phase !== 'placing' || next.points.length < ellipseClicks) return { state: next }
  const shape = ellipseThroughPoints(next.points)
  return shape ? added(shape, scene) : { state: next }
}

function stepPolygon(state: LeaveOutState, event: ToolEvent, scene: Scene): Step<LeaveOutState> {
  if (!ends(event) && !closesPolygon(state, event)) return { state: placePoints(state, event) }
  if (state.points.length < 3) return { state: idleLeaveOut }
  return added({ kind: 'polygon', points: state.points.map(([x, y]): PointPx => [x, y]) }, scene)
}

function ends(event: ToolEvent): boolean {
  return event.type === 'end' || event.type === 'doubleClick'
}

function added(shape: Shape, { marks, newId }: Scene): Step<LeaveOutState> {
  const leaveOut: LeaveOut = { id: newId(), shape, copies: null }
  return {
    state: idleLeaveOut,
    marks: { ...marks, leaveOuts: [...marks.leaveOuts, leaveOut] },
    selection: { kind: 'leaveOut', id: leaveOut.id, point: null },
  }
}
