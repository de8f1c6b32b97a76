import { describe, expect, it } from 'vitest'
import { meanRows, meanValues, runsOfClicks } from './click-runs'

describe('runs of clicks', () => {
  it('hold no more than the longest, and none crosses from one trace to the next', () => {
    const runs = runsOfClicks([0, 0, 0, 0, 0, 0, 0, 1, 1, 2], 10, 3)
    expect([...runs.starts]).toEqual([0, 2, 5, 7, 9, 10])
    expect(runs.count).toBe(5)
  })

  it('are the clicks themselves when the longest is one', () => {
    expect([...runsOfClicks([0, 0, 1], 3, 1).starts]).toEqual([0, 1, 2, 3])
  })

  it('are none when there are no clicks', () => {
    expect(runsOfClicks([], 0, 3)).toEqual({ count: 0, starts: Int32Array.of(0) })
  })

  it('weigh what their clicks weigh and average by those weights', () => {
    const runs = runsOfClicks([0, 0, 1], 3, 2)
    const { design, rowWeight } = meanRows(runs, Float64Array.of(1, 2, 5, 6, 7, 8), 2, [3, 1, 2])
    expect([...rowWeight]).toEqual([4, 2])
    expect([...design]).toEqual([2, 3, 7, 8])
    expect([...meanValues(runs, [4, 8, 9], [3, 1, 2])]).toEqual([5, 9])
  })

  it('say nothing when all their clicks are set aside', () => {
    const runs = runsOfClicks([0, 0], 2, 2)
    const { design, rowWeight } = meanRows(runs, Float64Array.of(1, 2), 1, [0, 0])
    expect([...design, ...rowWeight, ...meanValues(runs, [1, 2], [0, 0])]).toEqual([0, 0, 0])
  })
})
