import { emptyMarks, type Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { describe, expect, it } from 'vitest'
import { findProblems } from './problems'
import { uprightBands } from './tools/at-the-table.fixture'

const problemsOf = (marks: Partial<Marks>) => findProblems({ ...emptyMarks(), ...marks })
const codes = (marks: Partial<Marks>) => problemsOf(marks).map(({ code }) => code)
const line = (id: string, order: number | null, ...points: PointPx[]) => ({ id, order, points })

describe('mistakes in the marks', () => {
  it('finds nothing wrong with bands in order', () => {
    expect(codes({ traces: uprightBands([10, 1], [30, 2], [50, 3], [70, 4]) })).toEqual([])
  })

  it('says where two bands cross', () => {
    const traces = [line('a', 1, [0, 0], [100, 100]), line('b', 2, [0, 100], [100, 0])]
    const [problem] = problemsOf({ traces })
    expect(problem).toMatchObject({
      code: 'bandsCross',
      params: { first: 1, second: 2 },
      traceIds: ['a', 'b'],
    })
    expect(problem.place[0]).toBeCloseTo(50)
    expect(problem.place[1]).toBeCloseTo(50)
  })

  it('lets pieces of one band touch', () => {
    const traces = [line('a', 1, [0, 0], [50, 50]), line('b', 1, [50, 50], [100, 100])]
    expect(codes({ traces })).toEqual([])
  })

  it('says where neighbours differ by more than one with nothing between them', () => {
    const found = problemsOf({ traces: uprightBands([10, 1], [30, 2], [50, 4], [70, 5], [90, 6]) })
    expect(found.map(({ code }) => code)).toEqual(['neighboursDiffer'])
    expect(found[0].params).toMatchObject({ first: 2, second: 4 })
    expect(found[0].place[0]).toBeCloseTo(40)
  })

  it('takes a wide gap for bands that were left out', () => {
    expect(codes({ traces: uprightBands([10, 1], [30, 2], [72, 4], [92, 5]) })).toEqual([])
  })

  it('says nothing across a leave-out', () => {
    const slot = {
      kind: 'polygon' as const,
      points: [
        [35, -10],
        [45, -10],
        [45, 110],
        [35, 110],
      ] as PointPx[],
    }
    const leaveOuts = [{ id: 'slot', shape: slot, copies: null }]
    expect(codes({ leaveOuts, traces: uprightBands([10, 1], [30, 2], [50, 4], [70, 5]) })).toEqual([])
  })

  it('names bands without a number, at their middle', () => {
    const found = problemsOf({ traces: uprightBands([10, 1], 30) })
    expect(found).toEqual([{ code: 'noNumber', params: {}, place: [30, 50], traceIds: ['band-1'] }])
  })

  it('says where a band leaves the face, but forgives a trembling hand', () => {
    const outline = { kind: 'circle', cx: 50, cy: 50, r: 50 } as const
    expect(codes({ outline, traces: [line('a', 1, [50, 50], [50, -5])] })).toEqual([])
    const [problem] = problemsOf({ outline, traces: [line('a', 1, [50, 50], [50, -20])] })
    expect(problem).toMatchObject({ code: 'outsideFace', place: [50, -20] })
  })

  it('says where a band runs into a leave-out and its copies', () => {
    const shape = { kind: 'circle', cx: 80, cy: 50, r: 15 } as const
    const leaveOuts = [{ id: 'port', shape, copies: { count: 2, cx: 50, cy: 50 } }]
    expect(codes({ leaveOuts, traces: [line('a', 1, [20, 50], [50, 50])] })).toEqual(['insideLeaveOut'])
  })
})
