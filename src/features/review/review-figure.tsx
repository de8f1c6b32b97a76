import type { Reading } from '@shared/schemas/readings'
import { formatWithUncertainty } from '@shared/units/height'
import { useTranslation } from 'react-i18next'
import { ReadingRule } from '@/components/tolerance-rule/reading-rule'
import { VerdictWords } from '@/components/tolerance-rule/verdict-words'
import { useHeights } from '@/lib/use-heights'

/** The figure with its rule and verdict. */
export function ReviewFigure({ reading }: { reading: Reading }) {
  const { t } = useTranslation('readings')
  const { result, face } = reading
  const { unit, band } = useHeights(result?.bandUm ?? null)
  if (!result || result.flatnessUm === null || result.expandedUncertaintyUm === null) {
    return <p className="text-muted">{t('page.result.none')}</p>
  }
  const shown = formatWithUncertainty(result.flatnessUm, result.expandedUncertaintyUm, unit, band)
  return (
    <div>
      <p className="whitespace-nowrap">
        <span className="text-result">{shown.value}</span>
        <span className="ml-2 font-normal text-muted text-section">
          {shown.u.replace('±', '± ')} {shown.unit}
        </span>
      </p>
      <p className="mt-1 text-muted text-second">{t(`page.result.reference.${face.reference}`)}</p>
      <div className="mt-4">
        <ReadingRule reading={reading} size="full" />
      </div>
      <VerdictWords verdict={result.verdict} className="mt-1 font-semibold text-section" />
    </div>
  )
}
