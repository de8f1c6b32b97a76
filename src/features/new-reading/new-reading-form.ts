import type { Equipment, EquipmentKind } from '@shared/schemas/equipment'
import type { TypedHeight } from '@shared/schemas/parts'
import { newReadingSchema, type Reading } from '@shared/schemas/readings'
import { candidateResolver } from '@/lib/candidate-resolver'

/** A new reading as its form has it; '' and null are "not stated". */
export interface NewReadingForm {
  pieceId: string
  faceId: string
  correctsId: string | null
  lappedSince: boolean
  lightSourceId: string
  referenceFlatId: string
  cameraSetUpId: string
  thermometerId: string
  viewingAngleDeg: number | null
  viewingAngleUDeg: number | null
  mirrored: boolean
  airTemperatureC: number | null
  partTemperatureC: number | null
  soakMinutes: number | null
  temperatureHalfWidthUm: TypedHeight | null
  meanGapUm: TypedHeight | null
  supportHalfWidthUm: TypedHeight | null
  edgePlacementUMm: number | null
  repeatSpreadUm: TypedHeight | null
  repeatCount: number | null
  note: string
}

export const blankReading: NewReadingForm = {
  pieceId: '',
  faceId: '',
  correctsId: null,
  lappedSince: false,
  lightSourceId: '',
  referenceFlatId: '',
  cameraSetUpId: '',
  thermometerId: '',
  viewingAngleDeg: null,
  viewingAngleUDeg: null,
  mirrored: false,
  airTemperatureC: null,
  partTemperatureC: null,
  soakMinutes: null,
  temperatureHalfWidthUm: null,
  meanGapUm: null,
  supportHalfWidthUm: null,
  edgePlacementUMm: null,
  repeatSpreadUm: null,
  repeatCount: null,
  note: '',
}

/** Without a light source nothing can be computed, so its lack is said here already. */
export const newReadingResolver = candidateResolver(
  newReadingSchema.refine(({ setUp }) => setUp.lightSourceId !== null, {
    path: ['setUp', 'lightSourceId'],
    message: 'reading.lightSource.missing',
  }),
  candidateOf,
  fieldOf,
)

function candidateOf(form: NewReadingForm): unknown {
  return {
    pieceId: form.pieceId,
    faceId: form.faceId,
    correctsId: form.correctsId,
    lappedSince: form.lappedSince,
    setUp: {
      lightSourceId: form.lightSourceId || null,
      referenceFlatId: form.referenceFlatId || null,
      cameraSetUpId: form.cameraSetUpId || null,
      thermometerId: form.thermometerId || null,
      viewingAngleDeg: form.viewingAngleDeg,
      viewingAngleUDeg: form.viewingAngleUDeg,
      mirrored: form.mirrored,
    },
    conditions: {
      airTemperatureC: form.airTemperatureC,
      partTemperatureC: form.partTemperatureC,
      soakMinutes: form.soakMinutes,
      temperatureHalfWidthUm: form.temperatureHalfWidthUm?.valueUm ?? null,
      meanGapUm: form.meanGapUm?.valueUm ?? null,
      supportHalfWidthUm: form.supportHalfWidthUm?.valueUm ?? null,
      edgePlacementUMm: form.edgePlacementUMm,
      repeats: repeatsOf(form),
      note: form.note,
    },
  }
}

/** Half of a pair is sent as it is, so that what lacks is said. */
function repeatsOf({ repeatSpreadUm, repeatCount }: NewReadingForm): unknown {
  if (repeatSpreadUm === null && repeatCount === null) return null
  return { standardDeviationUm: repeatSpreadUm?.valueUm, count: repeatCount ?? undefined }
}

/** A reading's set-up and conditions as the form has them. */
export function formOf({ pieceId, face, setUp, conditions }: Reading): NewReadingForm {
  return {
    pieceId,
    faceId: face.id,
    correctsId: null,
    lappedSince: false,
    lightSourceId: setUp.lightSourceId ?? '',
    referenceFlatId: setUp.referenceFlatId ?? '',
    cameraSetUpId: setUp.cameraSetUpId ?? '',
    thermometerId: setUp.thermometerId ?? '',
    viewingAngleDeg: setUp.viewingAngleDeg,
    viewingAngleUDeg: setUp.viewingAngleUDeg,
    mirrored: setUp.mirrored,
    airTemperatureC: conditions.airTemperatureC,
    partTemperatureC: conditions.partTemperatureC,
    soakMinutes: conditions.soakMinutes,
    temperatureHalfWidthUm: typedAgain(conditions.temperatureHalfWidthUm),
    meanGapUm: typedAgain(conditions.meanGapUm),
    supportHalfWidthUm: typedAgain(conditions.supportHalfWidthUm),
    edgePlacementUMm: conditions.edgePlacementUMm,
    repeatSpreadUm: typedAgain(conditions.repeats?.standardDeviationUm ?? null),
    repeatCount: conditions.repeats?.count ?? null,
    note: conditions.note,
  }
}

function typedAgain(valueUm: number | null): TypedHeight | null {
  return valueUm === null ? null : { valueUm, typed: `${valueUm} µm` }
}

function fieldOf(path: string): keyof NewReadingForm {
  if (path.endsWith('repeats.standardDeviationUm')) return 'repeatSpreadUm'
  if (path.endsWith('repeats.count')) return 'repeatCount'
  const last = path.split('.').at(-1) ?? ''
  return last in blankReading ? (last as keyof NewReadingForm) : 'pieceId'
}

/** The field that names equipment of a kind. */
export const fieldOfKind = {
  lightSource: 'lightSourceId',
  referenceFlat: 'referenceFlatId',
  cameraSetUp: 'cameraSetUpId',
  thermometer: 'thermometerId',
} as const satisfies Record<EquipmentKind, keyof NewReadingForm>

/** What is in service, by kind. */
export function inServiceOf(rows: readonly Equipment[], kind: EquipmentKind): Equipment[] {
  return rows.filter((row) => row.inService && row.details.kind === kind)
}
