import { copiesOf } from '@shared/geometry/shape'
import type { PointPx } from '@shared/schemas/shapes'
import { describe, expect, it } from 'vitest'
import { atTheTable } from './at-the-table.fixture'

const onCircle = (angleDeg: number): PointPx => [
  200 + 100 * Math.cos((angleDeg * Math.PI) / 180),
  150 + 100 * Math.sin((angleDeg * Math.PI) / 180),
]
const onEllipse = (angleDeg: number): PointPx => [
  200 + 100 * Math.cos((angleDeg * Math.PI) / 180),
  150 + 60 * Math.sin((angleDeg * Math.PI) / 180),
]

describe('the face tool', () => {
  it('lays a circle through three clicks on the rim', () => {
    const { outline } = atTheTable('face').click(onCircle(0), onCircle(100), onCircle(250)).marks
    expect(outline).toMatchObject({ kind: 'circle' })
    if (outline?.kind !== 'circle') return
    expect(outline.cx).toBeCloseTo(200)
    expect(outline.cy).toBeCloseTo(150)
    expect(outline.r).toBeCloseTo(100)
  })

  it('refines the circle with each further click, one step each', () => {
    const hand = atTheTable('face').click(onCircle(0), onCircle(100), [100, 152])
    const rough = hand.marks.outline
    hand.click(onCircle(30), onCircle(200), onCircle(300))
    expect(hand.marks.outline).not.toEqual(rough)
    hand.undo().undo().undo()
    expect(hand.marks.outline).toEqual(rough)
    expect(hand.undo().marks.outline).toBeNull()
  })

  it('follows the hand with the third click until it is let go', () => {
    const hand = atTheTable('face').click(onCircle(0), onCircle(90)).down([130, 150]).move(onCircle(180))
    hand.up(onCircle(180))
    expect(hand.marks.outline).toMatchObject({ kind: 'circle' })
    expect(hand.marks.outline?.kind === 'circle' && hand.marks.outline.r).toBeCloseTo(100)
  })

  it('lays an ellipse through five clicks', () => {
    const hand = atTheTable('face', {}, { faceWay: 'ellipse' })
    hand.click(...[0, 70, 140, 210, 300].map(onEllipse))
    const { outline } = hand.marks
    expect(outline?.kind).toBe('ellipse')
    if (outline?.kind !== 'ellipse') return
    expect(outline.rx).toBeCloseTo(100, 3)
    expect(outline.ry).toBeCloseTo(60, 3)
  })

  it('takes four corners of a block, the first two along its width', () => {
    const corners: PointPx[] = [
      [10, 10],
      [210, 20],
      [205, 120],
      [5, 110],
    ]
    const hand = atTheTable('face', {}, { faceWay: 'corners' }).click(...corners)
    expect(hand.marks.outline).toEqual({ kind: 'polygon', points: corners })
  })

  it('closes a free polygon on its first place, by Enter and by a double click', () => {
    const corners: PointPx[] = [
      [0, 0],
      [100, 0],
      [100, 80],
    ]
    const start = () => atTheTable('face', {}, { faceWay: 'polygon' }).click(...corners)
    expect(start().click([1, 1]).marks.outline).toEqual({ kind: 'polygon', points: corners })
    expect(start().enter().marks.outline).toEqual({ kind: 'polygon', points: corners })
    expect(start().doubleClick([0, 80]).marks.outline).toEqual({
      kind: 'polygon',
      points: [...corners, [0, 80]],
    })
  })

  it('drops the clicks on Escape and leaves the face as it was', () => {
    const outline = { kind: 'circle', cx: 1, cy: 2, r: 3 } as const
    const hand = atTheTable('face', { outline }).click(onCircle(0), onCircle(90)).escape()
    hand.click(onCircle(180))
    expect(hand.marks.outline).toEqual(outline)
  })
})

describe('the leave-out tool', () => {
  it('drags a circle from its centre', () => {
    const { leaveOuts } = atTheTable('leaveOut').drag([50, 60], [80, 100]).marks
    expect(leaveOuts).toEqual([
      { id: 'new-1', shape: { kind: 'circle', cx: 50, cy: 60, r: 50 }, copies: null },
    ])
  })

  it('makes nothing of a mere click, nor of a drag that Escape cancels', () => {
    const hand = atTheTable('leaveOut').click([50, 60]).down([10, 10]).move([90, 90]).escape().up([90, 90])
    expect(hand.marks.leaveOuts).toEqual([])
    expect(hand.table.history.past).toEqual([])
  })

  it('clicks a polygon, and takes a point back', () => {
    const hand = atTheTable('leaveOut', {}, { leaveOutWay: 'polygon' })
    hand.click([0, 0], [50, 0], [90, 90]).backspace().click([50, 50], [0, 50]).enter()
    expect(hand.marks.leaveOuts[0].shape).toEqual({
      kind: 'polygon',
      points: [
        [0, 0],
        [50, 0],
        [50, 50],
        [0, 50],
      ],
    })
  })

  it('is undone in one step', () => {
    const hand = atTheTable('leaveOut').drag([50, 60], [80, 100]).undo()
    expect(hand.marks.leaveOuts).toEqual([])
    expect(hand.redo().marks.leaveOuts).toHaveLength(1)
  })
})

describe('copies round a centre', () => {
  const slot = { id: 'slot', shape: { kind: 'circle', cx: 260, cy: 150, r: 10 } as const, copies: null }
  const outline = { kind: 'circle', cx: 200, cy: 150, r: 100 } as const

  it('spreads a chosen leave-out round the face by Enter', () => {
    const hand = atTheTable('copies', { outline, leaveOuts: [slot] })
      .click([262, 150])
      .enter()
    const [leaveOut] = hand.marks.leaveOuts
    expect(leaveOut.copies).toEqual({ count: 6, cx: 200, cy: 150 })
    const opposite = copiesOf(leaveOut)[3]
    expect(opposite.kind === 'circle' && opposite.cx).toBeCloseTo(140)
  })

  it('takes the face’s centre exactly when the click is near it', () => {
    const hand = atTheTable('copies', { outline, leaveOuts: [slot] })
      .click([262, 150])
      .click([207, 145])
    expect(hand.marks.leaveOuts[0].copies).toEqual({ count: 6, cx: 200, cy: 150 })
  })

  it('takes the click itself where no centre is near', () => {
    const hand = atTheTable('copies', { outline, leaveOuts: [slot] })
      .click([262, 150])
      .click([20, 30])
    expect(hand.marks.leaveOuts[0].copies).toEqual({ count: 6, cx: 20, cy: 30 })
  })
})
