import type { Reading } from '@shared/schemas/readings'
import type { Review } from '@shared/schemas/reviews'
import { useMemo, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { EmptyState } from '@/components/empty-state'
import { CheckboxField } from '@/components/fields/checkbox-field'
import { MarkedPhoto, type PhotoPin } from '@/components/marked-photo'
import { residualScalePx, residualsByTrace } from './residuals'

export interface Place {
  x: number
  y: number
}

interface Props {
  reading: Reading
  review: Review
  chosenRemark: string | null
  chooseRemark: (id: string) => void
  /** Where a new remark is about to be pinned. */
  newPlace: Place | null
  /** Given where the reader may pin. */
  onPlace?: (place: Place) => void
}

/** The photograph with its marks, or with each click's residual, and the remarks pinned to it. */
export function ReviewPhoto(props: Props) {
  const { reading, review, chosenRemark, chooseRemark, newPlace, onPlace } = props
  const { t } = useTranslation('review')
  const [showMarks, setShowMarks] = useState(true)
  const [showResiduals, setShowResiduals] = useState(false)
  const photo = reading.photos.find(({ role }) => role === 'bands')
  const residuals = useMemo(() => residualsByTrace(reading), [reading])
  if (!photo) return <EmptyState>{t('desk.noPhoto')}</EmptyState>
  const pins = [
    ...pinsOf(review, chosenRemark, (number) => t('remarks.pin', { number })),
    ...(newPlace
      ? [
          {
            ...newPlace,
            key: 'new',
            number: review.remarks.length + 1,
            label: t('remarks.new'),
            isOpen: true,
            isChosen: true,
          },
        ]
      : []),
  ]
  return (
    <div>
      <MarkedPhoto
        photo={photo}
        marks={reading.marks}
        alt={t('readings:page.photos.alt', {
          name: photo.fileName,
          piece: `${reading.partNumber} · ${reading.serial}`,
        })}
        showMarks={showMarks}
        residuals={showResiduals ? residuals : undefined}
        residualScalePx={residualScalePx}
        pins={pins}
        onChoosePin={chooseRemark}
        onPlace={onPlace && ((x, y) => onPlace({ x, y }))}
      />
      <div className="mt-2 flex flex-wrap items-center gap-x-6 gap-y-1">
        <CheckboxField label={t('desk.marks')} checked={showMarks} onChange={setShowMarks} />
        <CheckboxField label={t('desk.residuals')} checked={showResiduals} onChange={setShowResiduals} />
        <p className="text-axis text-muted">
          {showResiduals ? t('desk.residualLegend', { px: residualScalePx }) : onPlace && t('desk.pinHint')}
        </p>
      </div>
    </div>
  )
}

function pinsOf({ remarks }: Review, chosen: string | null, label: (number: number) => string): PhotoPin[] {
  return remarks.flatMap(({ id, place, closed }, i) =>
    place
      ? [
          {
            ...place,
            key: id,
            number: i + 1,
            label: label(i + 1),
            isOpen: closed === null,
            isChosen: id === chosen,
          },
        ]
      : [],
  )
}
