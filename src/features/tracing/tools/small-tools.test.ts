import { describe, expect, it } from 'vitest'
import { atTheTable } from './at-the-table.fixture'

describe('the press arrow', () => {
  it('runs from where the pointer went down to where it is let go', () => {
    const hand = atTheTable('pressArrow').drag([100, 100], [60, 160])
    expect(hand.marks.pressArrow).toEqual({ x: 100, y: 100, dx: -40, dy: 60 })
    expect(hand.undo().marks.pressArrow).toBeNull()
  })

  it('stays as it was after a mere click and after Escape', () => {
    const before = { x: 1, y: 2, dx: 30, dy: 40 }
    const hand = atTheTable('pressArrow', { pressArrow: before }).click([100, 100])
    hand.down([10, 10]).move([90, 90]).escape().up([90, 90])
    expect(hand.marks.pressArrow).toEqual(before)
  })
})

describe('datum marks', () => {
  it('are lettered in turn, and a freed letter is used again', () => {
    const hand = atTheTable('datum').click([10, 10], [50, 50])
    expect(hand.marks.datumMarks.map(({ label }) => label)).toEqual(['A', 'B'])
    hand.click([10, 10]).do({ type: 'delete' }).click([90, 90])
    expect(hand.marks.datumMarks.map(({ label }) => label).toSorted()).toEqual(['A', 'B'])
  })

  it('are moved by a drag', () => {
    const hand = atTheTable('datum').click([10, 10]).drag([11, 11], [21, 31])
    expect(hand.marks.datumMarks[0]).toMatchObject({ x: 20, y: 30 })
  })
})

describe('the straightedge', () => {
  it('takes a dragged chord, the bow and the next band', () => {
    const hand = atTheTable('straightedge').drag([0, 0], [100, 0]).click([50, 12], [50, 40])
    expect(hand.marks.straightedge).toEqual({
      from: [0, 0],
      to: [100, 0],
      bowAt: [50, 12],
      nextBandAt: [50, 40],
    })
  })

  it('takes four clicks as well, and drops them on Escape', () => {
    const hand = atTheTable('straightedge').click([0, 0], [100, 0], [50, 12]).escape()
    expect(hand.marks.straightedge).toBeNull()
    hand.click([0, 0], [100, 0], [50, 12], [50, 40])
    expect(hand.marks.straightedge).not.toBeNull()
  })
})

describe('the profile line', () => {
  it('is looked along and leaves the marks alone', () => {
    const hand = atTheTable('profile').drag([0, 0], [100, 50])
    expect(hand.table.profile).toEqual({ from: [0, 0], to: [100, 50] })
    expect(hand.table.history.past).toEqual([])
  })
})
