import type { Verdict } from '@shared/schemas/results'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'

interface Props {
  verdict: Verdict
  className?: string
}

const tones: Record<Verdict, string> = {
  conforms: 'text-bottle',
  doesNotConform: 'text-chestnut',
  neitherProven: 'text-ink',
  noTolerance: 'text-muted',
  noVerdict: 'text-muted',
}

/** The verdict in words, with the head shape that the rule has for it. */
export function VerdictWords({ verdict, className }: Props) {
  const { t } = useTranslation()
  return (
    <span
      className={classNames(
        'inline-flex items-baseline gap-1.5 whitespace-nowrap',
        tones[verdict],
        className,
      )}
    >
      <VerdictShape verdict={verdict} />
      {t(`common:verdict.${verdict}`)}
    </span>
  )
}

function VerdictShape({ verdict }: { verdict: Verdict }) {
  return (
    <svg aria-hidden="true" width="10" height="10" viewBox="-5 -5 10 10" className="shrink-0">
      <Shape verdict={verdict} />
    </svg>
  )
}

function Shape({ verdict }: { verdict: Verdict }) {
  switch (verdict) {
    case 'conforms':
      return <circle r="4" fill="currentColor" />
    case 'neitherProven':
      return <circle r="3.5" fill="none" stroke="currentColor" strokeWidth="1.5" />
    case 'doesNotConform':
      return <path d="M0 -5L5 0L0 5L-5 0Z" fill="currentColor" />
    case 'noTolerance':
    case 'noVerdict':
      return <path d="M-4 0H4" stroke="currentColor" strokeWidth="1.2" />
  }
}
