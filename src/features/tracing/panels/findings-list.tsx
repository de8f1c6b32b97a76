import type { PointPx } from '@shared/schemas/shapes'
import type { TFunction } from 'i18next'
import { useTranslation } from 'react-i18next'
import { findingWords } from '@/lib/finding-words'
import type { Problem } from '../problems'
import type { MarksRead } from '../result/read-marks'

interface Props {
  read: MarksRead
  onShow: (place: PointPx | null, traceIds: readonly string[]) => void
}

interface Line {
  key: string
  severity: 'refusal' | 'warning' | 'remark'
  words: string
  place: PointPx | null
  traceIds: readonly string[]
}

/** A face full of mistakes is told by its first few. */
const mostLines = 6

/** Mistakes and remarks, each with the way to its place. */
export function FindingsList({ read, onShow }: Props) {
  const { t } = useTranslation('table')
  const lines = linesOf(t, read)
  return (
    <section aria-label={t('result.findings')}>
      <h2 className="pb-1 font-semibold text-muted text-second">{t('result.findings')}</h2>
      {lines.length === 0 && <p className="text-muted text-second">{t('result.nothing')}</p>}
      <ul className="flex flex-col gap-1.5 text-second">
        {lines.slice(0, mostLines).map((line) => (
          <FindingLine key={line.key} line={line} onShow={onShow} />
        ))}
      </ul>
      {lines.length > mostLines && (
        <p className="pt-1 text-muted text-second">{t('result.more', { count: lines.length - mostLines })}</p>
      )}
    </section>
  )
}

export function hasFindings({ findings, problems }: MarksRead): boolean {
  return findings.length > 0 || problems.length > 0
}

function linesOf(t: TFunction<'table'>, { findings, problems }: MarksRead): Line[] {
  const unnumbered = problems.filter(({ code }) => code === 'noNumber')
  const isSaid = findings.some(({ code }) => code === 'orderMissing')
  return [
    ...findings.map(
      (finding): Line => ({
        key: `${finding.code} ${finding.traceIds.join()}`,
        severity: finding.severity,
        words: findingWords(t, finding),
        place: finding.place && [finding.place.x, finding.place.y],
        traceIds: finding.traceIds,
      }),
    ),
    ...problems.filter(({ code }) => code !== 'noNumber').map((problem) => lineOf(t, problem, 1)),
    // One line for all of them: the list of bands shows which.
    ...(isSaid ? [] : unnumbered.slice(0, 1).map((problem) => lineOf(t, problem, unnumbered.length))),
  ]
}

function lineOf(t: TFunction<'table'>, { code, params, place, traceIds }: Problem, count: number): Line {
  return {
    key: `${code} ${traceIds.join()} ${place.join()}`,
    severity: 'warning',
    words: t(`problem.${code}`, { ...params, count }),
    place,
    traceIds,
  }
}

function FindingLine({ line, onShow }: { line: Line; onShow: Props['onShow'] }) {
  const { t } = useTranslation('table')
  const words = (
    <>
      <span className={line.severity === 'remark' ? 'text-muted' : 'font-semibold text-chestnut'}>
        {t(`result.severity.${line.severity}`)}
      </span>{' '}
      {line.words}
    </>
  )
  if (!line.place) return <li>{words}</li>
  return (
    <li>
      <button
        type="button"
        onClick={() => onShow(line.place, line.traceIds)}
        title={t('result.goTo', { what: line.words })}
        className="text-left hover:underline hover:decoration-edge hover:underline-offset-3 max-desk:min-h-11"
      >
        {words}
      </button>
    </li>
  )
}
