import { describe, expect, it } from 'vitest'
import { atTheTable, uprightBands } from './at-the-table.fixture'

describe('the band tool', () => {
  it('follows the clicks and ends by Enter, the new band selected and without a number', () => {
    const hand = atTheTable('band').click([10, 0], [12, 30], [11, 60]).enter()
    expect(hand.marks.traces).toEqual([
      {
        id: 'new-1',
        order: null,
        points: [
          [10, 0],
          [12, 30],
          [11, 60],
        ],
      },
    ])
    expect(hand.table.selection).toEqual({ kind: 'trace', id: 'new-1', point: null })
  })

  it('ends by a double click without doubling the last point', () => {
    const hand = atTheTable('band').click([10, 0], [12, 30]).doubleClick([11, 60])
    expect(hand.marks.traces[0].points).toHaveLength(3)
  })

  it('puts a point where the hand lets go of it', () => {
    const hand = atTheTable('band').click([10, 0]).down([10, 30]).move([14, 33]).up([14, 33]).enter()
    expect(hand.marks.traces[0].points[1]).toEqual([14, 33])
  })

  it('takes points back by Backspace and by undo', () => {
    const hand = atTheTable('band').click([10, 0], [12, 30], [90, 60]).backspace().click([11, 60], [99, 99])
    hand.undo().enter()
    expect(hand.marks.traces[0].points).toEqual([
      [10, 0],
      [12, 30],
      [11, 60],
    ])
  })

  it('is cancelled whole by Escape', () => {
    const hand = atTheTable('band').click([10, 0], [12, 30], [11, 60]).escape().enter()
    expect(hand.marks.traces).toEqual([])
  })

  it('is one step for undo however many clicks it had', () => {
    const hand = atTheTable('band').click([10, 0], [12, 30], [11, 60]).enter().undo()
    expect(hand.marks.traces).toEqual([])
    expect(hand.redo().marks.traces[0].points).toHaveLength(3)
  })

  it('carries a band on from its last end', () => {
    const hand = atTheTable('band', { traces: uprightBands([50, 4]) })
      .click([51, 99], [50, 140])
      .enter()
    expect(hand.marks.traces).toHaveLength(1)
    expect(hand.marks.traces[0]).toMatchObject({ order: 4 })
    expect(hand.marks.traces[0].points.at(-1)).toEqual([50, 140])
    expect(hand.undo().marks.traces).toEqual(uprightBands([50, 4]))
  })

  it('carries a band on from its first end, and keeps its sense', () => {
    const hand = atTheTable('band', { traces: uprightBands([50, 4]) })
      .click([50, 1], [50, -40])
      .enter()
    expect(hand.marks.traces[0].points).toEqual([
      [50, -40],
      [50, 0],
      [50, 50],
      [50, 100],
    ])
  })

  it('starts a new band beside an end when Shift is held', () => {
    const hand = atTheTable('band', { traces: uprightBands(50) })
      .down([50, 99], true)
      .up([50, 99])
    expect(hand.click([50, 140]).enter().marks.traces).toHaveLength(2)
  })

  it('keeps a band far enough drawn when another tool is taken, and drops a single click', () => {
    expect(atTheTable('band').click([10, 0], [12, 30]).choose('number').marks.traces).toHaveLength(1)
    expect(atTheTable('band').click([10, 0]).choose('number').marks.traces).toEqual([])
  })
})
