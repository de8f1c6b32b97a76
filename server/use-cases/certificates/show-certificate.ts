import type { Certificate, CertificateList, CertificateListQuery } from '@shared/schemas/certificates'
import type { PageDescription } from '@shared/schemas/page-description'
import { eq } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { certificatePdfs } from '../../db/schema/certificates'
import { notFound } from '../../errors'
import { requireCertificate } from './certificate-refusals'
import { describeCertificate } from './print-certificate'
import { selectCertificate, selectCertificateList } from './select-certificates'

export function listCertificates({ db }: AppContext, query: CertificateListQuery): CertificateList {
  return selectCertificateList(db, query)
}

export function showCertificate({ db }: AppContext, id: string): Certificate {
  return selectCertificate(db, id)
}

/** The page as it was issued, for the print view. */
export function showCertificatePage(context: AppContext, id: string): Promise<PageDescription> {
  return describeCertificate(context, requireCertificate(context.db, id).snapshot)
}

/** The PDF as it was issued, byte for byte. */
export function readCertificatePdf({ db }: AppContext, id: string): { number: string; pdf: Buffer } {
  const { number } = requireCertificate(db, id)
  const stored = db.select().from(certificatePdfs).where(eq(certificatePdfs.certificateId, id)).get()
  if (!stored) throw notFound('certificate')
  return { number, pdf: stored.pdf }
}
