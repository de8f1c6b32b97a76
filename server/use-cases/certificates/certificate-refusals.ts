import { and, eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { Connection } from '../../db/client'
import { certificates } from '../../db/schema/certificates'
import { readings } from '../../db/schema/readings'
import { readSettings } from '../../db/settings'
import { AppError, notFound } from '../../errors'
import { type ReadingRecord, requireReading } from '../readings/reading-record'
import { selectFaceReadings } from '../reviews/face-readings'

export type CertificateRecord = typeof certificates.$inferSelect

export function requireCertificate(db: Connection, id: string): CertificateRecord {
  const record = db.select().from(certificates).where(eq(certificates.id, id)).get()
  if (!record) throw notFound('certificate')
  return record
}

/** Refuses, with what to do, unless the actor may issue a certificate of the reading as it stands. */
export function assertCertifiable(
  db: Connection,
  actor: Actor,
  reading: ReadingRecord,
  replaced: CertificateRecord | null,
): void {
  assertApart(db, actor, reading)
  if (replaced && replaced.state !== 'issued') throw new AppError('certificateEnded')
  if (replaced && !isOfFace(db, replaced, reading)) throw notFound('certificate')
  if (reading.state !== 'agreed' && reading.state !== 'certified') {
    throw new AppError('notAgreed', { details: { state: reading.state } })
  }
  assertAlone(db, reading)
  const standing = standingCertificate(db, reading)
  if (standing && standing.id !== replaced?.id) throw new AppError('alreadyCertified')
}

/** Taking, agreeing and certifying are three people's work, save in a one-person shop. */
function assertApart(db: Connection, actor: Actor, reading: ReadingRecord): void {
  if (readSettings(db).onePersonShop) return
  if (reading.takenById === actor.id) throw new AppError('ownReading')
  if (reading.agreedById === actor.id) throw new AppError('agreedAlone')
}

type FaceOfPiece = Pick<ReadingRecord, 'pieceId' | 'faceId'>

function isOfFace(
  db: Connection,
  { readingId }: CertificateRecord,
  { pieceId, faceId }: FaceOfPiece,
): boolean {
  const certified = requireReading(db, readingId)
  return certified.pieceId === pieceId && certified.faceId === faceId
}

/** A face of a piece has one certificate that stands at the most, of whichever reading. */
function standingCertificate(db: Connection, { pieceId, faceId }: FaceOfPiece): { id: string } | undefined {
  return db
    .select({ id: certificates.id })
    .from(certificates)
    .innerJoin(readings, eq(readings.id, certificates.readingId))
    .where(
      and(eq(certificates.pieceId, pieceId), eq(readings.faceId, faceId), eq(certificates.state, 'issued')),
    )
    .get()
}

/** Nobody reads again until it passes: every reading that counts must say what this one says. */
function assertAlone(db: Connection, reading: ReadingRecord): void {
  const counting = selectFaceReadings(db, reading).filter(({ counts }) => counts)
  const own = counting.find(({ id }) => id === reading.id)
  if (!own) throw new AppError('countsNoMore')
  const other = counting.find(
    ({ id, state, result }) =>
      id !== reading.id &&
      (state === 'sentForReview' || state === 'agreed' || state === 'certified') &&
      result?.verdict !== own.result?.verdict,
  )
  if (other) {
    throw new AppError('readingsDisagree', {
      say: { key: 'readingsDisagree', params: { number: other.number } },
    })
  }
}
