import { describe, expect, it } from 'vitest'
import {
  connectedParts,
  forEachRimPixel,
  pixelCount,
  polygonSpans,
  type RowSpans,
  rowLess,
  rowOf,
  spansHold,
  spansLess,
} from './row-spans'

type Places = readonly (readonly [number, number])[]

const rectangle = (x0: number, y0: number, x1: number, y1: number): Places => [
  [x0, y0],
  [x1, y0],
  [x1, y1],
  [x0, y1],
]
const circle = (cx: number, cy: number, r: number, corners = 720): Places =>
  Array.from({ length: corners }, (_, k) => {
    const angle = (2 * Math.PI * (k + 0.5)) / corners
    return [cx + r * Math.cos(angle), cy + r * Math.sin(angle)] as const
  })

/** Rows of text, # for a pixel of the region. */
function spansOf(...rows: string[]): RowSpans {
  return {
    firstRow: 0,
    rows: rows.map((row) => [...row.matchAll(/#+/g)].flatMap((m) => [m.index, m.index + m[0].length - 1])),
  }
}

// All counts derived here.
describe('a region as spans of pixels', () => {
  it('holds the pixels whose centres lie inside', () => {
    const region = polygonSpans(rectangle(1.5, 2.5, 6.5, 5.5))
    expect(region).toEqual({
      firstRow: 3,
      rows: [
        [2, 6],
        [2, 6],
        [2, 6],
      ],
    })
    expect(pixelCount(region)).toBe(15)
    expect(spansHold(region, 1.6, 2.6)).toBe(true)
    expect(spansHold(region, 1.4, 3)).toBe(false)
    expect(rowOf(region, 99)).toEqual([])
  })

  it('counts a row through a corner once', () => {
    const diamond: Places = [
      [5, 0.5],
      [9.5, 5],
      [5, 9.5],
      [0.5, 5],
    ]
    expect(polygonSpans(diamond).rows.map((spans) => spans.length)).toEqual(new Array(9).fill(2))
    expect(pixelCount(polygonSpans(diamond))).toBe(41)
  })

  it('is the same whichever way the polygon winds, and empty for none', () => {
    const shape = circle(20.3, 17.8, 12.1)
    expect(polygonSpans(shape.toReversed())).toEqual(polygonSpans(shape))
    expect(pixelCount(polygonSpans([]))).toBe(0)
  })

  it('of a circle holds what a count pixel by pixel holds', () => {
    const region = polygonSpans(circle(50.2, 48.7, 40.3))
    let count = 0
    for (let y = 0; y < 100; y++) {
      for (let x = 0; x < 100; x++) {
        const distance = Math.hypot(x - 50.2, y - 48.7)
        // The polygon of 720 corners stays within 0.001 px of this circle.
        if (Math.abs(distance - 40.3) > 0.001) expect(spansHold(region, x, y)).toBe(distance < 40.3)
        if (spansHold(region, x, y)) count++
      }
    }
    expect(pixelCount(region)).toBe(count)
  })

  it('less another loses just what both hold', () => {
    const region = polygonSpans(rectangle(0.5, -0.5, 10.5, 9.5))
    const hole = polygonSpans(rectangle(2.5, 3.5, 5.5, 12.5))
    const left = spansLess(region, hole)
    expect(pixelCount(left)).toBe(100 - 3 * 6)
    expect(rowOf(left, 4)).toEqual([1, 2, 6, 10])
    expect(spansLess(left, hole)).toEqual(left)
    expect(pixelCount(spansLess(region, region))).toBe(0)
  })

  it.each([
    ['beside', [0, 3], [5, 10]],
    ['at the left end', [2, 6], [7, 10]],
    ['at the right end', [8, 12], [5, 7]],
    ['in the middle', [7, 8], [5, 6, 9, 10]],
    ['over all of it', [0, 20], []],
    ['twice', [6, 6, 9, 9], [5, 5, 7, 8, 10, 10]],
  ])('a row 5 to 10 loses a span that lies %s', (_where, taken, left) => {
    expect(rowLess([5, 10], taken)).toEqual(left)
  })

  it('has a rim of the pixels with a neighbour outside', () => {
    const rim: string[] = []
    forEachRimPixel(polygonSpans(rectangle(0.5, 0.5, 5.5, 4.5)), (x, y) => rim.push(`${x},${y}`))
    // A frame of 5 × 4 pixels, each once.
    expect(rim).toHaveLength(2 * 5 + 2 * 2)
    expect(new Set(rim).size).toBe(rim.length)
    expect(rim).not.toContain('3,2')
  })

  it('falls into parts that no path of side-by-side pixels joins', () => {
    const parts = connectedParts(spansOf('##..##', '#...#.', '......', '.####.'))
    expect(parts.pixels).toEqual([3, 3, 4])
    expect(parts.partOf).toEqual([[0, 1], [0, 1], [], [2]])
  })

  it('is one part where its arms meet farther down, two where pixels touch by corners only', () => {
    expect(connectedParts(spansOf('#.#.#', '#.#.#', '#####')).pixels).toEqual([11])
    expect(connectedParts(spansOf('##..', '..##')).pixels).toEqual([2, 2])
  })
})
