import { describe, expect, it } from 'vitest'
import { heightUm } from './height'
import { pairTruthOf } from './pair-truth'
import { randomPair } from './random-pair'
import { type Family, families, randomScene } from './random-scenes'
import { plainScene, type Scene } from './scene'
import { truthOf } from './truth'

function cap(): Scene {
  const scene = plainScene('cap', 1)
  scene.form = { ...scene.form, powerUm: -0.5 }
  return scene
}

describe('true figures', () => {
  it('of a spherical cap are those of the closed form', () => {
    const truth = truthOf(cap())
    const dropUm = 2 * 0.5 * (19.2 / 20) ** 2
    expect(truth.leastSquaresUm).toBeCloseTo(dropUm, 4)
    expect(truth.minimumZoneUm).toBeCloseTo(dropUm, 4)
    expect(truth.peakUm).toBeCloseTo(dropUm / 2, 3)
    expect(truth.rmsUm).toBeCloseTo(dropUm / Math.sqrt(12), 4)
    expect(truth.sagittaUm).toBeCloseTo(1, 6)
    expect(truth.convex).toBe(true)
  })

  it('of a saddle reach to the rim and lie evenly about the plane', () => {
    const scene = plainScene('saddle', 1)
    scene.form = { ...scene.form, astig0Um: 0.4, astig45Um: 0.3 }
    const truth = truthOf(scene)
    expect(truth.minimumZoneUm).toBeCloseTo((19.2 / 20) ** 2, 5)
    expect(truth.peakUm).toBeCloseTo(truth.valleyUm, 5)
  })

  it('are larger bands where the camera looks from the side', () => {
    const scene = cap()
    scene.camera = { ...scene.camera, viewingAngleDeg: 60 }
    expect(truthOf(scene).bandUm).toBeCloseTo(2 * truthOf(cap()).bandUm, 9)
    expect(truthOf(scene).minimumZoneUm).toBe(truthOf(cap()).minimumZoneUm)
  })

  it('count the area of the face less edge band and bore', () => {
    const scene = plainScene('ring', 1)
    scene.face = { ...scene.face, shape: 'annulus', boreMm: 10 }
    expect(truthOf(scene).areaMm2).toBeCloseTo(Math.PI * (19.2 ** 2 - 5.8 ** 2), -1)
  })

  it.each(families)('of a %s scene do not hang on the grid', (family: Family) => {
    const scene = randomScene(family, 11)
    const usual = truthOf(scene)
    const finer = truthOf(scene, 600)
    for (const figure of ['minimumZoneUm', 'leastSquaresUm', 'rmsUm'] as const) {
      expect(Math.abs(usual[figure] - finer[figure]) / finer.bandUm, figure).toBeLessThan(0.001)
    }
  })
})

describe('true change of a pair', () => {
  it('is nothing if lapping changed nothing', () => {
    const { before } = randomPair(3)
    const change = pairTruthOf({ before, after: { ...before, name: 'after' }, turnedDeg: 0 })
    expect(change.changePeakToValleyUm).toBeCloseTo(0, 9)
    expect(change.changeRmsUm).toBeCloseTo(0, 9)
  })

  it('sees the centre go down where a hill became flat', () => {
    const before = cap()
    const after = plainScene('after', 1)
    const change = pairTruthOf({ before, after, turnedDeg: 0 })
    expect(change.centreWentDown).toBe(true)
    expect(change.changePeakToValleyUm).toBeCloseTo((19.2 / 20) ** 2, 4)
  })
})

describe('height', () => {
  it('drops by the whole roll at the rim and by a third of it one width inwards', () => {
    const scene = plainScene('rolled', 1)
    scene.rolledRim = { ...scene.rolledRim, dropUm: 0.6, widthMm: 2 }
    expect(heightUm(scene)(20, 0)).toBeCloseTo(-0.6, 12)
    expect(heightUm(scene)(0, 18)).toBeCloseTo(-0.6 / Math.E, 12)
  })

  it('waves by the stated root mean square, the same for the same seed', () => {
    const scene = plainScene('wavy', 1)
    scene.waviness = { rmsUm: 0.03, lengthMm: 6, seed: 8 }
    expect(truthOf(scene).rmsUm).toBeGreaterThan(0.02)
    expect(truthOf(scene).rmsUm).toBeLessThan(0.035)
    expect(heightUm(scene)(3.3, -4.4)).toBe(heightUm({ ...scene, seed: 99 })(3.3, -4.4))
  })
})
