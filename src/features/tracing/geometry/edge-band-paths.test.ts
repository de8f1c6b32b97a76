import { partFrame } from '@shared/geometry/part-frame'
import { emptyMarks } from '@shared/schemas/marks'
import { describe, expect, it } from 'vitest'
import { edgeBandPaths } from './edge-band-paths'

const view = { viewingAngleDeg: 0, photo: null, mirrored: false }

describe('the edge band', () => {
  it('runs within a circle and round a bore', () => {
    const outline = { kind: 'circle', cx: 100, cy: 100, r: 100 } as const
    const frame = partFrame(outline, { kind: 'round', diameterMm: 20 }, view)
    if ('problem' in frame) throw new Error('the frame should stand')
    const bore = { id: 'bore', shape: { kind: 'circle', cx: 100, cy: 100, r: 20 } as const, copies: null }
    const [inner, round] = edgeBandPaths({ ...emptyMarks(1), outline, leaveOuts: [bore] }, frame)
    for (const [x, y] of inner) expect(Math.hypot(x - 100, y - 100)).toBeCloseTo(90)
    for (const [x, y] of round) expect(Math.hypot(x - 100, y - 100)).toBeCloseTo(30)
  })

  it('moves the sides of a block inwards, whichever way its corners were clicked', () => {
    const corners: [number, number][] = [
      [0, 0],
      [200, 0],
      [200, 100],
      [0, 100],
    ]
    for (const points of [corners, [corners[1], corners[0], corners[3], corners[2]]]) {
      const outline = { kind: 'polygon' as const, points }
      const frame = partFrame(outline, { kind: 'block', widthMm: 20, heightMm: 10 }, view)
      if ('problem' in frame) throw new Error('the frame should stand')
      const [inner] = edgeBandPaths({ ...emptyMarks(1), outline }, frame)
      const xs = inner.map(([x]) => Math.round(x)).toSorted((a, b) => a - b)
      expect(xs).toEqual([10, 10, 190, 190])
    }
  })
})
