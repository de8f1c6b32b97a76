import type { CertificateCheck } from '@shared/schemas/certificates'
import { formatWithUncertainty } from '@shared/units/height'
import { useTranslation } from 'react-i18next'
import { VerdictWords } from '@/components/tolerance-rule/verdict-words'
import { classNames } from '@/lib/class-names'
import { formatDay } from '@/lib/format-when'

/** What the record says of a certificate, to be compared with the paper. */
export function CheckAnswer({ check }: { check: CertificateCheck }) {
  const { t } = useTranslation('certificate')
  const { value, u, unit } = formatWithUncertainty(check.flatnessUm, check.expandedUncertaintyUm, 'um')
  const rows = [
    { name: t('check.facts.number'), value: check.number },
    { name: t('check.facts.part'), value: `${check.partNumber}, ${check.partName}` },
    { name: t('check.facts.serial'), value: check.serial },
    { name: t('check.facts.figure'), value: `${value} ${u.replace('±', '± ')} ${unit}` },
    { name: t('check.facts.verdict'), value: <VerdictWords verdict={check.verdict} /> },
    { name: t('check.facts.issued'), value: formatDay(check.issuedAt) },
    { name: t('check.facts.by'), value: check.shopName },
    { name: t('check.facts.hash'), value: <span className="break-all text-axis">{check.pdfSha256}</span> },
  ]
  return (
    <section aria-live="polite">
      <p
        className={classNames(
          'border-ink border-t pt-4 text-headline',
          check.state === 'issued' ? 'text-bottle' : 'text-chestnut',
        )}
      >
        <StateSentence check={check} />
      </p>
      <p className="mt-3 text-muted">{t('check.compare')}</p>
      <dl className="mt-2">
        {rows.map(({ name, value: shown }) => (
          <div
            key={name}
            className="grid grid-cols-[8rem_minmax(0,1fr)] gap-x-4 border-hairline border-t py-2 first:border-t-0"
          >
            <dt className="text-muted">{name}</dt>
            <dd className="font-semibold">{shown}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-4 text-muted text-second">{t('check.scope')}</p>
    </section>
  )
}

function StateSentence({ check: { state, endedAt, replacedBy } }: { check: CertificateCheck }) {
  const { t } = useTranslation('certificate')
  const when = endedAt ? formatDay(endedAt) : ''
  switch (state) {
    case 'issued':
      return t('check.genuine')
    case 'withdrawn':
      return t('check.withdrawn', { when })
    case 'replaced':
      return t('check.replaced', { when, number: replacedBy ?? '' })
  }
}
