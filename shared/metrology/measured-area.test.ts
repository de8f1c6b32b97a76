import { describe, expect, it } from 'vitest'
import { type PartFrame, partFrame } from '../geometry/part-frame'
import type { Shape } from '../schemas/shapes'
import { insetPolygon, isMeasured, mapGrid, measuredArea, measuredPlaces } from './measured-area'
import type { TracedReading } from './types'

type Face = Pick<TracedReading, 'outline' | 'size' | 'exclusions' | 'edgeBandMm'>

const disc: Face = {
  outline: { kind: 'circle', cx: 800, cy: 600, r: 480 },
  size: { kind: 'round', diameterMm: 40 },
  exclusions: [],
  edgeBandMm: 0.8,
}
const block: Face = {
  outline: {
    kind: 'polygon',
    points: [
      [100, 450],
      [1500, 450],
      [1500, 810],
      [100, 810],
    ],
  },
  size: { kind: 'block', widthMm: 35, heightMm: 9 },
  exclusions: [],
  edgeBandMm: 0.8,
}

function frameOf(face: Face, viewingAngleDeg = 0): PartFrame {
  const photo = { widthPx: 1600, heightPx: 1200 }
  const frame = partFrame(face.outline, face.size, { viewingAngleDeg, photo, mirrored: false })
  if ('problem' in frame) throw new Error(frame.problem)
  return frame
}

const areaOf = (face: Face) => measuredArea(face, frameOf(face))
const slot = (x0: number, y0: number, x1: number, y1: number): Shape => ({
  kind: 'polygon',
  points: [
    [x0, y0],
    [x1, y0],
    [x1, y1],
    [x0, y1],
  ],
})
const bore: Shape = { kind: 'circle', cx: 860, cy: 540, r: 120 }

/** Closed areas derived here; counting pixels is exact to the pixels on the rim. */
function expectArea(found: number, wanted: number): void {
  expect(Math.abs(found - wanted) / wanted).toBeLessThan(1e-3)
}

describe('the measured area', () => {
  it('of a disc is the disc less its edge band', () => {
    expectArea(areaOf(disc).areaMm2, Math.PI * 19.2 ** 2)
    expectArea(areaOf({ ...disc, edgeBandMm: 0 }).areaMm2, Math.PI * 400)
  })

  it('of a disc with a bore has the edge band round the bore as well', () => {
    // 120 px of 24 px per mm: a bore of 5 mm radius.
    expectArea(areaOf({ ...disc, exclusions: [bore] }).areaMm2, Math.PI * (19.2 ** 2 - 5.8 ** 2))
    const oval: Shape = { kind: 'ellipse', cx: 800, cy: 600, rx: 240, ry: 120, rotationDeg: 30 }
    // Steiner: an offset by d adds d · girth + π d²; Ramanujan's girth of an ellipse (from memory).
    const h = ((10 - 5) / (10 + 5)) ** 2
    const girth = Math.PI * 15 * (1 + (3 * h) / (10 + Math.sqrt(4 - 3 * h)))
    const hole = Math.PI * 50 + 0.8 * girth + Math.PI * 0.64
    expectArea(areaOf({ ...disc, exclusions: [oval] }).areaMm2, Math.PI * 19.2 ** 2 - hole)
  })

  it('of a disc seen at an angle is the same as of the disc square on', () => {
    const tilted: Face = {
      ...disc,
      outline: { kind: 'ellipse', cx: 800, cy: 580, rx: 480, ry: 416.5, rotationDeg: 20 },
    }
    expectArea(measuredArea(tilted, frameOf(tilted, 30)).areaMm2, Math.PI * 19.2 ** 2)
  })

  it('of a block is the block less its edge band on all sides, and a slot has none', () => {
    expect(Math.abs(areaOf(block).areaMm2 - 33.4 * 7.4)).toBeLessThan(0.02 * 33.4)
    const slotted = areaOf({ ...block, exclusions: [slot(699.5, 599.5, 899.5, 659.5)] })
    expect(areaOf(block).areaMm2 - slotted.areaMm2).toBeCloseTo(5 * 1.5, 6)
  })

  it('takes what two leave-outs share away once', () => {
    const once = areaOf({ ...disc, exclusions: [bore] }).areaMm2
    expect(areaOf({ ...disc, exclusions: [bore, bore] }).areaMm2).toBe(once)
  })

  it('is nothing where the edge band or the leave-outs take it all', () => {
    expect(areaOf({ ...disc, edgeBandMm: 20 }).areaMm2).toBe(0)
    expect(areaOf({ ...disc, exclusions: [slot(0, 0, 1600, 1200)] }).areaMm2).toBe(0)
  })

  it('counts the lands that grooves cut, largest first, and no crumbs', () => {
    expect(areaOf(disc).landPixels).toHaveLength(1)
    const groove = slot(900, 0, 930, 1200)
    const cut = areaOf({ ...disc, exclusions: [groove] })
    expect(cut.landPixels).toHaveLength(2)
    expect(cut.landPixels[0]!).toBeGreaterThan(cut.landPixels[1]!)
    expect(areaOf({ ...disc, exclusions: [groove, slot(0, 600, 1600, 620)] }).landPixels).toHaveLength(4)
    // A groove along the rim leaves a sliver under a hundredth of the face.
    expect(areaOf({ ...disc, exclusions: [slot(1240, 0, 1255, 1200)] }).landPixels).toHaveLength(1)
  })

  it('tells of every place whether it is measured', () => {
    const area = areaOf({ ...disc, exclusions: [bore] })
    expect(isMeasured(area, 800, 950)).toBe(true)
    expect(isMeasured(area, 860, 540)).toBe(false)
    expect(isMeasured(area, 860 + 135, 540)).toBe(false)
    expect(isMeasured(area, 860 + 141, 540)).toBe(true)
    expect(isMeasured(area, 800 + 465, 600)).toBe(false)
    expect(isMeasured(area, 5, 5)).toBe(false)
  })
})

