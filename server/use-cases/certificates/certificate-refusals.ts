import { and, eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { Connection } from '../../db/client'
import { certificates } from '../../db/schema/certificates'
import { readSettings } from '../../db/settings'
import { AppError, notFound } from '../../errors'
import type { ReadingRecord } from '../readings/reading-record'
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
  if (replaced && replaced.pieceId !== reading.pieceId) throw notFound('certificate')
  if (reading.state !== 'agreed' && reading.state !== 'certified') {
    throw new AppError('notAgreed', { details: { state: reading.state } })
  }
  const standing = standingCertificate(db, reading.id)
  if (standing && standing.id !== replaced?.id) throw new AppError('alreadyCertified')
  assertAlone(db, reading)
}

/** Taking, agreeing and certifying are three people's work, save in a one-person shop. */
function assertApart(db: Connection, actor: Actor, reading: ReadingRecord): void {
  if (readSettings(db).onePersonShop) return
  if (reading.takenById === actor.id) throw new AppError('ownReading')
  if (reading.agreedById === actor.id) throw new AppError('agreedAlone')
}

function standingCertificate(db: Connection, readingId: string): { id: string } | undefined {
  return db
    .select({ id: certificates.id })
    .from(certificates)
    .where(and(eq(certificates.readingId, readingId), eq(certificates.state, 'issued')))
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
