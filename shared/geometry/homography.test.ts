import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  applyHomography,
  composeHomographies,
  eliminate,
  homographyFromFourPoints,
  invertHomography,
  type Place,
  rigidMap,
} from './homography'

const square: Place[] = [
  [0, 0],
  [1, 0],
  [1, 1],
  [0, 1],
]

function expectPlace(found: Place, [x, y]: Place): void {
  expect(found[0]).toBeCloseTo(x, 9)
  expect(found[1]).toBeCloseTo(y, 9)
}

/** A corner of a 10 mm square pulled about by at most 2: always four corners of a dented-free outline. */
const pull = fc.double({ min: -2, max: 2, noNaN: true })
const corners = fc
  .tuple(fc.tuple(pull, pull), fc.tuple(pull, pull), fc.tuple(pull, pull), fc.tuple(pull, pull))
  .map((pulls) => square.map(([x, y], i): Place => [10 * x + pulls[i]![0], 10 * y + pulls[i]![1]]))

// Properties and closed values derived here; the method is Hartley and Zisserman's, 4.1 (from memory).
describe('homographies', () => {
  it('take four places to four others, and their inverses back', () => {
    fc.assert(
      fc.property(corners, corners, (from, to) => {
        const h = homographyFromFourPoints(from, to)!
        const back = invertHomography(h)!
        from.forEach(([x, y], i) => {
          expectPlace(applyHomography(h, x, y), to[i]!)
          expectPlace(applyHomography(back, ...to[i]!), [x, y])
        })
      }),
      { seed: 1 },
    )
  })

  it('take the crossing of the diagonals to the crossing of the diagonals', () => {
    const trapezium: Place[] = [
      [2, 0],
      [8, 0],
      [10, 5],
      [0, 5],
    ]
    const h = homographyFromFourPoints(square, trapezium)!
    // Sides 6 and 10, 5 apart: the diagonals cross at 5 · 6 ÷ (6 + 10) from the shorter.
    expectPlace(applyHomography(h, 0.5, 0.5), [5, 30 / 16])
  })

  it('are the plane itself when places stay', () => {
    const h = homographyFromFourPoints(square, square)!
    expect([...h]).toEqual([1, 0, 0, 0, 1, 0, 0, 0, 1].map((v) => expect.closeTo(v, 12)))
  })

  it('done one after the other are the composed one', () => {
    const first = homographyFromFourPoints(square, [
      [0, 0],
      [9, 1],
      [11, 12],
      [-1, 8],
    ])!
    const second = rigidMap(0.3, 5, -2)
    const both = composeHomographies(second, first)
    expectPlace(applyHomography(both, 0.3, 0.8), applyHomography(second, ...applyHomography(first, 0.3, 0.8)))
  })

  it('turn from x towards y, then shift', () => {
    expectPlace(applyHomography(rigidMap(Math.PI / 2, 10, 20), 1, 0), [10, 21])
    expectPlace(applyHomography(rigidMap(Math.PI / 6, 0, 0), 2, 0), [Math.sqrt(3), 1])
  })

  it.each([
    [
      'from three places on a line',
      [
        [0, 0],
        [1, 1],
        [2, 2],
        [0, 5],
      ],
      square,
    ],
    [
      'to three places on a line',
      square,
      [
        [0, 0],
        [1, 1],
        [2, 2],
        [0, 5],
      ],
    ],
    [
      'from one place given twice',
      [
        [0, 0],
        [0, 0],
        [2, 2],
        [0, 5],
      ],
      square,
    ],
  ] as [string, Place[], Place[]][])('are not to be had %s', (_what, from, to) => {
    expect(homographyFromFourPoints(from, to)).toBeNull()
  })

  it('want four places, no fewer', () => {
    expect(() => homographyFromFourPoints(square.slice(1), square)).toThrow(RangeError)
  })

  it('that flatten the plane have no inverse', () => {
    expect(invertHomography(Float64Array.of(1, 2, 0, 2, 4, 0, 0, 0, 1))).toBeNull()
    expect(invertHomography(new Float64Array(9))).toBeNull()
  })
})

describe('elimination', () => {
  it('solves equations whose first pivot is nought', () => {
    // y = 3, x + y = 5.
    expect(
      eliminate([
        [0, 1, 3],
        [1, 1, 5],
      ]),
    ).toEqual([2, 3])
  })

  it('gives nothing for equations that say the same thing twice', () => {
    expect(
      eliminate([
        [1, 2, 3],
        [2, 4, 6],
      ]),
    ).toBeNull()
  })
})
