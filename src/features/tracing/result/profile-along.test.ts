import { describe, expect, it } from 'vitest'
import { heightsAlong, lengthOf, middleLine } from './profile-along'

/** Rises by 100 nm a step to the right; the last column isn't measured. */
const map = {
  columns: 4,
  rows: 3,
  x0Mm: -2,
  y0Mm: -1,
  stepMm: 1,
  heightsNm: [0, 100, 200, null, 0, 100, 200, null, 0, 100, 200, null],
  supported: Array.from({ length: 12 }, () => 1 as const),
}

describe('heights along a line', () => {
  it('runs through the middle from left to right when none is drawn', () => {
    expect(middleLine(map)).toEqual({ from: [-2, 0], to: [1, 0] })
    expect(lengthOf(middleLine(map))).toBe(3)
  })

  it('follows the slope between grid places and is open where nothing is measured', () => {
    const heights = heightsAlong(map, { from: [-2, 0], to: [1, 0] }, 7)
    expect(heights.slice(0, 5).map((um) => um?.toFixed(3))).toEqual([
      '0.000',
      '0.050',
      '0.100',
      '0.150',
      '0.200',
    ])
    expect(heights[6]).toBeNull()
  })

  it('has nothing off the map', () => {
    expect(heightsAlong(map, { from: [-20, 0], to: [-10, 0] }, 3)).toEqual([null, null, null])
  })
})
