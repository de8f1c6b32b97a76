import type { Marks, Trace } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { distance } from '../geometry/paths'
import { nothingPlaced, type Placing, placePoints } from './placing'
import type { PointerAt, Scene, Step, ToolEvent } from './tool'

export interface BandState extends Placing {
  tool: 'band'
  /** The trace that is carried on, and from which of its ends; its points come first in `points`. */
  continues: { id: string; end: 'first' | 'last'; count: number } | null
}

export const idleBand: BandState = { tool: 'band', continues: null, ...nothingPlaced }

/** Click along the dark centre; Enter or a double click ends. A press on the end of a trace carries it on. */
export function stepBand(state: BandState, event: ToolEvent, scene: Scene): Step<BandState> {
  if (event.type === 'end' || event.type === 'doubleClick') return end(state, scene)
  if (state.phase === 'idle' && event.type === 'pointerDown' && !event.shift) {
    const carried = carryOn(event, scene)
    if (carried)
      return { state: carried, selection: { kind: 'trace', id: carried.continues.id, point: null } }
  }
  const fixed = state.continues?.count ?? 0
  const next = placePoints(state, event, fixed)
  if (next.phase === 'idle') return { state: idleBand }
  return event.type === 'pointerDown' && state.phase === 'idle'
    ? { state: next, selection: null }
    : { state: next }
}

function end(state: BandState, scene: Scene): Step<BandState> {
  const { continues, points } = state
  if (continues) {
    if (points.length <= continues.count) return { state: idleBand }
    const drawn = continues.end === 'first' ? points.toReversed() : [...points]
    return { state: idleBand, marks: withPoints(scene.marks, continues.id, drawn) }
  }
  if (points.length < 2) return { state: idleBand }
  const trace: Trace = { id: scene.newId(), order: null, points: [...points] }
  return {
    state: idleBand,
    marks: { ...scene.marks, traces: [...scene.marks.traces, trace] },
    selection: { kind: 'trace', id: trace.id, point: null },
  }
}

type Carried = BandState & { continues: NonNullable<BandState['continues']> }

/** The end under the pointer: the selected trace's within reach, others' within half of it, bands being close. */
function carryOn({ place, reachPx }: PointerAt, { marks, selection }: Scene): Carried | null {
  const selected = selection?.kind === 'trace' ? selection.id : null
  for (const { id, points } of marks.traces) {
    const reach = id === selected ? reachPx : reachPx / 2
    for (const end of ['last', 'first'] as const) {
      const tip = points.at(end === 'last' ? -1 : 0)
      if (!tip || distance(tip, place) > reach) continue
      const drawn = end === 'last' ? points : points.toReversed()
      const continues = { id, end, count: points.length }
      return { ...idleBand, phase: 'placing', points: drawn, continues }
    }
  }
  return null
}

function withPoints(marks: Marks, id: string, points: PointPx[]): Marks {
  return { ...marks, traces: marks.traces.map((trace) => (trace.id === id ? { ...trace, points } : trace)) }
}
