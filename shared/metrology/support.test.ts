import { describe, expect, it } from 'vitest'
import type { MapGrid } from './measured-area'
import { supportedPlaces } from './support'
import type { TracedPoints } from './traced-points'

const columns = 61
const rows = 41
const stepMm = 0.5
const grid: MapGrid = {
  columns,
  rows,
  x0Mm: -15,
  y0Mm: -10,
  stepMm,
  index: Int32Array.from({ length: columns * rows }, (_, i) => i),
  xMm: Float64Array.from({ length: columns * rows }, (_, i) => -15 + (i % columns) * stepMm),
  yMm: Float64Array.from({ length: columns * rows }, (_, i) => -10 + Math.floor(i / columns) * stepMm),
  coverage: new Float32Array(columns * rows).fill(1),
}

function clicks(places: readonly (readonly [number, number])[]): TracedPoints {
  const xMm = Float64Array.from(places, ([x]) => x)
  const yMm = Float64Array.from(places, ([, y]) => y)
  const none = new Float64Array(places.length)
  return {
    count: places.length,
    xMm,
    yMm,
    xMmRight: none,
    yMmRight: none,
    xMmDown: none,
    yMmDown: none,
    order: none,
    traceOf: new Int32Array(places.length),
  }
}

/** Checks the swept map against every distance to every click; a cell's breadth is left to either. */
function expectSupport(places: readonly (readonly [number, number])[], spacings: readonly number[]): void {
  const supported = supportedPlaces(grid, clicks(places), Float64Array.from(spacings))
  for (const cell of grid.index) {
    const beyond = places.map(
      ([x, y], i) => Math.hypot(grid.xMm[cell]! - x, grid.yMm[cell]! - y) - spacings[i]!,
    )
    const least = Math.min(...beyond)
    if (least < -stepMm) expect(supported[cell]).toBe(1)
    if (least > stepMm) expect(supported[cell]).toBe(0)
  }
}

// Against a search through all clicks, written here.
describe('places that the traces support', () => {
  it('lie within one band spacing of a click', () => {
    expectSupport([[0, 0]], [4])
    expectSupport(
      Array.from({ length: 12 }, (_, k) => [-14 + 2.5 * k, 8 * Math.sin(k)] as const),
      new Array(12).fill(3),
    )
  })

  it('go by the spacing at their own click, where bands stand closer on one side', () => {
    expectSupport(
      [
        [-8, 0],
        [8, 0],
      ],
      [2, 6],
    )
    expectSupport(
      Array.from({ length: 9 }, (_, k) => [-12 + 3 * k, -4 + k] as const),
      Array.from({ length: 9 }, (_, k) => 1.5 + 0.4 * k),
    )
  })

  it('are all where bands are dense, and none without clicks', () => {
    const everywhere = Array.from(
      { length: 77 },
      (_, k) => [-15 + 3 * (k % 11), -10 + 3.3 * Math.floor(k / 11)] as const,
    )
    expect(
      supportedPlaces(grid, clicks(everywhere), new Float64Array(77).fill(3)).every((v) => v === 1),
    ).toBe(true)
    expect(supportedPlaces(grid, clicks([]), new Float64Array(0)).some((v) => v === 1)).toBe(false)
  })

  it('are counted on the measured area only', () => {
    const half = { ...grid, index: grid.index.filter((cell) => grid.xMm[cell]! < 0) }
    const supported = supportedPlaces(half, clicks([[0, 0]]), Float64Array.of(100))
    expect(supported.reduce((a, b) => a + b, 0)).toBe(half.index.length)
  })
})
