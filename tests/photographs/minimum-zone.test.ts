import { describe, expect, it } from 'vitest'
import { minimumZoneUm } from './minimum-zone'

function places(rows: readonly (readonly [number, number, number])[]) {
  return {
    x: Float64Array.from(rows, (row) => row[0]),
    y: Float64Array.from(rows, (row) => row[1]),
    z: Float64Array.from(rows, (row) => row[2]),
  }
}

describe('minimum zone', () => {
  it('of a tilted plane is nothing', () => {
    const rows = [-3, -1, 2, 5].flatMap((x) => [-2, 0, 4].map((y) => [x, y, 0.3 * x - 0.2 * y + 1] as const))
    expect(minimumZoneUm(places(rows))).toBeCloseTo(0, 9)
  })

  it('touches three places below and one above them', () => {
    const rows = [
      [-10, -10, 0],
      [10, -10, 0],
      [0, 12, 0],
      [1, -1, 0.4],
    ] as const
    expect(minimumZoneUm(places(rows))).toBeCloseTo(0.4, 9)
  })

  it('touches two places below and two above where their lines cross', () => {
    const rows = [
      [-10, 0, 0.25],
      [10, 0, 0.25],
      [0, -10, -0.25],
      [0, 10, -0.25],
    ] as const
    expect(minimumZoneUm(places(rows))).toBeCloseTo(0.5, 9)
  })

  it('leans against a single high corner', () => {
    const rows = [
      [0, 0, 0],
      [10, 0, 0],
      [0, 10, 0],
      [10, 10, 0.8],
    ] as const
    expect(minimumZoneUm(places(rows))).toBeCloseTo(0.4, 9)
  })
})
