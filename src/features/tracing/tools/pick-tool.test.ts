import type { PointPx } from '@shared/schemas/shapes'
import { describe, expect, it } from 'vitest'
import { atTheTable, uprightBands } from './at-the-table.fixture'

const circle = { kind: 'circle', cx: 200, cy: 150, r: 100 } as const

describe('picking and moving', () => {
  it('selects on the first click and does not move what was only selected', () => {
    const hand = atTheTable('pick', { traces: uprightBands(50) }).drag([52, 30], [90, 30])
    expect(hand.table.selection).toEqual({ kind: 'trace', id: 'band-0', point: null })
    expect(hand.marks.traces).toEqual(uprightBands(50))
  })

  it('drags one point of the selected band, in one step', () => {
    const hand = atTheTable('pick', { traces: uprightBands(50) })
      .click([50, 25])
      .drag([51, 49], [61, 44])
    expect(hand.marks.traces[0].points[1]).toEqual([60, 45])
    expect(hand.undo().marks.traces).toEqual(uprightBands(50))
  })

  it('drags the whole of a selected band by its line', () => {
    const hand = atTheTable('pick', { traces: uprightBands(50) })
      .click([50, 25])
      .drag([50, 25], [60, 35])
    expect(hand.marks.traces[0].points).toEqual([
      [60, 10],
      [60, 60],
      [60, 110],
    ])
  })

  it('puts everything back when Escape comes in the middle of a drag', () => {
    const hand = atTheTable('pick', { traces: uprightBands(50) })
    hand.click([50, 25]).down([50, 50]).move([70, 50]).move([90, 50])
    expect(hand.marks.traces[0].points[1]).toEqual([90, 50])
    expect(hand.escape().marks.traces).toEqual(uprightBands(50))
    expect(hand.move([120, 50]).up([120, 50]).marks.traces).toEqual(uprightBands(50))
  })

  it('inserts a point where the selected line is double-clicked', () => {
    const hand = atTheTable('pick', { traces: uprightBands(50) })
      .click([50, 25])
      .doubleClick([50, 24])
    expect(hand.marks.traces[0].points).toHaveLength(4)
    expect(hand.marks.traces[0].points[1]).toEqual([50, 24])
  })

  it('inserts a point with Shift and drags it in the same gesture', () => {
    const hand = atTheTable('pick', { traces: uprightBands(50) }).click([50, 25])
    hand.down([50, 24], true).move([58, 24]).up([58, 24])
    expect(hand.marks.traces[0].points[1]).toEqual([58, 24])
    expect(hand.undo().marks.traces).toEqual(uprightBands(50))
  })

  it('deletes the selected point, and then the band', () => {
    const hand = atTheTable('pick', { traces: uprightBands(50, 80) })
      .click([50, 25])
      .click([50, 50])
    hand.do({ type: 'delete' })
    expect(hand.marks.traces[0].points).toHaveLength(2)
    hand.do({ type: 'delete' })
    expect(hand.marks.traces.map(({ id }) => id)).toEqual(['band-1'])
    expect(hand.table.selection).toBeNull()
  })

  it('moves the selected point by the arrow keys', () => {
    const hand = atTheTable('pick', { traces: uprightBands(50) })
      .click([50, 25])
      .click([50, 50])
    hand.do({ type: 'nudge', dx: 1, dy: 0 }).do({ type: 'nudge', dx: 0, dy: -10 })
    expect(hand.marks.traces[0].points[1]).toEqual([51, 40])
  })

  it('widens a circle by a handle on its rim and moves it by its centre', () => {
    const hand = atTheTable('pick', { outline: circle }).click([300, 150]).drag([300, 150], [320, 150])
    expect(hand.marks.outline).toEqual({ ...circle, r: 120 })
    hand.drag([200, 150], [210, 140])
    expect(hand.marks.outline).toEqual({ ...circle, cx: 210, cy: 140, r: 120 })
  })

  it('turns an ellipse by the end of its long axis', () => {
    const outline = { kind: 'ellipse', cx: 0, cy: 0, rx: 100, ry: 50, rotationDeg: 0 } as const
    const hand = atTheTable('pick', { outline }).click([100, 0]).drag([100, 0], [0, 110])
    expect(hand.marks.outline).toMatchObject({ rx: 110, ry: 50 })
    expect(hand.marks.outline?.kind === 'ellipse' && hand.marks.outline.rotationDeg).toBeCloseTo(90)
  })

  it('drags the tip of the press arrow and leaves its tail', () => {
    const hand = atTheTable('pick', { pressArrow: { x: 10, y: 10, dx: 100, dy: 0 } })
    hand.click([60, 10]).drag([110, 10], [110, 60])
    expect(hand.marks.pressArrow).toEqual({ x: 10, y: 10, dx: 100, dy: 50 })
  })

  it('lets go of the selection by a click beside everything, or by Escape', () => {
    const hand = atTheTable('pick', { traces: uprightBands(50) })
      .click([50, 25])
      .click([300, 300])
    expect(hand.table.selection).toBeNull()
    expect(hand.click([50, 25]).escape().table.selection).toBeNull()
  })

  it('drags a corner of a polygon', () => {
    const points: PointPx[] = [
      [0, 0],
      [100, 0],
      [100, 100],
    ]
    const leaveOuts = [{ id: 'slot', shape: { kind: 'polygon' as const, points }, copies: null }]
    const hand = atTheTable('pick', { leaveOuts }).click([60, 10]).drag([100, 0], [120, -5])
    expect(hand.marks.leaveOuts[0].shape).toMatchObject({
      points: [
        [0, 0],
        [120, -5],
        [100, 100],
      ],
    })
  })
})
