import type { CertificateRow } from '@shared/schemas/certificates'
import { Link } from 'react-router-dom'
import { Quantity } from '@/components/quantity'
import { VerdictWords } from '@/components/tolerance-rule/verdict-words'
import { formatDay } from '@/lib/format-when'
import { CertificateStateWords } from './certificate-state'

export const certificateColumns =
  'grid items-center gap-x-3 grid-cols-[6.75rem_minmax(0,1.5fr)_minmax(0,1fr)_6.25rem_8rem_6.25rem] desk:gap-x-4 desk:grid-cols-[9rem_minmax(0,1.1fr)_minmax(0,1fr)_9rem_10rem_12rem]'

/** One certificate in a list. */
export function CertificateLine({ certificate }: { certificate: CertificateRow }) {
  const { id, number, state, partNumber, partName, serial, lotNumber, customerName, issuedAt } = certificate
  return (
    <li
      className={`${certificateColumns} relative min-h-[52px] border-hairline border-t py-1.5 first:border-t-0 hover:bg-step-active`}
    >
      <Link to={`/certificates/${id}`} className="truncate font-semibold after:absolute after:inset-0">
        {number}
      </Link>
      <div className="min-w-0">
        <span className="block truncate">
          {partNumber} · {serial}
        </span>
        <span className="block truncate text-muted text-second">
          {partName}
          {lotNumber && `, ${lotNumber}`}
        </span>
      </div>
      <span className="truncate">{customerName}</span>
      <div className="text-right">
        <Quantity
          valueUm={certificate.flatnessUm}
          uUm={certificate.expandedUncertaintyUm}
          bandUm={certificate.bandUm}
        />
      </div>
      <VerdictWords verdict={certificate.verdict} />
      <div className="min-w-0">
        <CertificateStateWords state={state} />
        <span className="block truncate text-axis text-muted">{formatDay(issuedAt)}</span>
      </div>
    </li>
  )
}
