import { describe, expect, it } from 'vitest'
import { readStraightedge } from './straightedge-reading'

describe('the straightedge’s reading', () => {
  it('is bow over spacing', () => {
    const read = readStraightedge({ from: [0, 0], to: [100, 0], bowAt: [50, 12], nextBandAt: [50, 52] })
    expect(read).toEqual({ bowPx: 12, spacingPx: 40, bands: 0.3 })
  })

  it('is the same whichever way the chord lies and on whichever side the next band is', () => {
    const read = readStraightedge({ from: [0, 100], to: [0, 0], bowAt: [-12, 50], nextBandAt: [28, 60] })
    expect(read?.bands).toBeCloseTo(0.3)
  })

  it('is none without a chord or a spacing', () => {
    expect(readStraightedge({ from: [1, 1], to: [1, 1], bowAt: [5, 5], nextBandAt: [9, 9] })).toBeNull()
    expect(readStraightedge({ from: [0, 0], to: [9, 0], bowAt: [4, 5], nextBandAt: [6, 5] })).toBeNull()
  })
})
