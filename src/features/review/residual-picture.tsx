import type { Reading } from '@shared/schemas/readings'
import { useTranslation } from 'react-i18next'
import { MarkedPhoto } from '@/components/marked-photo'
import { residualScalePx, residualsByTrace } from './residuals'

/** Every click by its distance from the fitted band, small but always in sight. */
export function ResidualPicture({ reading }: { reading: Reading }) {
  const { t } = useTranslation('review')
  const photo = reading.photos.find(({ role }) => role === 'bands')
  const residuals = residualsByTrace(reading)
  if (!photo || residuals.size === 0) return null
  return (
    <figure>
      <MarkedPhoto
        photo={photo}
        marks={reading.marks}
        alt={t('desk.residualAlt')}
        showMarks={false}
        residuals={residuals}
        residualScalePx={residualScalePx}
      />
      <figcaption className="mt-1 text-axis text-muted">
        {t('desk.residualLegend', { px: residualScalePx })}
      </figcaption>
    </figure>
  )
}
