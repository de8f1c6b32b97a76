import type { CertificateListQuery } from '@shared/schemas/certificates'
import type { AppContext } from '../../context'
import { heightCell, writeCsv } from '../../csv/write-csv'
import { words } from '../../i18n'
import { selectCertificatesThat } from './select-certificates'

const heads = [
  'certificate',
  'part',
  'partName',
  'serial',
  'lot',
  'customer',
  'flatness',
  'u',
  'verdict',
  'issuedBy',
  'issued',
  'certificateState',
  'ended',
  'reason',
] as const

/** Every certificate that a list would show, page after page, as CSV. */
export function exportCertificates({ db }: AppContext, query: CertificateListQuery): string {
  const rows = selectCertificatesThat(db, query).map((row) => [
    row.number,
    row.partNumber,
    row.partName,
    row.serial,
    row.lotNumber,
    row.customerName,
    heightCell(row.flatnessUm),
    heightCell(row.expandedUncertaintyUm),
    words('csv', `verdict.${row.verdict}`),
    row.issuedBy.name,
    row.issuedAt,
    words('csv', `certificateState.${row.state}`),
    row.endedAt,
    row.withdrawalReason,
  ])
  return writeCsv(
    heads.map((head) => words('csv', `head.${head}`)),
    rows,
  )
}
