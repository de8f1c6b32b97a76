import { createHash } from 'node:crypto'
import type { Certificate, CertificateSnapshot, IssueCertificate } from '@shared/schemas/certificates'
import type { Actor } from '../../auth/actor'
import { confirmPassword } from '../../auth/confirm-password'
import type { AppContext } from '../../context'
import { type Connection, inTransaction, type Tx } from '../../db/client'
import { canonicalJson, recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { certificatePdfs, certificates } from '../../db/schema/certificates'
import { readSettings } from '../../db/settings'
import { AppError } from '../../errors'
import { type ReadingRecord, requireReading } from '../readings/reading-record'
import { moveReading } from '../reviews/move-reading'
import { assertCertifiable, type CertificateRecord, requireCertificate } from './certificate-refusals'
import { newCheckCode } from './check-code'
import { endCertificate } from './end-certificate'
import { makeSnapshot } from './make-snapshot'
import { type CertificateNumber, nextNumber } from './next-number'
import { oneAtATime } from './one-at-a-time'
import { printCertificate } from './print-certificate'
import { selectCertificate } from './select-certificates'

/** Printed anew when something that it says has changed meanwhile; so often in a row something else is wrong. */
const printings = 5

export interface IssuedFrom {
  /** Whose guesses at the password are counted. */
  address: string
  /** Where this Lapwing is reached, for the code on the page, unless the settings name another. */
  origin: string
}

interface Draft {
  number: CertificateNumber
  snapshot: CertificateSnapshot
  reading: ReadingRecord
  replaced: CertificateRecord | null
}

/**
 * A certificate of an agreed reading under the next number. The page is printed first; then, in one transaction, all
 * that it says is read again, and the certificate, its page, the reading's state and the events are written together.
 */
export async function issueCertificate(
  context: AppContext,
  actor: Actor,
  readingId: string,
  input: IssueCertificate,
  from: IssuedFrom,
): Promise<Certificate> {
  const { password } = input
  await confirmPassword(context, actor, { password, address: from.address, field: 'password' })
  const { db, now } = context
  return oneAtATime(db, async () => {
    const checkCode = newCheckCode()
    for (let printing = 0; printing < printings; printing++) {
      const at = now()
      const draw = (from_: Connection) =>
        draftCertificate(from_, actor, readingId, { input, checkCode, origin: from.origin, at })
      const draft = draw(db)
      const pdf = await printCertificate(context, draft.snapshot)
      const id = inTransaction(db, (tx) => {
        const asItStands = draw(tx)
        const isSame = canonicalJson(asItStands.snapshot) === canonicalJson(draft.snapshot)
        return isSame ? store(tx, actor, { draft: asItStands, pdf, at }) : null
      })
      if (id !== null) return selectCertificate(db, id)
    }
    throw new AppError('busy', { log: 'the certificate changed while it was printed, each time' })
  })
}

function draftCertificate(
  db: Connection,
  actor: Actor,
  readingId: string,
  { input, checkCode, origin, at }: { input: IssueCertificate; checkCode: string; origin: string; at: Date },
): Draft {
  const reading = requireReading(db, readingId)
  const replaced = input.replacesId === null ? null : requireCertificate(db, input.replacesId)
  assertCertifiable(db, actor, reading, replaced)
  const { certificatePrefix, publicAddress } = readSettings(db)
  const number = nextNumber(db, certificatePrefix, at)
  const snapshot = makeSnapshot(db, reading, {
    number: number.number,
    checkCode,
    checkUrl: `${publicAddress || origin}/check/${checkCode}`,
    replaces: replaced?.number ?? null,
    received: input.received,
    issuedBy: actor,
    at,
  })
  return { number, snapshot, reading, replaced }
}

function store(tx: Tx, actor: Actor, { draft, pdf, at }: { draft: Draft; pdf: Buffer; at: Date }): string {
  const { number, snapshot, reading, replaced } = draft
  const id = newId()
  const pdfSha256 = createHash('sha256').update(pdf).digest('hex')
  tx.insert(certificates)
    .values({
      ...number,
      id,
      checkCode: snapshot.checkCode,
      pieceId: reading.pieceId,
      readingId: reading.id,
      state: 'issued',
      issuedById: actor.id,
      issuedAt: at.toISOString(),
      replacesId: replaced?.id ?? null,
      pdfSha256,
      snapshot,
    })
    .run()
  tx.insert(certificatePdfs).values({ certificateId: id, pdf }).run()
  const data = { number: number.number, readingId: reading.id, pdfSha256 }
  recordEvent(tx, { kind: 'certificate.issued', subject: { type: 'certificate', id }, actor, data, at })
  if (replaced) {
    endCertificate(tx, actor, replaced, { state: 'replaced', data: { replacedBy: number.number }, at })
  }
  if (reading.state !== 'certified') {
    moveReading(tx, actor, reading, {
      to: 'certified',
      event: 'reading.certified',
      data: { certificateId: id, number: number.number },
      at,
    })
  }
  return id
}
