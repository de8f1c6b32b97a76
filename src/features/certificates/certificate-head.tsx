import type { Certificate } from '@shared/schemas/certificates'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { Button } from '@/components/button'
import { CertificateStateWords } from '@/components/certificates/certificate-state'
import { type Fact, Facts } from '@/components/facts'
import { PageHead } from '@/components/page-head'
import { formatMoment } from '@/lib/format-when'
import { useMay } from '@/lib/session'
import { WithdrawDialog } from './withdraw-dialog'

/** Number, whether it stands, and what can be done with it. */
export function CertificateHead({ certificate }: { certificate: Certificate }) {
  const { t } = useTranslation('certificate')
  const mayIssue = useMay('certificate:issue')
  const [isWithdrawing, setWithdrawing] = useState(false)
  const { id, number, state, partNumber, partName, serial, customerName, readingId } = certificate
  return (
    <PageHead
      margin={customerName}
      title={
        <span className="text-title">
          <span className="font-semibold">{number}</span>{' '}
          <span className="ml-1 font-light">
            {t('view.of', { part: partNumber, serial, name: partName })}
          </span>
        </span>
      }
      actions={
        <>
          {mayIssue && state === 'issued' && (
            <Button kind="grave" onClick={() => setWithdrawing(true)}>
              {t('withdraw.open')}
            </Button>
          )}
          <Button asChild>
            <Link to={`/readings/${readingId}`}>{t('view.toReading')}</Link>
          </Button>
          <Button asChild>
            <a href={`/certificates/${id}/print`} target="_blank" rel="noreferrer">
              {t('view.print')}
            </a>
          </Button>
          <Button asChild kind="main">
            <a href={`/api/certificates/${id}/pdf`} target="_blank" rel="noreferrer">
              {t('view.pdf')}
            </a>
          </Button>
        </>
      }
    >
      <div className="mt-3">
        <Facts facts={useFacts(certificate)} />
      </div>
      {certificate.withdrawalReason && (
        <p className="mt-3 max-w-[70ch] text-chestnut">
          {t('view.reason')}: {certificate.withdrawalReason}
        </p>
      )}
      {isWithdrawing && <WithdrawDialog certificate={certificate} onClose={() => setWithdrawing(false)} />}
    </PageHead>
  )
}

function useFacts(certificate: Certificate): Fact[] {
  const { t } = useTranslation('certificate')
  const { state, issuedAt, issuedBy, endedAt, endedBy, replaces, replacedBy, checkCode, pdfSha256 } =
    certificate
  const link = (other: { id: string; number: string }) => (
    <Link to={`/certificates/${other.id}`} className="underline underline-offset-3">
      {other.number}
    </Link>
  )
  return [
    {
      name: t('view.state'),
      value:
        endedAt && endedBy ? (
          <span className="text-chestnut">
            {t('view.ended', {
              state: t(`state.${state}`),
              when: formatMoment(endedAt),
              name: endedBy.name,
            })}
          </span>
        ) : (
          <CertificateStateWords state={state} />
        ),
    },
    {
      name: t('view.issued'),
      value: t('view.issuedValue', { when: formatMoment(issuedAt), name: issuedBy.name }),
    },
    ...(replaces ? [{ name: t('view.replaces'), value: link(replaces) }] : []),
    ...(replacedBy ? [{ name: t('view.replacedBy'), value: link(replacedBy) }] : []),
    {
      name: t('view.check'),
      value: (
        <Link to={`/check/${checkCode}`} className="underline underline-offset-3">
          {checkCode}
        </Link>
      ),
    },
    { name: t('view.hash'), value: <span className="break-all">{pdfSha256}</span> },
  ]
}
