import type { Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'

export const toolNames = [
  'pick',
  'face',
  'leaveOut',
  'copies',
  'edgeBand',
  'pressArrow',
  'datum',
  'band',
  'number',
  'straightedge',
  'profile',
] as const
export type ToolName = (typeof toolNames)[number]

export type FaceWay = 'circle' | 'ellipse' | 'corners' | 'polygon'
export type LeaveOutWay = 'circle' | 'ellipse' | 'polygon'

export interface ToolOptions {
  faceWay: FaceWay
  leaveOutWay: LeaveOutWay
  /** Places in all that a copy round a centre makes. */
  copyCount: number
  /** The number that the first band of a drag gets; null lets the drag find it. */
  firstNumber: number | null
}

/** `point` is a handle: an index into the mark's handles, or null for the whole. */
export type Selection =
  | { kind: 'trace'; id: string; point: number | null }
  | { kind: 'leaveOut'; id: string; point: number | null }
  | { kind: 'datum'; id: string; point: null }
  | { kind: 'outline'; point: number | null }
  | { kind: 'pressArrow'; point: number | null }
  | { kind: 'straightedge'; point: number | null }

export interface ProfileLine {
  from: PointPx
  to: PointPx
}

/** A pointer in photo pixels; `reachPx` is how near counts as on it: a few screen pixels, more for a finger. */
export interface PointerAt {
  place: PointPx
  reachPx: number
  shift: boolean
}

export type ToolEvent =
  | ({ type: 'pointerDown' } & PointerAt)
  | ({ type: 'pointerMove' } & PointerAt)
  | ({ type: 'pointerUp' } & PointerAt)
  | ({ type: 'doubleClick' } & PointerAt)
  /** Ends what is being drawn. */
  | { type: 'end' }
  /** Takes the last point back. */
  | { type: 'back' }
  /** A digit or a minus sign typed at the photograph. */
  | { type: 'digit'; digit: string }

/** What a tool sees besides its own state. */
export interface Scene {
  marks: Marks
  selection: Selection | null
  options: ToolOptions
  newId: () => string
}

/** What a tool makes of an event; what isn't given stays as it is. */
export interface Step<State> {
  state: State
  marks?: Marks
  selection?: Selection | null
  profile?: ProfileLine | null
}

/** Farther than this from where the pointer went down is a drag, in reaches. */
const dragShare = 0.5

export function isDrag(from: PointPx, at: PointerAt): boolean {
  return Math.hypot(at.place[0] - from[0], at.place[1] - from[1]) > dragShare * at.reachPx
}
