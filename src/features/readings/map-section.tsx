import type { Figure } from '@shared/schemas/results'
import { useMemo } from 'react'
import { useTranslation } from 'react-i18next'
import { HeightMap } from '@/components/height-map/height-map'
import { HeightScale } from '@/components/height-map/height-scale-bar'
import { commonRange, contourStepUm } from '@/components/height-map/map-range'
import { ProfileChart } from '@/components/profile-chart'
import { Section } from '@/components/section'
import { statementWords } from '@/lib/finding-words'
import { useHeights } from '@/lib/use-heights'
import { useWidth } from '@/lib/use-width'

/** The map with its scale, form in words, and a profile through the middle. */
export function MapSection({ figure }: { figure: Figure }) {
  const { t } = useTranslation('readings')
  const heights = useHeights(figure.bandUm)
  const range = useMemo(() => commonRange([figure.map]), [figure.map])
  const profile = useMemo(() => middleRow(figure.map), [figure.map])
  const step = contourStepUm(range)
  const [profileRef, profileWidthPx] = useWidth<HTMLDivElement>()
  return (
    <Section title={t('page.map.title')} note={t('page.map.contours', { step: heights.plain(step) })}>
      <div className="flex flex-wrap gap-x-10 gap-y-6 pt-4">
        <div className="flex gap-6">
          <HeightMap
            map={figure.map}
            peak={figure.peak}
            valley={figure.valley}
            sizePx={300}
            range={range}
            stepUm={step}
            label={t('common:map.label', {
              peak: heights.signed(figure.peak.heightUm),
              valley: heights.signed(figure.valley.heightUm),
            })}
          />
          <HeightScale range={range} unit={heights.unit} bandUm={heights.band} heightPx={180} />
        </div>
        <div className="min-w-[22rem] flex-1">
          <h3 className="text-section">{t('page.form.title')}</h3>
          <ul className="mb-5 max-w-[60ch]">
            {figure.statements.map((statement) => (
              <li key={statement.code}>{statementWords(t, statement, heights.plain)}</li>
            ))}
          </ul>
          <h3 className="text-section">
            {t('page.map.profileTitle')}{' '}
            <span className="font-normal text-muted text-second">{t('page.map.profile')}</span>
          </h3>
          <div ref={profileRef}>
            {profileWidthPx > 0 && (
              <ProfileChart
                lines={[{ tone: 'after', heightsUm: profile.heightsUm, uUm: null }]}
                lengthMm={profile.lengthMm}
                unit={heights.unit}
                bandUm={heights.band}
                label={t('page.map.profileLabel')}
                widthPx={Math.min(560, profileWidthPx)}
              />
            )}
          </div>
        </div>
      </div>
      {isHatchedSomewhere(figure.map) && <p className="mt-2 text-axis text-muted">{t('page.map.hatched')}</p>}
    </Section>
  )
}

function isHatchedSomewhere({ heightsNm, supported }: Figure['map']): boolean {
  return supported.some((flag, cell) => flag === 0 && heightsNm[cell] !== null)
}

function middleRow({ columns, rows, stepMm, heightsNm }: Figure['map']) {
  const start = Math.floor(rows / 2) * columns
  const heightsUm = heightsNm.slice(start, start + columns).map((nm) => (nm === null ? null : nm / 1000))
  return { heightsUm, lengthMm: (columns - 1) * stepMm }
}
