import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { useParams } from 'react-router-dom'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { Section } from '@/components/section'
import { BudgetSection } from '@/features/readings/budget-section'
import { EventsSection } from '@/features/readings/events-section'
import { MapSection } from '@/features/readings/map-section'
import { ConditionsSection, SetUpSection } from '@/features/readings/set-up-section'
import { FaceReadings } from '@/features/review/face-readings'
import { LookAtList } from '@/features/review/look-at-list'
import { RemarkList } from '@/features/review/remark-list'
import { ResidualPicture } from '@/features/review/residual-picture'
import { ReviewActions } from '@/features/review/review-actions'
import { ReviewFigure } from '@/features/review/review-figure'
import { ReviewHead } from '@/features/review/review-head'
import { type Place, ReviewPhoto } from '@/features/review/review-photo'
import { useReading } from '@/lib/queries/readings'
import { useReview } from '@/lib/queries/reviews'
import { useDocumentTitle } from '@/lib/use-document-title'
import { useIsDesk } from '@/lib/use-is-desk'

/** One reading before a reviewer: photograph, figure, what to look at, remarks, and the decision. */
export function ReviewDeskPage() {
  const { id = '' } = useParams()
  const { t } = useTranslation('review')
  const isDesk = useIsDesk()
  const reading = useReading(id)
  const review = useReview(id)
  const [chosenRemark, chooseRemark] = useState<string | null>(null)
  const [newPlace, setNewPlace] = useState<Place | null | undefined>(undefined)
  useDocumentTitle(reading.data && `${t('title')}: ${reading.data.partNumber} · ${reading.data.serial}`)
  if (reading.isPending || review.isPending) return <Loading />
  if (reading.isError) return <ErrorState error={reading.error} retry={reading.refetch} />
  if (review.isError) return <ErrorState error={review.error} retry={review.refetch} />
  const mayRemark =
    review.data.mayReview && review.data.refusal !== 'ownReading' && reading.data.state === 'sentForReview'
  const figure = reading.data.fullResult?.figure
  const residuals = (
    <div className="mt-5 max-w-[24rem]">
      <ResidualPicture reading={reading.data} />
    </div>
  )
  return (
    <>
      <ReviewHead reading={reading.data} />
      <Section title={t('desk.photo')} note={t('desk.photoNote')}>
        <div className="flex flex-col gap-6 pt-4 desk:grid desk:grid-cols-[minmax(0,1fr)_22rem] desk:grid-rows-[auto_auto_1fr] desk:gap-x-8">
          <div className="min-w-0 desk:row-span-3">
            <ReviewPhoto
              reading={reading.data}
              review={review.data}
              chosenRemark={chosenRemark}
              chooseRemark={chooseRemark}
              newPlace={newPlace ?? null}
              onPlace={mayRemark ? setNewPlace : undefined}
            />
            {isDesk && residuals}
          </div>
          {/* Beside the photograph at a desk, right below it on a tablet: what is written stays near its pin. */}
          <div className="min-w-0 desk:order-1">
            <RemarkList
              reading={reading.data}
              review={review.data}
              chosenRemark={chosenRemark}
              chooseRemark={chooseRemark}
              newPlace={newPlace}
              setNewPlace={setNewPlace}
              mayRemark={mayRemark}
            />
          </div>
          <div className="flex min-w-0 flex-col gap-5">
            <ReviewFigure reading={reading.data} />
            <ReviewActions reading={reading.data} review={review.data} />
          </div>
          <div className="min-w-0 desk:order-2">
            <LookAtList reading={reading.data} review={review.data} />
            {!isDesk && residuals}
          </div>
        </div>
      </Section>
      {figure && <MapSection figure={figure} />}
      <FaceReadings reading={reading.data} review={review.data} />
      {figure && <BudgetSection figure={figure} />}
      <SetUpSection reading={reading.data} />
      <ConditionsSection reading={reading.data} />
      <EventsSection of="reading" id={id} />
    </>
  )
}
