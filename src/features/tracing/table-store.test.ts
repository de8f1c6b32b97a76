import { emptyMarks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { describe, expect, it } from 'vitest'
import { marksOf, startTable, type TableEvent } from './table-state'
import { createTableStore, newMarkId } from './table-store'
import { uprightBands } from './tools/at-the-table.fixture'

const options = { faceWay: 'circle', leaveOutWay: 'circle', copyCount: 6, firstNumber: null } as const
const marks = { ...emptyMarks(), traces: uprightBands(50) }
const at = (place: PointPx) => ({ place, reachPx: 8, shift: false })

function readOnlyTable(...events: TableEvent[]) {
  const store = createTableStore(startTable(marks, options), false)
  for (const event of events) store.dispatch(event)
  return store.get()
}

describe('a table to be read only', () => {
  it('takes no change, by whichever way it comes', () => {
    const table = readOnlyTable(
      { type: 'chooseTool', tool: 'band' },
      { type: 'edit', marks: emptyMarks() },
      { type: 'pointerDown', ...at([50, 25]) },
      { type: 'pointerUp', ...at([50, 25]) },
      { type: 'pointerDown', ...at([50, 25]) },
      { type: 'pointerMove', ...at([90, 25]) },
      { type: 'pointerUp', ...at([90, 25]) },
      { type: 'delete' },
      { type: 'nudge', dx: 5, dy: 5 },
      { type: 'doubleClick', ...at([50, 25]) },
    )
    expect(marksOf(table)).toBe(marks)
  })

  it('still selects and looks along a line', () => {
    const selected = readOnlyTable(
      { type: 'pointerDown', ...at([50, 25]) },
      { type: 'pointerUp', ...at([50, 25]) },
    )
    expect(selected.selection).toMatchObject({ kind: 'trace', id: 'band-0' })
    const looked = readOnlyTable(
      { type: 'chooseTool', tool: 'profile' },
      { type: 'pointerDown', ...at([0, 0]) },
      { type: 'pointerMove', ...at([80, 0]) },
      { type: 'pointerUp', ...at([80, 0]) },
    )
    expect(looked.profile).toEqual({ from: [0, 0], to: [80, 0] })
  })
})

describe('names of marks', () => {
  it('are short enough to be kept and don’t come twice', () => {
    const names = Array.from({ length: 500 }, newMarkId)
    expect(new Set(names).size).toBe(500)
    for (const name of names) expect(name.length).toBeLessThanOrEqual(40)
  })
})
