import type { LeaveOut, Marks, Outline, Trace } from '@shared/schemas/marks'
import type { Polygon, Shape } from '@shared/schemas/shapes'
import { photoGeometry } from '../../tests/photographs/camera'
import { handTraces } from '../../tests/photographs/hand-traces'
import type { Scene } from '../../tests/photographs/scene'
import { type SetUpFile, setUpFile } from '../../tests/photographs/set-up-file'

/** What an inspector marks on the scene's photograph, every band traced and numbered. */
export function demoMarks(scene: Scene): Marks {
  const file = setUpFile(scene)
  return {
    outline: outlineOf(file),
    leaveOuts: leaveOutsOf(scene, file),
    edgeBandMm: file.edgeExclusionMm,
    pressArrow: file.pressTest,
    datumMarks: (file.datumMarks ?? []).map(([x, y], i) => ({
      id: `mark-${i + 1}`,
      label: String(i + 1),
      x,
      y,
    })),
    flatIndexMark: null,
    traces: tracesOf(scene),
    straightedge: null,
  }
}

/** The same work broken off: half of the bands are traced, and the last ones have no number yet. */
export function partlyTraced(marks: Marks): Marks {
  const traces = marks.traces.slice(0, Math.ceil(marks.traces.length / 2))
  const numbered = Math.ceil(traces.length / 2)
  return {
    ...marks,
    pressArrow: null,
    traces: traces.map((trace, i) => (i < numbered ? trace : { ...trace, order: null })),
  }
}

function tracesOf(scene: Scene): Trace[] {
  return handTraces(scene, scene.seed).map(({ order, points }, i) => ({
    id: `trace-${i + 1}`,
    order,
    points: points.map(([x, y]) => [x, y]),
  }))
}

function outlineOf({ outline }: SetUpFile): Outline {
  if (outline.kind === 'polygon') return polygonOf(outline)
  const { diameterMm: _diameterMm, ...shape } = outline
  return shape
}

/** Ports and slots are alike all round: one is drawn, the others are its copies. */
function leaveOutsOf(scene: Scene, { exclusions }: SetUpFile): LeaveOut[] {
  const shapes = exclusions.map((shape): Shape => (shape.kind === 'polygon' ? polygonOf(shape) : shape))
  const { slots, kidneyPorts } = scene.face
  const count = slots?.count ?? kidneyPorts.length
  if (count < 2) return shapes.map((shape, i) => leaveOut(i, shape, null))
  const [cx, cy] = photoGeometry(scene).photoFromPart(0, 0)
  const first = shapes.findIndex(({ kind }) => kind === 'polygon')
  return [
    ...shapes.slice(0, first).map((shape, i) => leaveOut(i, shape, null)),
    leaveOut(first, shapes[first], { count, cx, cy }),
    ...shapes.slice(first + count).map((shape, i) => leaveOut(first + 1 + i, shape, null)),
  ]
}

function leaveOut(index: number, shape: Shape, copies: LeaveOut['copies']): LeaveOut {
  return { id: `leave-out-${index + 1}`, shape, copies }
}

function polygonOf({ points }: { points: readonly (readonly [number, number])[] }): Polygon {
  return { kind: 'polygon', points: points.map(([x, y]) => [x, y]) }
}
