import type { Equipment } from '@shared/schemas/equipment'
import type { Reading } from '@shared/schemas/readings'
import type { Review } from '@shared/schemas/reviews'
import { shareLeftOut } from '@shared/workflow/template-departures'

export interface EquipmentTrouble {
  kind: 'equipmentPast' | 'equipmentOut' | 'equipmentNoCalibration'
  name: string
  day: string
}

/** What is wrong with the equipment of a reading, on the day it was taken. A camera set-up needs no calibration. */
export function equipmentTroubles(reading: Reading, shelf: readonly Equipment[]): EquipmentTrouble[] {
  const { lightSourceId, referenceFlatId, cameraSetUpId, thermometerId } = reading.setUp
  const used = [lightSourceId, referenceFlatId, cameraSetUpId, thermometerId]
  const takenOn = reading.createdAt.slice(0, 10)
  return shelf
    .filter(({ id }) => used.includes(id))
    .flatMap(({ name, inService, details, calibration }): EquipmentTrouble[] => {
      if (!inService) return [{ kind: 'equipmentOut', name, day: '' }]
      const dueOn = calibration?.dueOn ?? null
      if (dueOn !== null && dueOn < takenOn) return [{ kind: 'equipmentPast', name, day: dueOn }]
      const needsOne = details.kind === 'referenceFlat' || details.kind === 'thermometer'
      return needsOne && !calibration ? [{ kind: 'equipmentNoCalibration', name, day: '' }] : []
    })
}

/** Share of the face that is left out, percent, and by how many leave-outs; null without an outline. */
export function leftOut({ marks }: Reading): { percent: number; count: number } | null {
  const share = shareLeftOut(marks)
  if (share === null) return null
  const count = marks.leaveOuts.reduce((sum, { copies }) => sum + (copies?.count ?? 1), 0)
  return { percent: Math.round(share * 100), count }
}

/** Other readings of the face that count and have left draft. */
export function othersThatCount(reading: Reading, { faceReadings }: Review): Review['faceReadings'] {
  return faceReadings.filter(
    ({ id, counts, state, result }) =>
      id !== reading.id && counts && state !== 'draft' && state !== 'sentBack' && result !== null,
  )
}
