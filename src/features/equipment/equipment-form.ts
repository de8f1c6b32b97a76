import { type Equipment, type EquipmentKind, newEquipmentSchema } from '@shared/schemas/equipment'
import type { TypedHeight } from '@shared/schemas/parts'
import { candidateResolver } from '@/lib/candidate-resolver'

type Lamp = 'laser' | 'mercury' | 'sodium' | 'helium' | 'led' | 'other'

/** Equipment as its form has it: the fields of every kind side by side. */
export interface EquipmentForm {
  name: string
  description: string
  inService: boolean
  wavelengthNm: number | null
  /** As people state it; kept as a share of 1. */
  relativeUPercent: number | null
  lamp: Lamp
  diameterMm: number | null
  formUm: TypedHeight | null
  expandedUUm: TypedHeight | null
  viewingAngleDeg: number | null
  viewingAngleUDeg: number | null
  distanceMm: number | null
  mirrored: boolean
  uC: number | null
  calibrated: boolean
  laboratory: string
  certificateNumber: string
  calibratedOn: string
  dueOn: string
}

const blank: EquipmentForm = {
  name: '',
  description: '',
  inService: true,
  wavelengthNm: null,
  relativeUPercent: null,
  lamp: 'sodium',
  diameterMm: null,
  formUm: null,
  expandedUUm: null,
  viewingAngleDeg: 0,
  viewingAngleUDeg: null,
  distanceMm: null,
  mirrored: false,
  uC: null,
  calibrated: false,
  laboratory: '',
  certificateNumber: '',
  calibratedOn: '',
  dueOn: '',
}

export function toEquipmentForm(equipment: Equipment | undefined): EquipmentForm {
  if (!equipment) return blank
  const { name, description, inService, calibration } = equipment
  return {
    ...blank,
    ...detailsOf(equipment.details),
    name,
    description,
    inService,
    calibrated: calibration !== null,
    laboratory: calibration?.laboratory ?? '',
    certificateNumber: calibration?.certificateNumber ?? '',
    calibratedOn: calibration?.calibratedOn ?? '',
    dueOn: calibration?.dueOn ?? '',
  }
}

function detailsOf(details: Equipment['details']): Partial<EquipmentForm> {
  switch (details.kind) {
    case 'lightSource': {
      const { wavelengthNm, relativeU, lamp } = details
      const percent = relativeU === null ? null : Number((relativeU * 100).toPrecision(12))
      return { wavelengthNm, lamp, relativeUPercent: percent }
    }
    case 'referenceFlat': {
      const { diameterMm, formUm, expandedUUm } = details
      return { diameterMm, formUm: typedUm(formUm), expandedUUm: typedUm(expandedUUm) }
    }
    case 'cameraSetUp': {
      const { kind: _kind, ...rest } = details
      return rest
    }
    case 'thermometer':
      return { uC: details.uC }
  }
}

function typedUm(valueUm: number | null): TypedHeight | null {
  return valueUm === null ? null : { valueUm, typed: `${valueUm} µm` }
}

export function equipmentResolver(kind: EquipmentKind) {
  return candidateResolver(newEquipmentSchema, (form: EquipmentForm) => candidateOf(form, kind), fieldOf)
}

function candidateOf(form: EquipmentForm, kind: EquipmentKind): unknown {
  const { name, description, inService, calibrated, laboratory, certificateNumber } = form
  const calibration = {
    laboratory,
    certificateNumber,
    calibratedOn: form.calibratedOn || null,
    dueOn: form.dueOn || null,
  }
  return {
    name,
    description,
    inService,
    details: detailsCandidate(form, kind),
    calibration: calibrated ? calibration : null,
  }
}

function detailsCandidate(form: EquipmentForm, kind: EquipmentKind): unknown {
  switch (kind) {
    case 'lightSource':
      return {
        kind,
        wavelengthNm: form.wavelengthNm,
        relativeU: form.relativeUPercent === null ? null : form.relativeUPercent / 100,
        lamp: form.lamp,
      }
    case 'referenceFlat':
      return {
        kind,
        diameterMm: form.diameterMm,
        formUm: form.formUm?.valueUm ?? null,
        expandedUUm: form.expandedUUm?.valueUm ?? null,
      }
    case 'cameraSetUp':
      return {
        kind,
        viewingAngleDeg: form.viewingAngleDeg,
        viewingAngleUDeg: form.viewingAngleUDeg,
        distanceMm: form.distanceMm,
        mirrored: form.mirrored,
      }
    case 'thermometer':
      return { kind, uC: form.uC }
  }
}

function fieldOf(path: string): keyof EquipmentForm {
  const last = path.split('.').at(-1) ?? ''
  if (last === 'relativeU') return 'relativeUPercent'
  return last in blank ? (last as keyof EquipmentForm) : 'name'
}
