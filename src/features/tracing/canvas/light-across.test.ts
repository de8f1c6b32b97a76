import { describe, expect, it } from 'vitest'
import { acrossBands, lightAcross, type Patch } from './light-across'

/** A dark band through the middle, square to the given direction. */
function bandPatch(angleDeg: number, size = 61): Patch {
  const angle = (angleDeg * Math.PI) / 180
  const middle = (size - 1) / 2
  const grey = new Float32Array(size * size)
  for (let y = 0; y < size; y += 1) {
    for (let x = 0; x < size; x += 1) {
      const s = (x - middle) * Math.cos(angle) + (y - middle) * Math.sin(angle)
      grey[y * size + x] = 128 - 100 * Math.cos((2 * Math.PI * s) / 30)
    }
  }
  return { size, grey }
}

describe('light across a band', () => {
  it('finds the direction across, whichever way the band runs', () => {
    for (const angleDeg of [-60, -20, 0, 35, 80]) {
      expect((acrossBands(bandPatch(angleDeg)) * 180) / Math.PI).toBeCloseTo(angleDeg, 0)
    }
  })

  it('is darkest in the middle of a dark band', () => {
    const light = lightAcross(bandPatch(35), (35 * Math.PI) / 180, 15)
    expect(light.indexOf(Math.min(...light))).toBe(30)
    expect(light[0]).toBeGreaterThan(200)
  })
})
