import { z } from 'zod'
import { equipmentDetailsSchema } from './equipment'
import { marksSchema } from './marks'
import { faceSchema } from './parts'
import { conditionsSchema, setUpSchema } from './readings'
import { figureSchema, verdictSchema } from './results'

export const certificateStateSchema = z.enum(['issued', 'withdrawn', 'replaced'])
export type CertificateState = z.infer<typeof certificateStateSchema>

const signerSchema = z.object({ name: z.string(), at: z.string() })

/** Equipment as it stood on the day of issue. */
export const certifiedEquipmentSchema = z.object({
  name: z.string(),
  details: equipmentDetailsSchema,
  calibration: z
    .object({
      laboratory: z.string(),
      certificateNumber: z.string(),
      calibratedOn: z.string().nullable(),
      dueOn: z.string().nullable(),
    })
    .nullable(),
})
export type CertifiedEquipment = z.infer<typeof certifiedEquipmentSchema>

/** Everything that a certificate says, as data: the page is drawn from this alone and the photograph's file. */
export const certificateSnapshotSchema = z.object({
  number: z.string(),
  /** Typed or scanned to see whether the certificate still stands; groups of four, parted by hyphens. */
  checkCode: z.string(),
  /** Address of the check page with the code. */
  checkUrl: z.string(),
  /** Number of the certificate that this one replaces. */
  replaces: z.string().nullable(),
  shop: z.object({ name: z.string(), address: z.string(), email: z.string() }),
  issuedTo: z.object({ name: z.string(), address: z.string() }),
  part: z.object({ number: z.string(), revision: z.string(), name: z.string(), material: z.string() }),
  piece: z.object({ serial: z.string(), lotNumber: z.string().nullable(), order: z.string().nullable() }),
  face: faceSchema,
  readingNumber: z.number().int(),
  /** In the shop's words: when the piece came and how it looked. Empty when nobody says. */
  received: z.string(),
  figure: figureSchema.omit({ residuals: true, bandReadings: true, findings: true }),
  /** By the face's reference. */
  flatnessUm: z.number(),
  verdict: verdictSchema,
  guardBandUm: z.number().nullable(),
  photo: z.object({ sha256: z.string(), widthPx: z.number().int(), heightPx: z.number().int() }),
  marks: marksSchema,
  setUp: setUpSchema,
  /** What the engine took: in air, and off the normal. */
  wavelengthNm: z.number(),
  viewingAngleDeg: z.number(),
  conditions: conditionsSchema,
  equipment: z.array(certifiedEquipmentSchema),
  /** Why leave-outs or edge band differ from the drawing's; null when they don't. */
  departureReason: z.string().nullable(),
  /** The shop's own procedure, such as "LP 12, flatness by optical flat"; empty when it names none. */
  procedure: z.string(),
  engineVersion: z.string(),
  measured: signerSchema,
  agreed: signerSchema,
  issued: signerSchema,
  /** Taken, agreed and issued by fewer than three people, as the administrator allows. */
  onePersonShop: z.boolean(),
})
export type CertificateSnapshot = z.infer<typeof certificateSnapshotSchema>
