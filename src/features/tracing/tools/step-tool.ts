import { type ArrowState, idleArrow, stepArrow } from './arrow-tool'
import { type BandState, idleBand, stepBand } from './band-tool'
import { type CopiesState, idleCopies, stepCopies } from './copies-tool'
import { type DatumState, idleDatum, stepDatum } from './datum-tool'
import { type FaceState, idleFace, stepFace } from './face-tool'
import { idleLeaveOut, type LeaveOutState, stepLeaveOut } from './leave-out-tool'
import { idleNumber, type NumberState, stepNumber } from './number-tool'
import { idlePick, type PickState, stepPick } from './pick-tool'
import { idleProfile, type ProfileState, stepProfile } from './profile-tool'
import { idleStraightedge, type StraightedgeState, stepStraightedge } from './straightedge-tool'
import type { Scene, Step, ToolEvent, ToolName } from './tool'

/** The edge band is a number beside the photograph; at the photograph there is nothing to do. */
export interface EdgeBandState {
  tool: 'edgeBand'
  phase: 'idle'
}

export type ToolState =
  | PickState
  | FaceState
  | LeaveOutState
  | CopiesState
  | EdgeBandState
  | ArrowState
  | DatumState
  | BandState
  | NumberState
  | StraightedgeState
  | ProfileState

const idleStates: { [Name in ToolName]: Extract<ToolState, { tool: Name }> } = {
  pick: idlePick,
  face: idleFace,
  leaveOut: idleLeaveOut,
  copies: idleCopies,
  edgeBand: { tool: 'edgeBand', phase: 'idle' },
  pressArrow: idleArrow,
  datum: idleDatum,
  band: idleBand,
  number: idleNumber,
  straightedge: idleStraightedge,
  profile: idleProfile,
}

export function idleTool(tool: ToolName): ToolState {
  return idleStates[tool]
}

/** One event at the tool in hand. */
export function stepTool(state: ToolState, event: ToolEvent, scene: Scene): Step<ToolState> {
  switch (state.tool) {
    case 'pick':
      return stepPick(state, event, scene)
    case 'face':
      return stepFace(state, event, scene)
    case 'leaveOut':
      return stepLeaveOut(state, event, scene)
    case 'copies':
      return stepCopies(state, event, scene)
    case 'edgeBand':
      return { state }
    case 'pressArrow':
      return stepArrow(state, event, scene)
    case 'datum':
      return stepDatum(state, event, scene)
    case 'band':
      return stepBand(state, event, scene)
    case 'number':
      return stepNumber(state, event, scene)
    case 'straightedge':
      return stepStraightedge(state, event, scene)
    case 'profile':
      return stepProfile(state, event)
  }
}
