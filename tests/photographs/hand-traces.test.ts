import { describe, expect, it } from 'vitest'
import { bandResidual } from './dark-bands'
import { handTraces } from './hand-traces'
import { randomScene } from './random-scenes'
import { plainScene } from './scene'

describe('hand traces', () => {
  it('are the same for the same seed and others for another', () => {
    const scene = randomScene('few-bands', 2)
    expect(handTraces(scene, 5)).toEqual(handTraces(scene, 5))
    expect(handTraces(scene, 5)).not.toEqual(handTraces(scene, 6))
  })

  it('lie exactly on the bands without click noise', () => {
    const scene = randomScene('bumps', 2)
    const residual = bandResidual(scene)
    const points = handTraces(scene, 1, 0).flatMap((trace) => trace.points)
    for (const point of points) expect(Math.abs(residual(...point))).toBeLessThan(1e-6)
  })

  it('stray by 0.7 px square to the band', () => {
    const scene = plainScene('straight', 1)
    const pxPerBand = 984 / scene.wedge.bandsAcross
    const points = handTraces(scene, 9).flatMap((trace) => trace.points)
    const strays = points.map((point) => pxPerBand * bandResidual(scene)(...point))
    const deviation = Math.sqrt(strays.reduce((sum, stray) => sum + stray * stray, 0) / strays.length)
    expect(deviation).toBeGreaterThan(0.6)
    expect(deviation).toBeLessThan(0.8)
  })

  it('click about every 20 px and leave out pieces too short for three clicks', () => {
    for (const { points } of handTraces(randomScene('grooved', 4), 1, 0)) {
      const lengths = points.slice(1).map(([x, y], i) => Math.hypot(x - points[i][0], y - points[i][1]))
      expect(points.length).toBeGreaterThanOrEqual(3)
      expect(Math.max(...lengths)).toBeLessThan(40)
    }
  })
})
