import { describe, expect, it } from 'vitest'
import { heightField, type StoredMap, sampleGrid } from './height-field'

const columns = 12
const rows = 10

/** A tilted plane of 10 nm a column and 4 nm a row, measured within a rectangle. */
function planeMap(isMeasured: (column: number, row: number) => boolean): StoredMap {
  const cells = Array.from({ length: columns * rows }, (_, i) => [i % columns, Math.floor(i / columns)])
  return {
    columns,
    rows,
    x0Mm: 0,
    y0Mm: 0,
    stepMm: 1,
    heightsNm: cells.map(([c, r]) => (isMeasured(c!, r!) ? 10 * c! + 4 * r! - 60 : null)),
    supported: cells.map(() => 1 as const),
  }
}

const inner = (c: number, r: number) => c >= 3 && c <= 8 && r >= 3 && r <= 6

describe('a height field', () => {
  it('goes on beyond the rim as the surface arrives there', () => {
    const field = heightField(planeMap(inner))
    for (const [c, r] of [
      [2, 4],
      [9, 5],
      [5, 2],
      [5, 7],
    ] as const) {
      expect(field.heightsUm[r * columns + c]).toBeCloseTo((10 * c + 4 * r - 60) / 1000, 12)
    }
    expect(field.heightsUm.every(Number.isFinite)).toBe(true)
  })

  it('ranges over what is measured and the plane, not over what was filled in', () => {
    const { leastUm, mostUm } = heightField(planeMap(inner))
    expect(leastUm).toBeCloseTo((30 + 12 - 60) / 1000, 12)
    expect(mostUm).toBeCloseTo((80 + 24 - 60) / 1000, 12)
  })

  it('takes whole cells where no shares are stored, and the shares where they are', () => {
    const map = planeMap(inner)
    expect(heightField(map).coverage[3 * columns + 3]).toBe(1)
    expect(heightField(map).coverage[0]).toBe(0)
    const shares = map.heightsNm.map(() => 40)
    expect(heightField({ ...map, coveragePercent: shares }).coverage[0]).toBeCloseTo(0.4, 12)
  })

  it('of a map of nothing is level, with a range to draw by', () => {
    const { heightsUm, leastUm, mostUm } = heightField(planeMap(() => false))
    expect(heightsUm.every((um) => um === 0)).toBe(true)
    expect(mostUm).toBeGreaterThan(leastUm)
  })
})

describe('a sample of a grid', () => {
  it('lies on the plane between places, and at the nearest beyond the grid', () => {
    const values = Float64Array.from({ length: 6 }, (_, i) => (i % 3) + 10 * Math.floor(i / 3))
    expect(sampleGrid(values, { columns: 3, rows: 2 }, 1.25, 0.5)).toBeCloseTo(6.25, 12)
    expect(sampleGrid(values, { columns: 3, rows: 2 }, 9, 9)).toBe(12)
    expect(sampleGrid(values, { columns: 3, rows: 2 }, -5, -5)).toBe(0)
  })
})
