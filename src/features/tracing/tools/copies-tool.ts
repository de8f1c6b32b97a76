import type { Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { leaveOutAt } from '../geometry/hit-test'
import { distance } from '../geometry/paths'
import { centreOfShape } from '../geometry/shape-path'
import type { Scene, Step, ToolEvent } from './tool'

export interface CopiesState {
  tool: 'copies'
  phase: 'idle'
}

export const idleCopies: CopiesState = { tool: 'copies', phase: 'idle' }

/** Centres within this many reaches of a click are taken exactly. */
const snapReaches = 2

/** A click on a leave-out chooses it, a click elsewhere sets the centre; Enter takes the face's centre. */
export function stepCopies(state: CopiesState, event: ToolEvent, scene: Scene): Step<CopiesState> {
  const chosen = scene.selection?.kind === 'leaveOut' ? scene.selection.id : null
  if (event.type === 'end') {
    const centre = scene.marks.outline && centreOfShape(scene.marks.outline)
    return chosen && centre ? copied(state, scene, chosen, centre) : { state }
  }
  if (event.type !== 'pointerDown') return { state }
  const centre = nearestCentre(scene.marks, event.place, snapReaches * event.reachPx, chosen)
  const hit = centre && chosen ? null : leaveOutAt(scene.marks, event.place, event.reachPx)
  if (hit) return { state, selection: { kind: 'leaveOut', id: hit, point: null } }
  return chosen ? copied(state, scene, chosen, centre ?? event.place) : { state }
}

/** The marks with a leave-out repeated round a centre; a count below two takes the copies away. */
export function withCopies(marks: Marks, id: string, count: number, centre: PointPx): Marks {
  const copies = count < 2 ? null : { count, cx: centre[0], cy: centre[1] }
  return {
    ...marks,
    leaveOuts: marks.leaveOuts.map((leaveOut) => (leaveOut.id === id ? { ...leaveOut, copies } : leaveOut)),
  }
}

function copied(state: CopiesState, scene: Scene, id: string, centre: PointPx): Step<CopiesState> {
  return { state, marks: withCopies(scene.marks, id, scene.options.copyCount, centre) }
}

/** The centre of the face or of a round leave-out beside the click. */
function nearestCentre(
  marks: Marks,
  place: PointPx,
  withinPx: number,
  chosen: string | null,
): PointPx | null {
  const centres = [
    ...(marks.outline ? [centreOfShape(marks.outline)] : []),
    ...marks.leaveOuts
      .filter(({ id, shape }) => id !== chosen && shape.kind !== 'polygon')
      .map(({ shape }) => centreOfShape(shape)),
  ]
  return centres.find((centre) => distance(centre, place) <= withinPx) ?? null
}
