import type { NewEquipment } from '@shared/schemas/equipment'

const certificate = (laboratory: string, certificateNumber: string, calibratedOn: string, dueOn: string) => ({
  laboratory,
  certificateNumber,
  calibratedOn,
  dueOn,
})

/** What the demo shop measures with. */
export const demoEquipment: NewEquipment[] = [
  {
    name: 'Sodium lamp 1',
    description: 'Monochromatic lamp over the lapping bench',
    details: { kind: 'lightSource', wavelengthNm: 589.3, relativeU: 0.0005, lamp: 'sodium' },
    inService: true,
    calibration: null,
  },
  {
    name: 'Helium lamp 2',
    description: 'Standby lamp of the inspection room',
    details: { kind: 'lightSource', wavelengthNm: 587.6, relativeU: 0.0001, lamp: 'helium' },
    inService: true,
    calibration: null,
  },
  {
    name: 'Flat QF-100',
    description: 'Fused silica flat, 100 mm',
    details: { kind: 'referenceFlat', diameterMm: 100, formUm: 0.03, expandedUUm: 0.02 },
    inService: true,
    calibration: certificate('Harrowfield Metrology', 'HM-26-0417', '2026-02-10', '2027-02-10'),
  },
  {
    name: 'Bench camera',
    description: 'Camera on the column, looking straight down',
    details: {
      kind: 'cameraSetUp',
      viewingAngleDeg: 0,
      viewingAngleUDeg: 1,
      distanceMm: 600,
      mirrored: false,
    },
    inService: true,
    calibration: null,
  },
  {
    name: 'Thermometer T3',
    description: 'Contact thermometer of the inspection room',
    details: { kind: 'thermometer', uC: 0.1 },
    inService: true,
    calibration: certificate('Harrowfield Metrology', 'HM-26-0512', '2026-03-02', '2027-03-02'),
  },
]
