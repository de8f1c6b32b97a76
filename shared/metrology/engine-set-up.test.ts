import { describe, expect, it } from 'vitest'
import type { EquipmentDetails } from '../schemas/equipment'
import type { Conditions, ReadingSetUp } from '../schemas/readings'
import { engineSetUp } from './engine-set-up'

const shelf: Record<string, EquipmentDetails> = {
  lamp: { kind: 'lightSource', wavelengthNm: 589.3, relativeU: 0.0005, lamp: 'sodium' },
  flat: { kind: 'referenceFlat', diameterMm: 100, formUm: 0.03, expandedUUm: 0.01 },
  camera: { kind: 'cameraSetUp', viewingAngleDeg: 12, viewingAngleUDeg: 1, distanceMm: 400, mirrored: false },
}
const find = (id: string) => shelf[id] ?? null
const setUp: ReadingSetUp = {
  lightSourceId: 'lamp',
  referenceFlatId: null,
  cameraSetUpId: null,
  thermometerId: null,
  viewingAngleDeg: null,
  viewingAngleUDeg: null,
  mirrored: false,
}
const conditions: Conditions = {
  airTemperatureC: null,
  partTemperatureC: null,
  soakMinutes: null,
  temperatureHalfWidthUm: null,
  meanGapUm: null,
  supportHalfWidthUm: null,
  edgePlacementUMm: null,
  repeats: null,
  note: '',
}

describe('the set-up as the engine has it', () => {
  it('is none without a light source, and none with something else in its place', () => {
    expect(engineSetUp({ setUp: { ...setUp, lightSourceId: null }, conditions }, find)).toBeNull()
    expect(engineSetUp({ setUp: { ...setUp, lightSourceId: 'flat' }, conditions }, find)).toBeNull()
  })

  it('leaves unsaid what nobody stated', () => {
    expect(engineSetUp({ setUp, conditions }, find)).toMatchObject({
      wavelengthNm: 589.3,
      viewingAngleDeg: 0,
      viewingAngleUDeg: null,
      edgePlacementUMm: null,
      referenceFlatFormUm: null,
      repeats: null,
      nearCamera: null,
    })
  })

  it("takes the camera set-up's angle with its own uncertainty unless one is typed", () => {
    const withCamera = { ...setUp, cameraSetUpId: 'camera' }
    expect(engineSetUp({ setUp: withCamera, conditions }, find)).toMatchObject({
      viewingAngleDeg: 12,
      viewingAngleUDeg: 1,
    })
    const typed = { ...withCamera, viewingAngleDeg: 5 }
    expect(engineSetUp({ setUp: typed, conditions }, find)).toMatchObject({
      viewingAngleDeg: 5,
      viewingAngleUDeg: null,
    })
  })

  it('hands on the stated placement of the outline and the repeats', () => {
    const stated = { ...conditions, edgePlacementUMm: 0.1, repeats: { standardDeviationUm: 0.02, count: 5 } }
    expect(engineSetUp({ setUp, conditions: stated }, find)).toMatchObject({
      edgePlacementUMm: 0.1,
      repeats: { standardDeviationUm: 0.02, count: 5 },
    })
  })

  it('counts the camera as near only where both its distance and the gap are known', () => {
    const gap = { ...conditions, meanGapUm: 20 }
    expect(engineSetUp({ setUp, conditions: gap }, find)?.nearCamera).toBeNull()
    const withCamera = { ...setUp, cameraSetUpId: 'camera' }
    expect(engineSetUp({ setUp: withCamera, conditions: gap }, find)?.nearCamera).toEqual({
      meanGapUm: 20,
      distanceMm: 400,
    })
  })
})
