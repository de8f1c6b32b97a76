import { describe, expect, it } from 'vitest'
import { emptyMarks, type LeaveOut } from '../schemas/marks'
import type { FaceTemplate } from '../schemas/parts'
import { departuresFromFace, shareLeftOut } from './template-departures'

const outline = { kind: 'circle', cx: 500, cy: 500, r: 400 } as const
const bore = (r: number): LeaveOut => ({
  id: 'bore',
  shape: { kind: 'circle', cx: 500, cy: 500, r },
  copies: null,
})
const template: FaceTemplate = { outline, leaveOuts: [bore(200)] }
const marks = { ...emptyMarks(1), outline, leaveOuts: [bore(200)] }

describe('the share that is left out', () => {
  it('is the area of the leave-outs over the face’s', () => {
    expect(shareLeftOut(marks)).toBeCloseTo(0.25, 12)
  })

  it('counts every copy', () => {
    const hole = { ...bore(40), copies: { count: 5, cx: 500, cy: 500 } }
    expect(shareLeftOut({ outline, leaveOuts: [hole] })).toBeCloseTo(0.05, 12)
  })

  it('is unknown without an outline, or with one of no area', () => {
    expect(shareLeftOut({ outline: null, leaveOuts: [] })).toBeNull()
    expect(shareLeftOut({ outline: { ...outline, r: 0 }, leaveOuts: [] })).toBeNull()
  })
})

describe('marks beside the face as it is kept', () => {
  it('do not depart by a hand’s placing, in whatever size the photograph is', () => {
    expect(departuresFromFace({ edgeBandMm: 1, template }, marks)).toEqual([])
    const half = {
      ...marks,
      outline: { ...outline, r: 200 },
      leaveOuts: [bore(101)],
    }
    expect(departuresFromFace({ edgeBandMm: 1, template }, half)).toEqual([])
  })

  it('depart by another edge band and by other leave-outs', () => {
    expect(departuresFromFace({ edgeBandMm: 0.5, template }, marks)).toEqual(['edgeBand'])
    const more = { ...marks, leaveOuts: [bore(200), { ...bore(80), id: 'chip' }] }
    expect(departuresFromFace({ edgeBandMm: 0.5, template }, more)).toEqual(['edgeBand', 'leaveOuts'])
  })

  it('can’t depart in leave-outs from a face that has no template', () => {
    expect(departuresFromFace({ edgeBandMm: 1, template: null }, marks)).toEqual([])
  })
})
