import type { Reading } from '@shared/schemas/readings'
import type { Figure } from '@shared/schemas/results'
import { formatHeight } from '@shared/units/height'
import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { statementWords } from '@/lib/finding-words'
import { useHeights } from '@/lib/use-heights'

/** Form in words. */
export function FormWords({ figure }: { figure: Figure }) {
  const { t } = useTranslation()
  const heights = useHeights(figure.bandUm)
  if (figure.statements.length === 0) return null
  return (
    <ul className="text-body">
      {figure.statements.map((statement) => (
        <li key={statement.code}>{statementWords(t, statement, heights.plain)}</li>
      ))}
    </ul>
  )
}

/** Peak, valley, the other flatness and RMS in two columns. */
export function FigureFacts({ figure, reading }: { figure: Figure; reading: Reading }) {
  const { t } = useTranslation('table')
  const { unit, band } = useHeights(figure.bandUm)
  const { flatness } = figure
  const bare = (um: number) => formatHeight(um, unit, { bandUm: band, bare: true })
  const signed = (um: number) => formatHeight(um, unit, { bandUm: band, bare: true, signed: true })
  const other = reading.face.reference === 'minimumZone' ? 'leastSquares' : 'minimumZone'
  return (
    <Columns>
      <Fact name={t('result.peak')} value={signed(flatness.peakUm)} />
      <Fact name={t(`result.other.${other}`)} value={bare(flatness[`${other}Um`])} />
      <Fact name={t('result.valley')} value={signed(-flatness.valleyUm)} />
      <Fact name={t('result.rms')} value={bare(flatness.rmsUm)} />
    </Columns>
  )
}

/** What U is made of, the largest first; what nobody stated last. */
export function FigureBudget({ figure }: { figure: Figure }) {
  const { t } = useTranslation('table')
  const { unit, band } = useHeights(figure.bandUm)
  const stated = figure.budget
    .filter((row) => row.stated)
    .toSorted((a, b) => b.contributionUm - a.contributionUm)
  const rest = figure.budget.filter((row) => !row.stated)
  return (
    <section>
      <h2 className="pb-1 font-semibold text-muted text-second">{t('result.budget')}</h2>
      <Columns>
        {stated.map(({ source, contributionUm }) => (
          <Fact
            key={source}
            name={t(`budget:${source}`)}
            value={formatHeight(contributionUm, unit, { bandUm: band, bare: true })}
          />
        ))}
      </Columns>
      {rest.length > 0 && (
        <p className="pt-1 text-axis text-muted">
          {rest.map(({ source }) => t(`budget:${source}`)).join(', ')}: {t('budget:notStated')}
        </p>
      )}
    </section>
  )
}

function Columns({ children }: { children: ReactNode }) {
  return <dl className="grid grid-cols-2 gap-x-5 gap-y-0.5 text-second">{children}</dl>
}

function Fact({ name, value }: { name: string; value: string }) {
  return (
    <div className="flex min-w-0 justify-between gap-2">
      <dt className="truncate text-muted" title={name}>
        {name}
      </dt>
      <dd>{value}</dd>
    </div>
  )
}