describe('the places at which figures are taken', () => {
  it('stand for the whole area, the rim places for none of it', () => {
    const area = areaOf({ ...disc, exclusions: [bore] })
    const places = measuredPlaces(area)
    const sum = places.weightMm2.reduce((a, b) => a + b, 0)
    expect(Math.abs(sum - area.areaMm2) / area.areaMm2).toBeLessThan(0.01)
    expect(places.interiorCount).toBeGreaterThan(1400)
    for (let i = 0; i < places.count; i++) {
      expect(isMeasured(area, places.xPx[i]!, places.yPx[i]!)).toBe(true)
      if (i < places.interiorCount) continue
      expect(places.weightMm2[i]).toBe(0)
      const fromOutline = 19.2 - Math.hypot(places.xMm[i]!, places.yMm[i]!)
      const fromBore = Math.hypot(places.xMm[i]! - 2.5, places.yMm[i]! + 2.5) - 5.8
      expect(Math.min(fromOutline, fromBore)).toBeLessThan(0.07)
    }
  })

  it('are none where nothing is measured', () => {
    expect(measuredPlaces(areaOf({ ...disc, edgeBandMm: 20 })).count).toBe(0)
  })

  it('of the map stand evenly over the longer side', () => {
    const grid = mapGrid(areaOf(block), 48)
    expect(grid.columns).toBe(48)
    // Half a step beyond the area on either side.
    expect(grid.stepMm * 46).toBeCloseTo(33.4, 1)
    expect((grid.rows - 1) * grid.stepMm).toBeGreaterThanOrEqual(7.3)
    grid.index.forEach((cell, i) => {
      expect(grid.xMm[i]).toBeCloseTo(grid.x0Mm + (cell % grid.columns) * grid.stepMm, 9)
      expect(grid.yMm[i]).toBeCloseTo(grid.y0Mm + Math.floor(cell / grid.columns) * grid.stepMm, 9)
    })
  })
})

describe('the area under strong perspective', () => {
  it('is that of the drawing, however differently near and far are seen', () => {
    const trapezoid: Face = {
      outline: {
        kind: 'polygon',
        points: [
          [199.5, 300],
          [1399.5, 100],
          [1399.5, 1100],
          [199.5, 800],
        ],
      },
      size: { kind: 'block', widthMm: 40, heightMm: 30 },
      exclusions: [],
      edgeBandMm: 0,
    }
    expect(areaOf(trapezoid).areaMm2 / 1200).toBeCloseTo(1, 3)
  })
})

describe('the share of each cell of the map', () => {
  it('adds up to the measured area, finer than a count of cells', () => {
    const area = areaOf(disc)
    const grid = mapGrid(area)
    const areaMm2 = grid.coverage.reduce((sum, share) => sum + share, 0) * grid.stepMm ** 2
    expect(areaMm2).toBeGreaterThan(0.999 * area.areaMm2)
    expect(areaMm2).toBeLessThan(1.001 * area.areaMm2)
  })

  it('is whole inside, nothing outside, and in between at the rim only', () => {
    const grid = mapGrid(areaOf(disc))
    const rimMm = 40 / 2 - 0.8
    grid.coverage.forEach((share, cell) => {
      const x = grid.x0Mm + (cell % grid.columns) * grid.stepMm
      const y = grid.y0Mm + Math.floor(cell / grid.columns) * grid.stepMm
      const inside = rimMm - Math.hypot(x, y)
      if (inside > grid.stepMm) expect(share).toBe(1)
      if (inside < -grid.stepMm) expect(share).toBe(0)
    })
  })
})

describe('a polygon with its sides moved', () => {
  const square = [
    [0, 0],
    [10, 0],
    [10, 10],
    [0, 10],
  ] as const

  it('inwards and outwards keeps mitred corners, whichever way it winds', () => {
    const inner = insetPolygon(square, 2).map(([x, y]) => [x, y])
    expect(inner).toEqual([
      [2, 2],
      [8, 2],
      [8, 8],
      [2, 8],
    ])
    expect(insetPolygon(square.toReversed(), 2)).toEqual(insetPolygon(square, 2).toReversed())
    expect(insetPolygon(square, -1)[2]).toEqual([11, 11])
    expect(insetPolygon(square, 0)).toEqual(square)
  })

  it('leaves a dent where the sides of the dent meet', () => {
    const dented = [
      [0, 0],
      [10, 0],
      [10, 10],
      [5, 10],
      [5, 5],
      [0, 5],
    ] as const
    expect(insetPolygon(dented, 1)[4]).toEqual([6, 4])
  })
})

describe('an edge band wider than the face', () => {
  const square = [
    [0, 0],
    [10, 0],
    [10, 10],
    [0, 10],
  ] as const
  const bar = [
    [0, 0],
    [35, 0],
    [35, 9],
    [0, 9],
  ] as const

  it('leaves nothing of a polygon, however it winds', () => {
    expect(insetPolygon(square, 6)).toEqual([])
    expect(insetPolygon([...square].reverse(), 6)).toEqual([])
    expect(insetPolygon(bar, 5)).toEqual([])
    expect(insetPolygon(bar, 20)).toEqual([])
  })

  it('less wide leaves the middle', () => {
    expect(insetPolygon(square, 4)).toEqual([
      [4, 4],
      [6, 4],
      [6, 6],
      [4, 6],
    ])
  })
})
