import type { Reading } from '@shared/schemas/readings'
import type { Figure } from '@shared/schemas/results'
import { formatHeight, formatWithUncertainty } from '@shared/units/height'
import { useTranslation } from 'react-i18next'
import { ToleranceRule } from '@/components/tolerance-rule/tolerance-rule'
import { VerdictWords } from '@/components/tolerance-rule/verdict-words'
import { classNames } from '@/lib/class-names'
import { useHeights } from '@/lib/use-heights'
import { useWidth } from '@/lib/use-width'

interface Props {
  figure: Figure
  reading: Reading
  isCurrent: boolean
  /** As it was sent, not as it is marked. */
  isFinal: boolean
}

/** The figure large, ± U and bands beside it, its rule below. */
export function FigureHead({ figure, reading, isCurrent, isFinal }: Props) {
  const { t } = useTranslation('table')
  const { unit, band } = useHeights(figure.bandUm)
  const flatnessUm = flatnessOf(figure, reading)
  const shown = formatWithUncertainty(flatnessUm, figure.expandedUncertaintyUm, unit, band)
  const state = isFinal ? 'final' : isCurrent ? 'asYouMark' : 'working'
  return (
    <div>
      <p className="flex justify-between text-muted text-second">
        <span className="font-semibold">{t(`result.${reading.face.reference}`)}</span>
        <span data-testid="figure-state">{t(`result.${state}`)}</span>
      </p>
      <div
        data-current={isCurrent}
        className={classNames(
          'mt-1 flex items-end justify-between transition-opacity delay-150',
          !isCurrent && 'opacity-45',
        )}
      >
        <p data-testid="flatness" className="whitespace-nowrap text-result-tablet desk:text-result">
          {shown.value} <span className="text-muted text-[1.25rem] font-light">{shown.unit}</span>
        </p>
        <p className="text-right">
          <span data-testid="uncertainty" className="block text-section font-normal">
            {shown.u.replace('±', '±\u2009')}
          </span>
          {unit !== 'bands' && (
            <span className="block text-muted text-second">
              {t('result.bands', {
                bands: formatHeight(flatnessUm, 'bands', { bandUm: figure.bandUm, bare: true }),
              })}
            </span>
          )}
        </p>
      </div>
      <Rule figure={figure} reading={reading} isFinal={isFinal} />
    </div>
  )
}

export function flatnessOf({ flatness }: Figure, { face }: Pick<Reading, 'face'>): number {
  return face.reference === 'minimumZone' ? flatness.minimumZoneUm : flatness.leastSquaresUm
}

function Rule({ figure, reading, isFinal }: Omit<Props, 'isCurrent'>) {
  const { t } = useTranslation('table')
  const { unit, band } = useHeights(figure.bandUm)
  const [ref, widthPx] = useWidth<HTMLDivElement>()
  const { tolerance, rule } = reading.face
  const verdict = reading.result?.verdict ?? 'noVerdict'
  const hollow = tolerance.kind === 'signed' && (figure.terms.sagittaUm ?? 0) < 0
  const flatnessUm = flatnessOf(figure, reading)
  return (
    <div ref={ref} className="pt-4">
      {widthPx > 0 && (
        <ToleranceRule
          size="full"
          widthPx={widthPx}
          tolerance={tolerance}
          guardFactor={rule.guardFactor}
          resultUm={hollow ? -flatnessUm : flatnessUm}
          expandedUncertaintyUm={figure.expandedUncertaintyUm}
          verdict={verdict}
          draft={!isFinal}
          unit={unit}
          bandUm={band}
        />
      )}
      {isFinal ? (
        <VerdictWords verdict={verdict} className="font-semibold" />
      ) : (
        tolerance.kind !== 'none' && <p className="text-muted text-second">{t('result.draftRule')}</p>
      )}
    </div>
  )
}
