import type { Figure } from '@shared/schemas/results'
import { formatNumber } from '@shared/units/height'
import { useTranslation } from 'react-i18next'
import { Section } from '@/components/section'
import { classNames } from '@/lib/class-names'

const head = 'py-2 pr-4 text-left font-normal text-axis text-muted'
const cell = 'border-hairline border-t py-1.5 pr-4 align-baseline'

/** Every source of the uncertainty; what nobody stated is said to be so and never silently nothing. */
export function BudgetSection({ figure }: { figure: Figure }) {
  const { t } = useTranslation('readings')
  return (
    <Section title={t('page.budget.title')} note={t('page.budget.note')}>
      <table className="w-full max-w-[56rem] border-collapse">
        <thead>
          <tr>
            <th scope="col" className={head}>
              {t('page.budget.source')}
            </th>
            <th scope="col" className={head}>
              {t('page.budget.estimate')}
            </th>
            <th scope="col" className={head}>
              {t('page.budget.distribution')}
            </th>
            <th scope="col" className={classNames(head, 'text-right')}>
              {t('page.budget.standard')}
            </th>
            <th scope="col" className={classNames(head, 'pr-0 text-right')}>
              {t('page.budget.contribution', { unit: 'µm' })}
            </th>
          </tr>
        </thead>
        <tbody>
          {figure.budget.map((row) => (
            <BudgetLine key={row.source} row={row} />
          ))}
        </tbody>
        <tfoot>
          <tr>
            <th scope="row" colSpan={4} className="border-ink border-t py-2 text-left font-semibold">
              {t('page.budget.total')}
            </th>
            <td className="border-ink border-t py-2 text-right font-semibold">
              {formatNumber(figure.expandedUncertaintyUm, 4)}
            </td>
          </tr>
        </tfoot>
      </table>
      {figure.notStated.length > 0 && (
        <p className="mt-2 text-axis text-muted">{t('page.budget.notStatedNote')}</p>
      )}
    </Section>
  )
}

function BudgetLine({ row }: { row: Figure['budget'][number] }) {
  const { t } = useTranslation('readings')
  const standard =
    row.standardUncertainty === null
      ? ''
      : `${formatSignificant(row.standardUncertainty)} ${t(`page.budget.unit.${row.unit}`)}`
  return (
    <tr className={row.stated ? undefined : 'text-muted'}>
      <th scope="row" className={classNames(cell, 'text-left font-normal')}>
        {t(`budget:${row.source}`)}
      </th>
      {row.stated ? (
        <>
          <td className={cell}>{row.estimate}</td>
          <td className={cell}>{row.distribution && t(`budget:distribution.${row.distribution}`)}</td>
          <td className={classNames(cell, 'whitespace-nowrap text-right')}>{standard}</td>
          <td className={classNames(cell, 'pr-0 text-right')}>{contributionWords(row.contributionUm)}</td>
        </>
      ) : (
        <td colSpan={4} className={cell}>
          {t('budget:notStated')}
        </td>
      )}
    </tr>
  )
}

/** Four decimals; what is smaller is said to be so and not shown as nothing. */
function contributionWords(um: number): string {
  return um > 0 && um < 0.00005 ? '< 0.0001' : formatNumber(um, 4)
}

/** Two digits that count, never written with an exponent. */
function formatSignificant(value: number): string {
  if (value === 0) return '0'
  return formatNumber(value, Math.min(8, Math.max(0, 1 - Math.floor(Math.log10(Math.abs(value))))))
}
