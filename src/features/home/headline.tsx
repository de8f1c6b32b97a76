import type { Home } from '@shared/schemas/home'
import type { ReactNode } from 'react'
import { Trans, useTranslation } from 'react-i18next'

/** The day in a sentence or three: what waits, what fell out, what is due. */
export function Headline({ home }: { home: Home }) {
  const { t } = useTranslation('home')
  const word = useNumberWord()
  const waits = home.waiting.length
  const out = home.outOfTolerance.length
  return (
    <>
      {waits === 0 ? (
        t('headline.nothingWaits')
      ) : (
        <Trans
          t={t}
          i18nKey="headline.waiting"
          count={waits}
          values={{ number: word(waits) }}
          components={{ n: <Counted /> }}
        />
      )}{' '}
      {out > 0 && (
        <Trans
          t={t}
          i18nKey="headline.out"
          count={out}
          values={{ number: word(out) }}
          components={{ n: <Counted needsPerson /> }}
        />
      )}{' '}
      <DueSentence due={home.due} />
    </>
  )
}

function DueSentence({ due }: { due: Home['due'] }) {
  const { t } = useTranslation('home')
  const word = useNumberWord()
  if (due.length === 0) return null
  const [only] = due
  if (due.length > 1) {
    return (
      <Trans
        t={t}
        i18nKey="headline.due"
        count={due.length}
        values={{ number: word(due.length) }}
        components={{ n: <Counted /> }}
      />
    )
  }
  return (
    <Trans
      t={t}
      i18nKey={only.daysLeft < 0 ? 'headline.overdueOne' : 'headline.dueOne'}
      values={{ name: only.equipment.name, days: only.daysLeft }}
      components={{ n: <Counted needsPerson={only.daysLeft < 0} /> }}
    />
  )
}

function Counted({ needsPerson = false, children }: { needsPerson?: boolean; children?: ReactNode }) {
  return <span className={needsPerson ? 'font-semibold text-chestnut' : 'font-semibold'}>{children}</span>
}

/** Numbers up to twelve are words at the head of a sentence. */
function useNumberWord(): (count: number) => string {
  const { t, i18n } = useTranslation()
  return (count) => {
    const key = `common:number.words.${count}`
    return i18n.exists(key) ? t(key) : String(count)
  }
}
