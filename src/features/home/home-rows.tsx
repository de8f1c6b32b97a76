import type { ReadingRow } from '@shared/schemas/readings'
import type { TFunction } from 'i18next'
import { useTranslation } from 'react-i18next'
import { ReadingLine } from '@/components/readings/reading-line'
import { formatSince } from '@/lib/format-when'

export function WaitingRow({ reading }: { reading: ReadingRow }) {
  const { t } = useTranslation('home')
  const isBack = reading.state === 'sentBack'
  const facts = {
    name: reading.takenBy.name,
    number: reading.number,
    face: reading.faceName,
    reason: reading.sentBackReason,
  }
  return (
    <ReadingLine
      reading={reading}
      to={reading.state === 'sentForReview' ? `/review/${reading.id}` : `/readings/${reading.id}`}
      what={t(`waiting.${reading.state}`, facts)}
      note={t(`waiting.${reading.state}Note`, facts)}
      when={formatSince(reading.updatedAt)}
      needsPerson={isBack}
    />
  )
}

export function DraftRow({ reading }: { reading: ReadingRow }) {
  const { t } = useTranslation('home')
  return (
    <ReadingLine
      reading={reading}
      to={reading.photoSha256 ? `/readings/${reading.id}/table` : `/readings/${reading.id}`}
      what={t('drafts.what', { number: reading.number })}
      note={t(`drafts.${nextStep(reading)}`)}
      when={formatSince(reading.updatedAt)}
    />
  )
}

function nextStep({ photoSha256, result }: ReadingRow): 'noPhoto' | 'noResult' | 'refused' | 'figure' {
  if (!photoSha256) return 'noPhoto'
  if (!result) return 'noResult'
  return result.outcome === 'refused' ? 'refused' : 'figure'
}

export function OutRow({ reading }: { reading: ReadingRow }) {
  const { t } = useTranslation('home')
  return (
    <ReadingLine
      reading={reading}
      to={`/readings/${reading.id}`}
      what={formOf(reading, t)}
      note={t('out.whatNote', {
        number: reading.number,
        name: reading.takenBy.name,
        state: t(`common:state.${reading.state}`),
      })}
      when={formatSince(reading.updatedAt)}
      needsPerson
    />
  )
}

function formOf({ result }: ReadingRow, t: TFunction<'home'>): string {
  if (!result?.form) return t('out.noForm')
  const words = t(`form:word.${result.form}`)
  return words.charAt(0).toUpperCase() + words.slice(1)
}
