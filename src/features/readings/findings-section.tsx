import type { ReadingResult } from '@shared/schemas/results'
import { useTranslation } from 'react-i18next'
import { Section } from '@/components/section'
import { classNames } from '@/lib/class-names'
import { findingWords } from '@/lib/finding-words'

type Findings = ReadingResult['findings']

export function FindingsSection({ findings }: { findings: Findings }) {
  const { t } = useTranslation('readings')
  return (
    <Section title={t('page.findings.title')}>
      {findings.length === 0 && <p className="py-3 text-muted">{t('page.findings.none')}</p>}
      <ul>
        {findings.map((finding, i) => (
          <FindingRow
            // biome-ignore lint/suspicious/noArrayIndexKey: a code may come twice, and the list never changes
            key={i}
            finding={finding}
          />
        ))}
      </ul>
    </Section>
  )
}

function FindingRow({ finding }: { finding: Findings[number] }) {
  const { t } = useTranslation('readings')
  return (
    <li className="grid grid-cols-[5.5rem_minmax(0,1fr)] items-baseline gap-x-4 border-hairline border-t py-2 first:border-t-0">
      <span
        className={classNames(
          'text-second',
          finding.severity === 'remark' ? 'text-muted' : 'font-semibold text-chestnut',
        )}
      >
        {t(`page.findings.severity.${finding.severity}`)}
      </span>
      <span className="max-w-[70ch]">{findingWords(t, finding)}</span>
    </li>
  )
}
