import { readFile } from 'node:fs/promises'
import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { PageDescription } from '@shared/schemas/page-description'
import type { AppContext } from '../../context'
import { AppError } from '../../errors'
import { layoutCertificate } from '../../pdf/certificate-page'
import { drawMapColours } from '../../pdf/map-colours'
import { createMeasure } from '../../pdf/measure-text'
import { photographForPage } from '../../pdf/photograph'
import { renderPdf } from '../../pdf/render-pdf'

/** Where the photograph of a certificate lies. */
interface Photographs {
  storage: Pick<AppContext['storage'], 'pathOf'>
}

/** The certificate's page, from what was kept of it and the photograph's file: always the same. */
export async function describeCertificate(
  { storage }: Photographs,
  snapshot: CertificateSnapshot,
): Promise<PageDescription> {
  const [photo, map] = await Promise.all([
    photographForPage(await readPhotograph(storage.pathOf(snapshot.photo.sha256))),
    drawMapColours(snapshot.figure.map),
  ])
  return layoutCertificate(snapshot, { photo, map }, createMeasure())
}

async function readPhotograph(path: string): Promise<Buffer> {
  try {
    return await readFile(path)
  } catch (cause) {
    throw new AppError('photographMissing', { log: `${path}: ${cause}` })
  }
}

/** The certificate as a PDF. */
export async function printCertificate(context: Photographs, snapshot: CertificateSnapshot): Promise<Buffer> {
  const page = await describeCertificate(context, snapshot)
  const { number, shop, issued } = snapshot
  return renderPdf(page, {
    title: page.title,
    author: shop.name,
    createdAt: new Date(issued.at),
    subject: number,
  })
}
