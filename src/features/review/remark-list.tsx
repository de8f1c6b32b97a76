import type { Reading } from '@shared/schemas/readings'
import type { Remark, Review } from '@shared/schemas/reviews'
import { useMutation } from '@tanstack/react-query'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { Button } from '@/components/button'
import { classNames } from '@/lib/class-names'
import { formatMoment } from '@/lib/format-when'
import { addRemark, answerRemark, closeRemark } from '@/lib/queries/reviews'
import { useMay, useSession } from '@/lib/session'
import { RemarkForm } from './remark-form'
import type { Place } from './review-photo'

interface Props {
  reading: Reading
  review: Review
  chosenRemark: string | null
  chooseRemark: (id: string | null) => void
  /** undefined: nothing is being written; null: a remark on the whole. */
  newPlace: Place | null | undefined
  setNewPlace: (place: Place | null | undefined) => void
  mayRemark: boolean
}

/** Remarks with their answers; the pins in the photograph carry the same numbers. */
export function RemarkList({
  reading,
  review,
  chosenRemark,
  chooseRemark,
  newPlace,
  setNewPlace,
  mayRemark,
}: Props) {
  const { t } = useTranslation('review')
  return (
    <section aria-label={t('remarks.title')}>
      <div className="flex items-baseline justify-between gap-4">
        <h3 className="text-section">{t('remarks.title')}</h3>
        {mayRemark && newPlace === undefined && (
          <Button kind="quiet" onClick={() => setNewPlace(null)}>
            {t('remarks.onWholeButton')}
          </Button>
        )}
      </div>
      {newPlace !== undefined && (
        <NewRemark readingId={reading.id} place={newPlace} onDone={() => setNewPlace(undefined)} />
      )}
      {review.remarks.length === 0 && newPlace === undefined && (
        <p className="py-1 text-muted text-second">{t(mayRemark ? 'remarks.noneHint' : 'remarks.none')}</p>
      )}
      <ol>
        {review.remarks.map((remark, i) => (
          <RemarkEntry
            key={remark.id}
            number={i + 1}
            remark={remark}
            reading={reading}
            review={review}
            isChosen={remark.id === chosenRemark}
            choose={() => chooseRemark(remark.id)}
          />
        ))}
      </ol>
    </section>
  )
}

function NewRemark({
  readingId,
  place,
  onDone,
}: {
  readingId: string
  place: Place | null
  onDone: () => void
}) {
  const { t } = useTranslation('review')
  const add = useMutation({
    mutationFn: (text: string) => addRemark(readingId, { text, place }),
    onSuccess: onDone,
    onError: (error) => toast.error(error.message),
  })
  return (
    <RemarkForm
      label={`${t(place ? 'remarks.newAtPlace' : 'remarks.new')}: ${t('remarks.text').toLowerCase()}`}
      submitLabel={t('remarks.add')}
      isBusy={add.isPending}
      onSubmit={add.mutate}
      onCancel={onDone}
    />
  )
}

interface EntryProps {
  number: number
  remark: Remark
  reading: Reading
  review: Review
  isChosen: boolean
  choose: () => void
}

function RemarkEntry({ number, remark, reading, review, isChosen, choose }: EntryProps) {
  const { t } = useTranslation('review')
  const { author, text, place, createdAt, answers, closed } = remark
  return (
    <li
      className={classNames(
        'grid grid-cols-[1.75rem_minmax(0,1fr)] border-hairline border-t py-2 first:border-t-0',
        isChosen && 'bg-step-active',
      )}
    >
      <button
        type="button"
        onClick={choose}
        aria-label={t('remarks.pin', { number })}
        className={classNames(
          'h-5 w-5 rounded-full text-axis font-semibold text-on-ink',
          closed ? 'bg-muted' : 'bg-chestnut',
        )}
      >
        {number}
      </button>
      <div className="min-w-0">
        <p className={classNames('whitespace-pre-line', closed && 'text-muted')}>{text}</p>
        <p className="text-axis text-muted">
          {author.name}, {formatMoment(createdAt)}
          {place === null && `, ${t('remarks.onWhole')}`}
        </p>
        {answers.map((answer) => (
          <div key={answer.id} className="mt-1.5 border-hairline border-l pl-3">
            <p className="whitespace-pre-line">{answer.text}</p>
            <p className="text-axis text-muted">
              {answer.author.name}, {formatMoment(answer.createdAt)}
            </p>
          </div>
        ))}
        {closed ? (
          <p className="mt-1 text-axis text-muted">
            {t('remarks.closedBy', { name: closed.by.name, when: formatMoment(closed.at) })}
          </p>
        ) : (
          <RemarkActions number={number} remark={remark} reading={reading} review={review} />
        )}
      </div>
    </li>
  )
}

function RemarkActions({ number, remark, reading, review }: Omit<EntryProps, 'isChosen' | 'choose'>) {
  const { t } = useTranslation('review')
  const session = useSession()
  const reviews = useMay('reading:review')
  const isTaker = session.data?.id === reading.takenBy.id
  const [isAnswering, setAnswering] = useState(false)
  const run = useMutation({
    mutationFn: (job: () => Promise<void>) => job(),
    onSuccess: () => setAnswering(false),
    onError: (error) => toast.error(error.message),
  })
  const mayClose = reviews && review.refusal !== 'ownReading'
  if (!isTaker && !reviews) return null
  if (isAnswering) {
    return (
      <RemarkForm
        label={t('remarks.answerText', { number })}
        submitLabel={t('remarks.answer')}
        isBusy={run.isPending}
        onSubmit={(text) => run.mutate(() => answerRemark(reading.id, remark.id, text))}
        onCancel={() => setAnswering(false)}
      />
    )
  }
  return (
    <div className="flex gap-5">
      <Button kind="quiet" onClick={() => setAnswering(true)}>
        {t('remarks.answer')}
      </Button>
      {mayClose && (
        <Button
          kind="quiet"
          disabled={run.isPending}
          aria-label={t('remarks.closeNamed', { number })}
          onClick={() => run.mutate(() => closeRemark(reading.id, remark.id))}
        >
          {t('remarks.close')}
        </Button>
      )}
    </div>
  )
}
