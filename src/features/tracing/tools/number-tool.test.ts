import type { Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { describe, expect, it } from 'vitest'
import { atTheTable, uprightBands } from './at-the-table.fixture'

const orders = ({ traces }: Marks) => traces.map(({ order }) => order)
const toTheRight = { x: 40, y: 50, dx: 30, dy: 2 }
const toTheLeft = { x: 40, y: 50, dx: -30, dy: 2 }

describe('the number tool', () => {
  it('numbers the bands in the order in which the drag crosses them', () => {
    const hand = atTheTable('number', { traces: uprightBands(30, 10, 20) }).drag([0, 50], [40, 55])
    expect(orders(hand.marks)).toEqual([3, 1, 2])
  })

  it('counts down when dragged against the press arrow, so that numbers rise along it', () => {
    const traces = uprightBands(10, 20, 30)
    const against = atTheTable('number', { traces, pressArrow: toTheRight }).drag([40, 50], [0, 50])
    expect(orders(against.marks)).toEqual([1, 2, 3])
    const along = atTheTable('number', { traces, pressArrow: toTheRight }).drag([0, 50], [40, 50])
    expect(orders(along.marks)).toEqual([1, 2, 3])
    const turned = atTheTable('number', { traces, pressArrow: toTheLeft }).drag([0, 50], [40, 50])
    expect(orders(turned.marks)).toEqual([3, 2, 1])
  })

  it('looks at the arrow’s own bands, so that a drag on a ring’s far side comes out right', () => {
    const ring = (r: number): PointPx[] =>
      Array.from({ length: 37 }, (_, k) => [
        100 + r * Math.cos((k * Math.PI) / 18),
        100 + r * Math.sin((k * Math.PI) / 18),
      ])
    const traces = [20, 40, 60].map((r, i) => ({ id: `ring-${i}`, order: null, points: ring(r) }))
    // Outwards on the right; dragged outwards on the left, against the arrow's own direction.
    const pressArrow = { x: 130, y: 100, dx: 20, dy: 0 }
    const hand = atTheTable('number', { traces, pressArrow }).drag([95, 101], [30, 101])
    expect(orders(hand.marks)).toEqual([1, 2, 3])
  })

  it('joins on to numbers that are there', () => {
    const traces = uprightBands([10, 4], 20, 30)
    expect(orders(atTheTable('number', { traces }).drag([0, 50], [40, 50]).marks)).toEqual([4, 5, 6])
  })

  it('starts at the number that was asked for', () => {
    const hand = atTheTable('number', { traces: uprightBands(10, 20) }, { firstNumber: 7 })
    expect(orders(hand.drag([0, 50], [40, 50]).marks)).toEqual([7, 8])
  })

  it('numbers a whole drag in one step, and nothing when it is cancelled', () => {
    const traces = uprightBands(10, 20, 30)
    const hand = atTheTable('number', { traces }).drag([0, 50], [40, 50]).undo()
    expect(orders(hand.marks)).toEqual([null, null, null])
    hand.down([0, 50]).move([40, 50]).escape().up([40, 50])
    expect(orders(hand.marks)).toEqual([null, null, null])
  })

  it('shows the numbers so far while the drag goes on', () => {
    const hand = atTheTable('number', { traces: uprightBands(10, 20) })
    hand.down([0, 50]).move([15, 50])
    expect(orders(hand.marks)).toEqual([1, null])
  })

  it('takes a typed number for the band that was clicked', () => {
    const hand = atTheTable('number', { traces: uprightBands(10, 20) })
      .click([20, 30])
      .type('12')
    expect(orders(hand.marks)).toEqual([null, 12])
    expect(orders(hand.backspace().marks)).toEqual([null, 1])
    expect(orders(hand.backspace().type('-3').marks)).toEqual([null, -3])
  })
})
