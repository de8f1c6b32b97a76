import { useTranslation } from 'react-i18next'
import { ErrorState } from '@/components/error-state'
import { Section } from '@/components/section'
import { formatMoment } from '@/lib/format-when'
import { useEvents } from '@/lib/queries/readings'
import { useMay } from '@/lib/session'

interface Props {
  of: 'reading' | 'certificate'
  id: string
}

/** Who did what to it, for those who may read the trail. */
export function EventsSection({ of, id }: Props) {
  const { t, i18n } = useTranslation('readings')
  const mayRead = useMay('event:read')
  const events = useEvents(of, id, mayRead)
  if (!mayRead) return null
  const words = (kind: string) => {
    // A dot in a key would part it.
    const key = `readings:page.events.kind.${kind.replace('.', '_')}`
    return i18n.exists(key) ? t(key) : kind
  }
  return (
    <Section title={t('page.events.title')} note={t('page.events.note')}>
      {events.isError && <ErrorState error={events.error} retry={events.refetch} />}
      <ul>
        {events.data?.rows.map((event) => (
          <li
            key={event.seq}
            className="grid grid-cols-[12rem_minmax(0,1fr)_12rem] gap-x-4 border-hairline border-t py-1.5 first:border-t-0"
          >
            <time dateTime={event.at} className="text-muted">
              {formatMoment(event.at)}
            </time>
            <span>{words(event.kind)}</span>
            <span className="text-muted">{event.actorName}</span>
          </li>
        ))}
      </ul>
    </Section>
  )
}
