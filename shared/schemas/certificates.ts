import { z } from 'zod'
import { equipmentDetailsSchema } from './equipment'
import { marksSchema } from './marks'
import { faceSchema } from './parts'
import { conditionsSchema, setUpSchema } from './readings'
import { figureSchema, verdictSchema } from './results'

/** What the QA person gives to issue a certificate of an agreed reading. */
export const issueCertificateSchema = z.object({
  password: z.string().min(1, 'certificate.password.missing').max(200),
  received: z.string().trim().max(120).default(''),
  /** The certificate that this one replaces. */
  replacesId: z.string().nullable().default(null),
})
export type IssueCertificate = z.infer<typeof issueCertificateSchema>
export const withdrawCertificateSchema = z.object({
  password: z.string().min(1, 'certificate.password.missing').max(200),
  reason: z.string().trim().min(1, 'certificate.reason.missing').max(500),
})
export type WithdrawCertificate = z.infer<typeof withdrawCertificateSchema>

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

/** A certificate in a list. */
export const certificateRowSchema = z.object({
  id: z.string(),
  number: z.string(),
  state: certificateStateSchema,
  pieceId: z.string(),
  readingId: z.string(),
  faceId: z.string(),
  partNumber: z.string(),
  partName: z.string(),
  serial: z.string(),
  lotNumber: z.string().nullable(),
  customerName: z.string(),
  flatnessUm: z.number(),
  expandedUncertaintyUm: z.number(),
  bandUm: z.number(),
  verdict: verdictSchema,
  issuedBy: z.object({ id: z.string(), name: z.string() }),
  issuedAt: z.string(),
  endedAt: z.string().nullable(),
  withdrawalReason: z.string().nullable(),
})
export type CertificateRow = z.infer<typeof certificateRowSchema>

export const certificateSchema = certificateRowSchema.extend({
  checkCode: z.string(),
  checkUrl: z.string(),
  pdfSha256: z.string(),
  endedBy: z.object({ id: z.string(), name: z.string() }).nullable(),
  replaces: z.object({ id: z.string(), number: z.string() }).nullable(),
  replacedBy: z.object({ id: z.string(), number: z.string() }).nullable(),
})
export type Certificate = z.infer<typeof certificateSchema>

export const certificateListQuerySchema = z.object({
  state: certificateStateSchema.optional(),
  pieceId: z.string().max(40).optional(),
  search: z.string().max(100).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
  before: z.string().max(200).optional(),
})
export type CertificateListQuery = z.infer<typeof certificateListQuerySchema>
export const certificateListSchema = z.object({
  rows: z.array(certificateRowSchema),
  next: z.string().nullable(),
  total: z.number().int(),
})

export type CertificateList = z.infer<typeof certificateListSchema>

/** What the public check page says: enough to compare with the paper, nothing more. */
export const certificateCheckSchema = z.object({
  state: certificateStateSchema,
  number: z.string(),
  replacedBy: z.string().nullable(),
  shopName: z.string(),
  partNumber: z.string(),
  partName: z.string(),
  serial: z.string(),
  flatnessUm: z.number(),
  expandedUncertaintyUm: z.number(),
  verdict: verdictSchema,
  issuedAt: z.string(),
  endedAt: z.string().nullable(),
  pdfSha256: z.string(),
})
export type CertificateCheck = z.infer<typeof certificateCheckSchema>
