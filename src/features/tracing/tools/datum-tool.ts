import type { DatumMark, Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { distance } from '../geometry/paths'
import type { Scene, Step, ToolEvent } from './tool'

export type DatumState =
  | { tool: 'datum'; phase: 'idle' }
  | { tool: 'datum'; phase: 'pressing'; mark: DatumMark; from: PointPx; before: Marks }

export const idleDatum: DatumState = { tool: 'datum', phase: 'idle' }

const mostMarks = 20

/** A click sets the next mark, A, B, C; it follows the hand until let go. A press on a mark takes hold of it. */
export function stepDatum(state: DatumState, event: ToolEvent, scene: Scene): Step<DatumState> {
  switch (event.type) {
    case 'pointerDown': {
      const { marks } = scene
      const held = marks.datumMarks.find(({ x, y }) => distance([x, y], event.place) <= event.reachPx)
      if (!held && marks.datumMarks.length >= mostMarks) return { state }
      const [x, y] = event.place
      const mark = held ?? { id: scene.newId(), label: nextLabel(marks), x, y }
      return {
        state: { tool: 'datum', phase: 'pressing', mark, from: event.place, before: marks },
        marks: held ? undefined : withMark(marks, mark),
        selection: { kind: 'datum', id: mark.id, point: null },
      }
    }
    case 'pointerMove': {
      if (state.phase === 'idle') return { state }
      const { mark, from, before } = state
      const moved = { ...mark, x: mark.x + event.place[0] - from[0], y: mark.y + event.place[1] - from[1] }
      return { state, marks: withMark(before, moved) }
    }
    default:
      return { state: idleDatum }
  }
}

function withMark(marks: Marks, mark: DatumMark): Marks {
  const others = marks.datumMarks.filter(({ id }) => id !== mark.id)
  return { ...marks, datumMarks: [...others, mark] }
}

function nextLabel({ datumMarks }: Marks): string {
  const taken = new Set(datumMarks.map(({ label }) => label))
  const letters = Array.from({ length: mostMarks + 1 }, (_, i) => String.fromCharCode(65 + i))
  return letters.find((letter) => !taken.has(letter)) ?? ''
}
