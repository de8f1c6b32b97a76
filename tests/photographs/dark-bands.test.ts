import { describe, expect, it } from 'vitest'
import { photoGeometry } from './camera'
import { bandResidual, darkBands, widening } from './dark-bands'
import { measuredArea } from './measured-area'
import { type Family, randomScene } from './random-scenes'
import { plainScene } from './scene'

const hardFamilies: readonly Family[] = ['grooved', 'tilted', 'saddle', 'dense', 'valve-plate', 'distorted']

describe('dark bands', () => {
  it.each(hardFamilies)('of a %s scene lie on whole bands of gap and on the measured area', (family) => {
    const scene = randomScene(family, 7)
    const residual = bandResidual(scene)
    const { holds } = measuredArea(scene.face)
    const { partFromPhoto } = photoGeometry(scene)
    const points = darkBands(scene).flatMap((band) => band.points)
    const strayed = points.filter((point) => Math.abs(residual(...point)) > 1e-6)
    const unmeasured = points.filter((point) => !holds(...partFromPhoto(...point)))
    expect(points.length).toBeGreaterThan(100)
    expect(strayed).toEqual([])
    expect(unmeasured).toEqual([])
  })

  it('reach the border of the measured area', () => {
    const scene = plainScene('straight', 1)
    const { partFromPhoto } = photoGeometry(scene)
    for (const { points } of darkBands(scene)) {
      const ends = [points[0], points[points.length - 1]]
      for (const end of ends) expect(Math.hypot(...partFromPhoto(...end))).toBeCloseTo(20 - 0.8, 6)
    }
  })

  it('count as many orders as the wedge has bands on the measured area', () => {
    const scene = plainScene('straight', 1)
    const orders = darkBands(scene).map(({ order }) => order)
    expect(new Set(orders).size).toBe(orders.length)
    expect(orders.length).toBe(Math.floor(12.4 + 7.2) - Math.ceil(12.4 - 7.2) + 1)
  })

  it('rise in order the way the gap widens', () => {
    const scene = randomScene('open-bands', 3)
    const [first, second] = darkBands(scene)
    const from = first.points[Math.floor(first.points.length / 2)]
    const [dx, dy] = widening(scene)(...from)
    const crossed = second.points.some(([x, y]) => (x - from[0]) * dx + (y - from[1]) * dy > 0)
    expect(second.order).toBe(first.order + 1)
    expect(crossed).toBe(true)
  })

  it('close on themselves where a hill has rings', () => {
    const scene = plainScene('rings', 1)
    scene.form = { ...scene.form, powerUm: -0.8 }
    scene.wedge = { ...scene.wedge, bandsAcross: 0 }
    const bands = darkBands(scene)
    expect(bands.length).toBeGreaterThan(3)
    for (const { closed, points } of bands) {
      expect(closed).toBe(true)
      expect(points[points.length - 1]).toEqual(points[0])
    }
  })
})
