import { z } from 'zod'

const line = (max: number) => z.string().trim().max(max)
/** Calendar day, ISO 8601. */
export const daySchema = z.string().regex(/^\d{4}-\d{2}-\d{2}$/, 'day.invalid')

export const lightSourceDetailsSchema = z.object({
  kind: z.literal('lightSource'),
  /** In air, nm. */
  wavelengthNm: z.number().min(300).max(1100),
  /** Relative standard uncertainty; null when nobody states one. */
  relativeU: z.number().positive().max(0.2).nullable(),
  lamp: z.enum(['laser', 'mercury', 'sodium', 'helium', 'led', 'other']),
})
export const referenceFlatDetailsSchema = z.object({
  kind: z.literal('referenceFlat'),
  diameterMm: z.number().positive().max(2000),
  /** Certified peak-to-valley, µm; null when there is no certificate. */
  formUm: z.number().positive().max(10).nullable(),
  expandedUUm: z.number().positive().max(10).nullable(),
})
export const cameraSetUpDetailsSchema = z.object({
  kind: z.literal('cameraSetUp'),
  viewingAngleDeg: z.number().min(0).max(75),
  viewingAngleUDeg: z.number().min(0).max(20).nullable(),
  /** Camera to face; null when not known. */
  distanceMm: z.number().positive().max(20_000).nullable(),
  mirrored: z.boolean(),
})
export const thermometerDetailsSchema = z.object({
  kind: z.literal('thermometer'),
  uC: z.number().positive().max(5).nullable(),
})
export const equipmentDetailsSchema = z.discriminatedUnion('kind', [
  lightSourceDetailsSchema,
  referenceFlatDetailsSchema,
  cameraSetUpDetailsSchema,
  thermometerDetailsSchema,
])
export type EquipmentDetails = z.infer<typeof equipmentDetailsSchema>
export type EquipmentKind = EquipmentDetails['kind']

export const newEquipmentSchema = z.object({
  name: line(60).min(1, 'equipment.name.missing'),
  description: line(200).default(''),
  details: equipmentDetailsSchema,
  inService: z.boolean().default(true),
  calibration: z
    .object({
      laboratory: line(120),
      certificateNumber: line(80),
      calibratedOn: daySchema.nullable(),
      dueOn: daySchema.nullable(),
    })
    .nullable()
    .default(null),
})
export type NewEquipment = z.infer<typeof newEquipmentSchema>
export const equipmentSchema = newEquipmentSchema.extend({ id: z.string() })
export type Equipment = z.infer<typeof equipmentSchema>
