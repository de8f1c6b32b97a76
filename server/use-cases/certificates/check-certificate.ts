import type { CertificateCheck } from '@shared/schemas/certificates'
import { eq } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { certificates } from '../../db/schema/certificates'
import { AppError } from '../../errors'
import { readCheckCode } from './check-code'

/** Whether a certificate is genuine and still stands, for whoever holds its code. */
export function checkCertificate({ db }: AppContext, typed: string): CertificateCheck {
  const code = readCheckCode(typed)
  const found =
    code === null ? undefined : db.select().from(certificates).where(eq(certificates.checkCode, code)).get()
  if (!found) throw new AppError('notFound', { say: { key: 'notFoundThing.checkCode' } })
  const { snapshot, state, number, issuedAt, endedAt, pdfSha256 } = found
  const next = db
    .select({ number: certificates.number })
    .from(certificates)
    .where(eq(certificates.replacesId, found.id))
    .get()
  return {
    state,
    number,
    replacedBy: next?.number ?? null,
    shopName: snapshot.shop.name,
    partNumber: snapshot.part.number,
    partName: snapshot.part.name,
    serial: snapshot.piece.serial,
    flatnessUm: snapshot.flatnessUm,
    expandedUncertaintyUm: snapshot.figure.expandedUncertaintyUm,
    verdict: snapshot.verdict,
    issuedAt,
    endedAt,
    pdfSha256,
  }
}
