import { describe, expect, it } from 'vitest'
import { chooseQuarter, glassMiddle } from './glass-place'

const size = { radiusPx: 78, belowPx: 68 }
const area = { width: 792, height: 674 }
const lineFrom = (x0: number, y0: number, dx: number, dy: number) =>
  Array.from({ length: 8 }, (_, i) => ({ x: x0 + i * dx, y: y0 + i * dy }))

describe('where the magnifier stands', () => {
  it('keeps clear of the band that is being drawn, from whichever side it comes', () => {
    const pointer = { x: 400, y: 330 }
    const fromUpperLeft = chooseQuarter(pointer, lineFrom(400, 330, -20, -15), size, area, null)
    expect(fromUpperLeft).not.toEqual({ toX: -1, toY: -1 })
    const fromLowerRight = chooseQuarter(pointer, lineFrom(400, 330, 20, 15), size, area, null)
    expect(fromLowerRight).not.toEqual({ toX: 1, toY: 1 })
  })

  it('lies within the area and never on the pointer, even in the corners', () => {
    for (const x of [2, 396, 790]) {
      for (const y of [2, 337, 672]) {
        const quarter = chooseQuarter({ x, y }, [], size, area, null)
        const middle = glassMiddle({ x, y }, quarter, size, area)
        expect(Math.abs(middle.x - x) > size.radiusPx || Math.abs(middle.y - y) > size.radiusPx).toBe(true)
        expect(middle.x).toBeGreaterThan(size.radiusPx)
        expect(middle.y + size.radiusPx + size.belowPx).toBeLessThan(area.height)
      }
    }
  })

  it('stays in its quarter while that is as good as any', () => {
    const before = { toX: -1, toY: 1 } as const
    expect(chooseQuarter({ x: 400, y: 330 }, [], size, area, before)).toEqual(before)
  })
})
