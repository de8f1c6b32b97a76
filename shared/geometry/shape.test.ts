import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Ellipse, PointPx, Polygon } from '../schemas/shapes'
import {
  circleThroughPoints,
  circleThroughThreePoints,
  copiesOf,
  ellipseThroughPoints,
  isInside,
  moveShape,
  shapeArea,
  turnShape,
} from './shape'

const ellipse: Ellipse = { kind: 'ellipse', cx: 700, cy: 500, rx: 400, ry: 250, rotationDeg: 25 }
const square: Polygon = {
  kind: 'polygon',
  points: [
    [0, 0],
    [10, 0],
    [10, 10],
    [0, 10],
  ],
}

function onCircle(cx: number, cy: number, r: number, angle: number): PointPx {
  return [cx + r * Math.cos(angle), cy + r * Math.sin(angle)]
}

function onEllipse(e: Ellipse, angle: number, grown = 0): PointPx {
  const turn = (e.rotationDeg * Math.PI) / 180
  const [u, v] = [(e.rx + grown) * Math.cos(angle), (e.ry + grown) * Math.sin(angle)]
  return [e.cx + u * Math.cos(turn) - v * Math.sin(turn), e.cy + u * Math.sin(turn) + v * Math.cos(turn)]
}

const angles = (count: number, from = 0, to = 2 * Math.PI) =>
  Array.from({ length: count }, (_, k) => from + ((to - from) * k) / count)

// All closed values derived here.
describe('circles through rim places', () => {
  it('go through any three of them', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 4000, noNaN: true }),
        fc.double({ min: 0, max: 3000, noNaN: true }),
        fc.double({ min: 10, max: 2000, noNaN: true }),
        (cx, cy, r) => {
          const found = circleThroughThreePoints(
            onCircle(cx, cy, r, 0.2),
            onCircle(cx, cy, r, 2),
            onCircle(cx, cy, r, 4.5),
          )!
          expect(Math.hypot(found.cx - cx, found.cy - cy)).toBeLessThan(1e-8 * (r + cx + cy))
          expect(Math.abs(found.r - r)).toBeLessThan(1e-8 * (r + cx + cy))
        },
      ),
      { seed: 1 },
    )
  })

  it('are found exactly from many exact places, also on an arc only', () => {
    const found = circleThroughPoints(angles(12, 0, 1.5).map((a) => onCircle(800, 600, 480, a)))!
    expect(found.cx).toBeCloseTo(800, 6)
    expect(found.cy).toBeCloseTo(600, 6)
    expect(found.r).toBeCloseTo(480, 6)
  })

  it('fit best by distance: no neighbouring circle has a smaller sum of squares', () => {
    const places = angles(15).map((a, k) => onCircle(800, 600, 480 + [1.5, -0.7, 0.4, -1.1, 0.2][k % 5]!, a))
    const found = circleThroughPoints(places)!
    const sum = (cx: number, cy: number, r: number) =>
      places.reduce((s, [x, y]) => s + (Math.hypot(x - cx, y - cy) - r) ** 2, 0)
    const least = sum(found.cx, found.cy, found.r)
    for (const [dx, dy, dr] of [
      [0.01, 0, 0],
      [-0.01, 0, 0],
      [0, 0.01, 0],
      [0, -0.01, 0],
      [0, 0, 0.01],
      [0, 0, -0.01],
    ] as const)
      expect(sum(found.cx + dx, found.cy + dy, found.r + dr)).toBeGreaterThan(least)
  })

  it('are not to be had from two places, or from a line', () => {
    const line: PointPx[] = [0, 1, 2, 3, 4].map((k) => [10 * k, 5 * k])
    expect(circleThroughPoints(line.slice(0, 2))).toBeNull()
    expect(circleThroughPoints(line.slice(0, 3))).toBeNull()
    expect(circleThroughPoints(line)).toBeNull()
  })
})

