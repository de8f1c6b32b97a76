import { describe, expect, it } from 'vitest'
import { applyHomography, homographyFromFourPoints, invertHomography, type Place } from './homography'
import { type PartFrame, partFrame } from './part-frame'

const photo = { widthPx: 1600, heightPx: 1200 }
const squareOn = { viewingAngleDeg: 0, photo, mirrored: false }

function frame(...args: Parameters<typeof partFrame>): PartFrame {
  const made = partFrame(...args)
  if ('problem' in made) throw new Error(made.problem)
  return made
}

/** A pinhole camera of its own: looks at the disc's middle at the photograph's middle, tilted about the photo's x. */
function pinhole(angleDeg: number, distanceMm: number, pxPerMm: number): (x: number, y: number) => Place {
  const t = (angleDeg * Math.PI) / 180
  return (x, y) => {
    const depth = distanceMm + y * Math.sin(t)
    const scale = (pxPerMm * distanceMm) / depth
    return [799.5 + x * scale, 599.5 + y * Math.cos(t) * scale]
  }
}

/** The ellipse that such a camera makes of the rim, from its extreme places. */
function rimEllipse(see: (x: number, y: number) => Place, radiusMm: number) {
  const rim = Array.from({ length: 7200 }, (_, k) =>
    see(radiusMm * Math.cos((k * Math.PI) / 3600), radiusMm * Math.sin((k * Math.PI) / 3600)),
  )
  const xs = rim.map(([x]) => x)
  const ys = rim.map(([, y]) => y)
  const [left, right, top, bottom] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)]
  return {
    kind: 'ellipse' as const,
    cx: (left + right) / 2,
    cy: (top + bottom) / 2,
    rx: (right - left) / 2,
    ry: (bottom - top) / 2,
    rotationDeg: 0,
  }
}

describe('the part frame', () => {
  it('of a circle is a similarity about its centre', () => {
    const f = frame({ kind: 'circle', cx: 800, cy: 600, r: 400 }, { kind: 'round', diameterMm: 40 }, squareOn)
    expect(f.toMm(1200, 600)).toEqual([20, 0])
    expect(f.mmPerPx(500, 500)).toBeCloseTo(0.05, 12)
  })

  it.each([17, 30, -30, 40])(
    'of a disc seen %s° off the normal undoes the camera, perspective and all',
    (angleDeg) => {
      const see = pinhole(angleDeg, 240, 24)
      const f = frame(
        rimEllipse(see, 20),
        { kind: 'round', diameterMm: 40 },
        { ...squareOn, viewingAngleDeg: Math.abs(angleDeg) },
      )
      for (const [x, y] of [
        [0, 0],
        [12, 5],
        [-7, 15],
        [3, -18],
      ] as const) {
        const [xMm, yMm] = f.toMm(...see(x, y))
        expect(Math.hypot(xMm - x, yMm - y)).toBeLessThan(0.01)
      }
    },
  )

  it('of four corners takes each to its own', () => {
    const points: Place[] = [
      [110, 470],
      [1460, 380],
      [1490, 730],
      [130, 820],
    ]
    const f = frame(
      { kind: 'polygon', points: points.map(([x, y]) => [x, y]) },
      { kind: 'block', widthMm: 35, heightMm: 9 },
      squareOn,
    )
    const corners = points.map(([x, y]) => f.toMm(x, y))
    expect(corners[0]![0]).toBeCloseTo(-17.5, 9)
    expect(corners[0]![1]).toBeCloseTo(-4.5, 9)
    expect(corners[2]![0]).toBeCloseTo(17.5, 9)
    expect(corners[2]![1]).toBeCloseTo(4.5, 9)
  })

  it('goes there and back again', () => {
    const f = frame(
      { kind: 'ellipse', cx: 790, cy: 580, rx: 490, ry: 460, rotationDeg: 30 },
      { kind: 'round', diameterMm: 40 },
      { ...squareOn, viewingAngleDeg: 21 },
    )
    const [x, y] = f.toPx(...f.toMm(900, 700))
    expect(x).toBeCloseTo(900, 6)
    expect(y).toBeCloseTo(700, 6)
  })

  it('seen by a mirror turns left and right over', () => {
    const f = frame(
      { kind: 'circle', cx: 800, cy: 600, r: 400 },
      { kind: 'round', diameterMm: 40 },
      { ...squareOn, mirrored: true },
    )
    expect(f.toMm(1200, 640)[0]).toBeCloseTo(-20, 9)
    expect(f.toMm(1200, 640)[1]).toBeCloseTo(2, 9)
  })

  it('is refused for corners that cross or lie on a line', () => {
    const block = { kind: 'block', widthMm: 10, heightMm: 10 } as const
    const of = (points: [number, number][]) => partFrame({ kind: 'polygon', points }, block, squareOn)
    expect(
      of([
        [0, 0],
        [10, 10],
        [10, 0],
        [0, 10],
      ]),
    ).toEqual({ problem: 'cornersCrossed' })
    expect(
      of([
        [0, 0],
        [10, 0],
        [20, 0],
        [0, 10],
      ]),
    ).toHaveProperty('problem')
  })
})

describe('homographies', () => {
  const from: Place[] = [
    [0, 0],
    [10, 1],
    [9, 8],
    [-1, 7],
  ]
  const to: Place[] = [
    [0, 0],
    [1, 0],
    [1, 1],
    [0, 1],
  ]

  it('take four places to four others, and their inverses back', () => {
    const h = homographyFromFourPoints(from, to)!
    const back = invertHomography(h)!
    from.forEach(([x, y], i) => {
      const [u, v] = applyHomography(h, x, y)
      expect(u).toBeCloseTo(to[i]![0], 9)
      expect(v).toBeCloseTo(to[i]![1], 9)
      expect(applyHomography(back, u, v)[0]).toBeCloseTo(x, 9)
    })
  })

  it('are not to be had from three places on a line', () => {
    expect(
      homographyFromFourPoints(
        [
          [0, 0],
          [1, 1],
          [2, 2],
          [0, 5],
        ],
        to,
      ),
    ).toBeNull()
  })
})
