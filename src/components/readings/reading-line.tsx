import type { ReadingRow } from '@shared/schemas/readings'
import { isEditable } from '@shared/workflow/reading-states'
import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { Quantity } from '@/components/quantity'
import { ReadingRule } from '@/components/tolerance-rule/reading-rule'
import { VerdictWords } from '@/components/tolerance-rule/verdict-words'
import { classNames } from '@/lib/class-names'
import { useIsDesk } from '@/lib/use-is-desk'
import { ReadingThumb } from './reading-thumb'
import { useToleranceWords } from './tolerance-words'

/** Columns of every list of readings, so that rules line up under one another. */
export const lineColumns =
  'grid items-center grid-cols-[44px_minmax(0,1fr)_minmax(0,1.25fr)_104px_12px_140px_14px_122px] desk:grid-cols-[48px_162px_minmax(120px,296px)_40px_118px_26px_220px_16px_minmax(122px,1fr)]'

interface Props {
  reading: ReadingRow
  to: string
  /** What it needs or is, and a muted second line. */
  what: ReactNode
  note?: ReactNode
  when?: string
  /** What it needs is for a person to do. */
  needsPerson?: boolean
}

/** One reading in a list: thumb, piece, what it needs, figure, rule, verdict. A draft shows no verdict. */
export function ReadingLine({ reading, to, what, note, when, needsPerson = false }: Props) {
  const isDesk = useIsDesk()
  return (
    <li
      className={classNames(
        lineColumns,
        'relative min-h-[52px] border-hairline border-t py-1.5 first:border-t-0 hover:bg-step-active',
      )}
    >
      <ReadingThumb reading={reading} />
      <div className="min-w-0 pr-2">
        <Link to={to} className="block truncate font-semibold after:absolute after:inset-0">
          {reading.partNumber} · {reading.serial}
        </Link>
        <span className="block truncate text-muted text-second">{reading.partName}</span>
      </div>
      <div className="min-w-0 pr-3">
        <span className={classNames('block truncate', needsPerson && 'text-chestnut')}>{what}</span>
        {note && <span className="block truncate text-muted text-second">{note}</span>}
      </div>
      <span className="text-right text-muted text-second max-desk:hidden">{when}</span>
      <LineFigure reading={reading} />
      <span />
      <ReadingRule reading={reading} size="list" widthPx={isDesk ? 220 : 140} />
      <span />
      <LineVerdict reading={reading} />
    </li>
  )
}

function LineFigure({ reading: { result, marksVersion } }: { reading: ReadingRow }) {
  const { t } = useTranslation()
  const isOfEarlierMarks = result !== null && result.marksVersion < marksVersion
  return (
    <div className={classNames('text-right', isOfEarlierMarks && 'text-muted')}>
      {result && result.flatnessUm !== null ? (
        <Quantity valueUm={result.flatnessUm} uUm={result.expandedUncertaintyUm} bandUm={result.bandUm} />
      ) : (
        <span className="text-muted text-second">{t('notReadYet')}</span>
      )}
      {isOfEarlierMarks && <span className="block text-axis">{t('ofEarlierMarks')}</span>}
    </div>
  )
}

function LineVerdict({ reading }: { reading: ReadingRow }) {
  const { t } = useTranslation()
  const tolerance = useToleranceWords()(reading.face.tolerance)
  // What was set aside counts for nothing, whatever its figure.
  const isSettled = !isEditable(reading.state) && reading.state !== 'setAside' && reading.result !== null
  return (
    <div className="min-w-0">
      {isSettled && reading.result ? (
        <VerdictWords verdict={reading.result.verdict} />
      ) : (
        <span className="text-muted">{t(`state.${reading.state}`)}</span>
      )}
      <span className="block truncate text-axis text-muted">{tolerance}</span>
    </div>
  )
}
