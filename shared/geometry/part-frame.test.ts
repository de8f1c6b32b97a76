import { describe, expect, it } from 'vitest'
import type { Place } from './homography'
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

  // Derived here: the same pinhole camera turned about its axis, so that the tilt axis lies anywhere.
  it.each([
    [25, 35],
    [-25, 35],
    [40, -70],
    [32, 120],
    [-32, 90],
  ])('of a disc tilted %s° about an axis %s° from the photo’s x undoes the camera', (angleDeg, turnDeg) => {
    const radius = 20
    const upright = pinhole(angleDeg, 240, 24)
    const turn = (turnDeg * Math.PI) / 180
    const turned = ([x, y]: Place): Place => [
      799.5 + (x - 799.5) * Math.cos(turn) - (y - 599.5) * Math.sin(turn),
      599.5 + (x - 799.5) * Math.sin(turn) + (y - 599.5) * Math.cos(turn),
    ]
    const rim = rimEllipse(upright, radius)
    const [cx, cy] = turned([rim.cx, rim.cy])
    const f = frame(
      { ...rim, cx, cy, rotationDeg: turnDeg },
      { kind: 'round', diameterMm: 2 * radius },
      { ...squareOn, viewingAngleDeg: Math.abs(angleDeg) },
    )
    // The part's own axes are the photograph's: turn the disc's places along with the camera.
    for (const [u, v] of [
      [0, 0],
      [15, 0],
      [0, 15],
      [0, -15],
      [-9, 11],
    ] as const) {
      const x = u * Math.cos(turn) - v * Math.sin(turn)
      const y = u * Math.sin(turn) + v * Math.cos(turn)
      const [xMm, yMm] = f.toMm(...turned(upright(u, v)))
      expect(Math.hypot(xMm - x, yMm - y)).toBeLessThan(1e-3 * radius)
    }
  })

  it('has its perspective the other way where the photo’s middle lies on the other side of the ellipse', () => {
    const ellipse = { kind: 'ellipse', cx: 800, cy: 600, rx: 480, ry: 418, rotationDeg: 0 } as const
    const size = { kind: 'round', diameterMm: 40 } as const
    const middleOf = (heightPx: number) =>
      frame(ellipse, size, { viewingAngleDeg: 30, photo: { widthPx: 1601, heightPx }, mirrored: false }).toPx(
        0,
        0,
      )[1]
    // The photo's middle 20 px below the ellipse's centre, then 20 px above it.
    const [below, above] = [middleOf(1241), middleOf(1161)]
    expect(below - 600).toBeCloseTo(600 - above, 9)
    expect(Math.abs(below - 600)).toBeGreaterThan(1)
    // The far side is foreshortened, so that the disc's own centre lies farther off on the far (middle) side.
    expect(below).toBeGreaterThan(600)
  })

  it('leaves the perspective out without the photo’s size, and where the ratio asks for a camera too near', () => {
    const size = { kind: 'round', diameterMm: 40 } as const
    const centre = (ry: number, photo: typeof squareOn.photo | null) =>
      frame({ kind: 'ellipse', cx: 800, cy: 500, rx: 480, ry, rotationDeg: 0 }, size, {
        viewingAngleDeg: 30,
        photo,
        mirrored: false,
      }).toPx(0, 0)[1]
    expect(centre(418, null)).toBeCloseTo(500, 9)
    expect(centre(470, photo)).toBeCloseTo(500, 9)
    expect(centre(418, photo)).not.toBeCloseTo(500, 0)
  })

  it('of a block takes all four corners, whichever way they wind, and keeps x right and y down', () => {
    const corners: [number, number][] = [
      [110, 470],
      [1460, 380],
      [1490, 730],
      [130, 820],
    ]
    const block = { kind: 'block', widthMm: 35, heightMm: 9 } as const
    const windings: [number, number][][] = [
      corners,
      [corners[1]!, corners[0]!, corners[3]!, corners[2]!],
      [corners[2]!, corners[3]!, corners[0]!, corners[1]!],
      [corners[3]!, corners[2]!, corners[1]!, corners[0]!],
    ]
    const wanted = [
      [-17.5, -4.5],
      [17.5, -4.5],
      [17.5, 4.5],
      [-17.5, 4.5],
    ]
    for (const points of windings) {
      const f = frame({ kind: 'polygon', points }, block, squareOn)
      corners.forEach(([x, y], i) => {
        const [xMm, yMm] = f.toMm(x, y)
        expect(xMm).toBeCloseTo(wanted[i]![0]!, 9)
        expect(yMm).toBeCloseTo(wanted[i]![1]!, 9)
      })
    }
  })

  it('of a free outline has its scale from the longest side', () => {
    const f = frame(
      {
        kind: 'polygon',
        points: [
          [100, 100],
          [500, 100],
          [500, 300],
        ],
      },
      { kind: 'free', longestSideMm: Math.hypot(40, 20) },
      squareOn,
    )
    expect(f.mmPerPx(300, 200)).toBeCloseTo(0.1, 9)
    const [x, y] = f.toMm(500, 300)
    expect([x, y]).toEqual([expect.closeTo(13.3333, 4), expect.closeTo(13.3333, 4)])
  })

  it('is refused for an ellipse without width and an outline without length', () => {
    const size = { kind: 'round', diameterMm: 40 } as const
    expect(
      partFrame({ kind: 'ellipse', cx: 0, cy: 0, rx: 400, ry: 0.1, rotationDeg: 0 }, size, squareOn),
    ).toEqual({ problem: 'flat' })
    expect(
      partFrame(
        {
          kind: 'polygon',
          points: [
            [5, 5],
            [5, 5],
            [5, 5],
          ],
        },
        { kind: 'free', longestSideMm: 4 },
        squareOn,
      ),
    ).toEqual({ problem: 'flat' })
  })

  it('has the local scale that its own map has, by the area of a small square', () => {
    const f = frame(
      { kind: 'ellipse', cx: 790, cy: 500, rx: 490, ry: 430, rotationDeg: 30 },
      { kind: 'round', diameterMm: 40 },
      { ...squareOn, viewingAngleDeg: 30 },
    )
    const [a, b, c] = [f.toMm(600, 650), f.toMm(600.01, 650), f.toMm(600, 650.01)]
    const area = Math.abs((b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]))
    expect(f.mmPerPx(600, 650)).toBeCloseTo(Math.sqrt(area) / 0.01, 5)
  })
})
