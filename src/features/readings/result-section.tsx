import { decide } from '@shared/metrology'
import type { Reading } from '@shared/schemas/readings'
import type { Figure } from '@shared/schemas/results'
import { formatHeight, formatWithUncertainty } from '@shared/units/height'
import { isEditable } from '@shared/workflow/reading-states'
import { useMutation } from '@tanstack/react-query'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { Button } from '@/components/button'
import { EmptyState } from '@/components/empty-state'
import { Section } from '@/components/section'
import { ReadingRule } from '@/components/tolerance-rule/reading-rule'
import { VerdictWords } from '@/components/tolerance-rule/verdict-words'
import { formatMoment } from '@/lib/format-when'
import { computeReading } from '@/lib/queries/readings'
import { useSettings } from '@/lib/settings'
import { useHeights } from '@/lib/use-heights'

/** The figure large, its rule and verdict; then everything else that was computed. */
export function ResultSection({ reading }: { reading: Reading }) {
  const { t } = useTranslation('readings')
  const result = reading.fullResult
  const figure = result?.figure
  return (
    <Section title={t('page.result.title')}>
      {!result && <EmptyState>{t('page.result.none')}</EmptyState>}
      {result && !figure && <EmptyState>{t('page.result.refused')}</EmptyState>}
      {result && figure && (
        <div className="grid gap-x-10 gap-y-6 pt-4 desk:grid-cols-[20rem_minmax(0,1fr)]">
          <Headline reading={reading} figure={figure} />
          <FigureTable figure={figure} />
        </div>
      )}
      {reading.figureIsStale && <StaleFigure reading={reading} />}
      {result && (
        <p className="mt-4 text-axis text-muted">
          {t('page.result.engine', {
            when: formatMoment(result.computedAt),
            version: result.engineVersion,
            marks: result.marksVersion,
          })}
        </p>
      )}
    </Section>
  )
}

function StaleFigure({ reading: { id, mayEdit } }: { reading: Reading }) {
  const { t } = useTranslation('readings')
  const compute = useMutation({
    mutationFn: () => computeReading(id),
    onError: (error) => toast.error(error.message),
  })
  return (
    <div role="status" className="mt-4 flex flex-wrap items-center gap-4">
      <p className="text-chestnut">{t('page.result.stale')}</p>
      {mayEdit && (
        <Button disabled={compute.isPending} onClick={() => compute.mutate()}>
          {t('page.result.again')}
        </Button>
      )}
    </div>
  )
}

function Headline({ reading, figure }: { reading: Reading; figure: Figure }) {
  const { t } = useTranslation('readings')
  const { unit, band } = useHeights(figure.bandUm)
  const valueUm = reading.result?.flatnessUm ?? figure.flatness.minimumZoneUm
  const shown = formatWithUncertainty(valueUm, figure.expandedUncertaintyUm, unit, band)
  const isDraft = isEditable(reading.state)
  return (
    <div>
      <p className="whitespace-nowrap">
        <span className="text-result">{shown.value}</span>
        <span className="ml-2 text-muted text-section font-normal">
          {shown.u.replace('±', '± ')} {shown.unit}
        </span>
      </p>
      <p className="mt-1 text-muted text-second">{t(`page.result.reference.${reading.face.reference}`)}</p>
      <div className="mt-5">
        <ReadingRule reading={reading} size="full" />
      </div>
      <div className="mt-2">
        {isDraft || !reading.result ? (
          <p className="text-muted text-second">{t('page.draftNote')}</p>
        ) : (
          <>
            <VerdictWords verdict={reading.result.verdict} className="font-semibold text-section" />
            <VerdictReason reading={reading} figure={figure} />
          </>
        )}
      </div>
    </div>
  )
}

/** Why there is no plain yes or no; nothing where there is one. */
function VerdictReason({ reading: { face, result }, figure }: { reading: Reading; figure: Figure }) {
  const { t } = useTranslation('readings')
  const settings = useSettings()
  if (!settings.data) return null
  const { reason } = decide({
    tolerance: face.tolerance,
    rule: face.rule,
    flatnessUm: result?.flatnessUm ?? null,
    expandedUncertaintyUm: figure.expandedUncertaintyUm,
    sagittaUm: figure.terms.sagittaUm,
    sagittaUUm: figure.terms.sagittaUUm,
    supportedShare: figure.supportedShare,
    leastSupportedShare: settings.data.leastSupportedShare,
  })
  return reason && <p className="mt-1 text-muted text-second">{t(`decision.${reason}`)}</p>
}

function FigureTable({ figure }: { figure: Figure }) {
  const { t } = useTranslation('readings')
  const heights = useHeights(figure.bandUm)
  const { flatness, worstBandReading, bandUm, supportedShare, areaMm2 } = figure
  const rows: [string, string][] = [
    ['minimumZone', heights.plain(flatness.minimumZoneUm)],
    ['leastSquares', heights.plain(flatness.leastSquaresUm)],
    ['peak', heights.plain(flatness.peakUm)],
    ['valley', heights.plain(flatness.valleyUm)],
    ['rms', heights.plain(flatness.rmsUm)],
    ['u', heights.plain(figure.expandedUncertaintyUm)],
    ['bands', formatHeight(flatness.minimumZoneUm, 'bands', { bandUm, decimals: 2 })],
    ['band', formatHeight(bandUm, 'um', { decimals: 4 })],
    ['supported', `${Math.floor(supportedShare * 100)} %`],
    ['area', `${Math.round(areaMm2)} mm²`],
  ]
  if (worstBandReading) {
    const words = t('page.result.figures.worstBandValue', {
      height: heights.plain(worstBandReading.flatnessUm),
      order: worstBandReading.order,
    })
    rows.splice(6, 0, ['worstBand', words])
  }
  return (
    <dl className="max-w-[34rem]">
      {rows.map(([name, value]) => (
        <div key={name} className="flex justify-between gap-6 border-hairline border-t py-1 first:border-t-0">
          <dt className="text-muted">{t(`page.result.figures.${name}`)}</dt>
          <dd className="text-right">{value}</dd>
        </div>
      ))}
    </dl>
  )
}