describe('ellipses through rim places', () => {
  it.each([25, -60, 0, 90, 140])('go through five of them exactly, turned by %s°', (rotationDeg) => {
    const wanted = { ...ellipse, rotationDeg }
    const found = ellipseThroughPoints([0.1, 1.2, 2.6, 3.9, 5.3].map((a) => onEllipse(wanted, a)))!
    expect(found.cx).toBeCloseTo(700, 5)
    expect(found.cy).toBeCloseTo(500, 5)
    expect(Math.max(found.rx, found.ry)).toBeCloseTo(400, 5)
    expect(Math.min(found.rx, found.ry)).toBeCloseTo(250, 5)
    const major = found.rotationDeg + (found.rx >= found.ry ? 0 : 90)
    expect(Math.sin(((major - rotationDeg) * Math.PI) / 180)).toBeCloseTo(0, 8)
  })

  it('fit many places that lie a pixel off to a pixel', () => {
    const places = angles(40).map((a, k) => onEllipse(ellipse, a, k % 2 === 0 ? 1 : -1))
    const found = ellipseThroughPoints(places)!
    expect(Math.hypot(found.cx - 700, found.cy - 500)).toBeLessThan(0.2)
    expect(Math.abs(Math.max(found.rx, found.ry) - 400)).toBeLessThan(0.5)
    expect(Math.abs(Math.min(found.rx, found.ry) - 250)).toBeLessThan(0.5)
  })

  it('are not to be had from four places, a line, or a hyperbola', () => {
    const four = [0, 1, 2, 3].map((a) => onEllipse(ellipse, a))
    const hyperbola: PointPx[] = [-2, -1, 0, 1, 2].map((t) => [100 * Math.cosh(t), 100 * Math.sinh(t)])
    hyperbola[4] = [-100 * Math.cosh(1), 100 * Math.sinh(1)]
    expect(ellipseThroughPoints(four)).toBeNull()
    expect(ellipseThroughPoints([0, 1, 2, 3, 4, 5].map((k): PointPx => [10 * k, 20 * k]))).toBeNull()
    expect(ellipseThroughPoints(hyperbola)).toBeNull()
  })
})

describe('insides and areas', () => {
  it('an ellipse holds what lies within its rim', () => {
    for (const a of angles(16)) {
      expect(isInside(ellipse, ...onEllipse(ellipse, a, -0.1))).toBe(true)
      expect(isInside(ellipse, ...onEllipse(ellipse, a, 0.1))).toBe(false)
    }
  })

  it('a circle holds its rim', () => {
    expect(isInside({ kind: 'circle', cx: 0, cy: 0, r: 5 }, 3, 4)).toBe(true)
    expect(isInside({ kind: 'circle', cx: 0, cy: 0, r: 5 }, 3, 4.001)).toBe(false)
  })

  it('a dented polygon doesn’t hold its dent', () => {
    const dented: Polygon = {
      kind: 'polygon',
      points: [
        [0, 0],
        [10, 0],
        [10, 10],
        [5, 2],
        [0, 10],
      ],
    }
    expect(isInside(dented, 5, 1)).toBe(true)
    expect(isInside(dented, 5, 6)).toBe(false)
    expect(isInside(dented, 1, 6)).toBe(true)
  })

  it('areas are the closed ones, whichever way a polygon winds', () => {
    expect(shapeArea({ kind: 'circle', cx: 3, cy: 4, r: 2 })).toBeCloseTo(4 * Math.PI, 12)
    expect(shapeArea(ellipse)).toBeCloseTo(100_000 * Math.PI, 6)
    expect(shapeArea(square)).toBe(100)
    expect(shapeArea({ ...square, points: square.points.toReversed() })).toBe(100)
  })
})

describe('moved, turned and copied shapes', () => {
  it('a shape turned holds the places turned with it', () => {
    for (const shape of [ellipse, { kind: 'circle', cx: 700, cy: 500, r: 90 } as const, square]) {
      const turned = turnShape(shape, 100, 50, 90)
      const [x, y] = shape.kind === 'polygon' ? [2, 7] : [shape.cx + 30, shape.cy + 60]
      expect(isInside(shape, x, y)).toBe(true)
      // A quarter turn from x towards y about (100, 50).
      expect(isInside(turned, 100 - (y - 50), 50 + (x - 100))).toBe(true)
      expect(shapeArea(turned)).toBeCloseTo(shapeArea(shape), 6)
    }
  })

  it('a shape moved keeps its form', () => {
    expect(moveShape(ellipse, 3, -4)).toEqual({ ...ellipse, cx: 703, cy: 496 })
    expect(
      moveShape(
        {
          kind: 'polygon',
          points: [
            [0, 0],
            [1, 0],
            [0, 1],
          ],
        },
        3,
        -4,
      ),
    ).toEqual({
      kind: 'polygon',
      points: [
        [3, -4],
        [4, -4],
        [3, -3],
      ],
    })
  })

  it('copies stand evenly round their centre, the drawn one first', () => {
    const shape = { kind: 'circle', cx: 110, cy: 50, r: 4 } as const
    const copies = copiesOf({ shape, copies: { count: 4, cx: 100, cy: 50 } })
    const places = copies.map((s) => (s.kind === 'circle' ? [s.cx, s.cy] : []))
    expect(places).toEqual(
      [
        [110, 50],
        [100, 60],
        [90, 50],
        [100, 40],
      ].map((p) => p.map((v) => expect.closeTo(v, 9))),
    )
    expect(copiesOf({ shape, copies: null })).toEqual([shape])
  })
})
