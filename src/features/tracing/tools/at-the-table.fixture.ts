import { emptyMarks, type Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { marksOf, startTable, stepTable, type TableEvent, type TableState } from '../table-state'
import type { ToolName, ToolOptions } from './tool'

const reachPx = 8
const usual: ToolOptions = { faceWay: 'circle', leaveOutWay: 'circle', copyCount: 6, firstNumber: null }

/** A hand at the table: chains of gestures that read as they are made. */
export function atTheTable(tool: ToolName, marks: Partial<Marks> = {}, options: Partial<ToolOptions> = {}) {
  let table: TableState = startTable({ ...emptyMarks(), ...marks }, { ...usual, ...options }, tool)
  let ids = 0
  const dispatch = (event: TableEvent) => {
    table = stepTable(table, event, () => `new-${++ids}`)
  }
  const at = ([x, y]: PointPx, shift = false) => ({ place: [x, y] as PointPx, reachPx, shift })
  const hand = {
    down: (place: PointPx, shift = false) => act({ type: 'pointerDown', ...at(place, shift) }),
    move: (place: PointPx) => act({ type: 'pointerMove', ...at(place) }),
    up: (place: PointPx) => act({ type: 'pointerUp', ...at(place) }),
    click: (...places: PointPx[]) => {
      for (const place of places) hand.down(place).up(place)
      return hand
    },
    doubleClick: (place: PointPx) => hand.click(place, place).do({ type: 'doubleClick', ...at(place) }),
    drag: (from: PointPx, to: PointPx) => {
      const half: PointPx = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]
      return hand.down(from).move(half).move(to).up(to)
    },
    type: (digits: string) => {
      for (const digit of digits) dispatch({ type: 'digit', digit })
      return hand
    },
    enter: () => act({ type: 'end' }),
    backspace: () => act({ type: 'back' }),
    escape: () => act({ type: 'cancel' }),
    undo: () => act({ type: 'undo' }),
    redo: () => act({ type: 'redo' }),
    choose: (next: ToolName) => act({ type: 'chooseTool', tool: next }),
    do: act,
    get marks() {
      return marksOf(table)
    },
    get table() {
      return table
    },
  }
  function act(event: TableEvent): typeof hand {
    dispatch(event)
    return hand
  }
  return hand
}

/** Straight bands from top to bottom at the given x, without numbers unless they are given. */
export function uprightBands(...at: (number | readonly [x: number, order: number])[]): Marks['traces'] {
  return at.map((band, i) => {
    const [x, order] = typeof band === 'number' ? [band, null] : band
    const points: PointPx[] = [
      [x, 0],
      [x, 50],
      [x, 100],
    ]
    return { id: `band-${i}`, order, points }
  })
}
