import type { Reading } from '@shared/schemas/readings'
import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { Facts } from '@/components/facts'
import { PageHead } from '@/components/page-head'
import { useFaceWords } from '@/components/readings/face-words'
import { formatMoment } from '@/lib/format-when'
import { ReadingActions } from './reading-actions'

interface Props {
  reading: Reading
  /** What others than the taker may do, put there by the page. */
  more?: ReactNode
}

export function ReadingHead({ reading, more }: Props) {
  const { t } = useTranslation('readings')
  const words = useFaceWords()
  const { number, partNumber, serial, partName, face, sentBackReason, setAsideCause } = reading
  return (
    <PageHead
      margin={
        <>
          <span className="block">{t('page.taken', { when: formatMoment(reading.createdAt) })}</span>
          {t('page.by', { name: reading.takenBy.name })}
        </>
      }
      title={
        <span className="text-title">
          <Link
            to={`/pieces/${reading.pieceId}`}
            className="font-semibold hover:underline hover:decoration-edge hover:underline-offset-4"
          >
            {partNumber} · {serial}
          </Link>{' '}
          <span className="ml-1 font-light">
            {partName}, {t('page.title', { number }).toLowerCase()}
          </span>
        </span>
      }
      actions={
        <>
          {more}
          <ReadingActions reading={reading} />
        </>
      }
    >
      <div className="mt-3 flex flex-col gap-3">
        <Facts
          facts={[
            { name: t('page.facts.state'), value: t(`common:state.${reading.state}`) },
            { name: t('page.facts.face'), value: `${face.name}, ${words.size(face)}` },
            { name: t('page.facts.tolerance'), value: words.typedTolerance(face.tolerance) },
            { name: t('page.facts.rule'), value: words.rule(face.rule) },
            { name: t('page.facts.customer'), value: reading.customerName },
            ...(reading.correctsId
              ? [
                  {
                    name: t('page.corrects'),
                    value: (
                      <Link to={`/readings/${reading.correctsId}`} className="underline underline-offset-3">
                        {t('page.correctsLink')}
                      </Link>
                    ),
                  },
                ]
              : []),
          ]}
        />
        {sentBackReason && (
          <p className="max-w-[70ch] text-chestnut">{t('page.sentBackFor', { reason: sentBackReason })}</p>
        )}
        {setAsideCause && (
          <p className="max-w-[70ch] text-chestnut">{t('page.setAsideFor', { cause: setAsideCause })}</p>
        )}
      </div>
    </PageHead>
  )
}
