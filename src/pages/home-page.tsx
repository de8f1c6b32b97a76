import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { NewReadingLink } from '@/components/new-reading-link'
import { PageHead } from '@/components/page-head'
import { LineHeads } from '@/components/readings/line-heads'
import { Section } from '@/components/section'
import { DueRow } from '@/features/home/due-row'
import { Headline } from '@/features/home/headline'
import { DraftRow, OutRow, WaitingRow } from '@/features/home/home-rows'
import { formatDay, formatWeekday } from '@/lib/format-when'
import { useHome } from '@/lib/queries/readings'
import { useMay } from '@/lib/session'
import { useDocumentTitle } from '@/lib/use-document-title'

/** What waits for the person, what they were doing, what fell out, what is due. */
export function HomePage() {
  const { t } = useTranslation('home')
  const home = useHome()
  const takesReadings = useMay('reading:create')
  useDocumentTitle(t('title'))
  if (home.isPending) return <Loading />
  if (home.isError) return <ErrorState error={home.error} retry={home.refetch} />
  const { waiting, drafts, outOfTolerance, due } = home.data
  return (
    <>
      <PageHead margin={<Today />} title={<Headline home={home.data} />} actions={<NewReadingLink />} />
      <div className="desk:pl-margin">
        <LineHeads what={t('heads.what')} when={t('heads.since')} />
      </div>
      <HomeSection name="waiting">
        {waiting.map((r) => (
          <WaitingRow key={r.id} reading={r} />
        ))}
      </HomeSection>
      {takesReadings && (
        <HomeSection name="drafts">
          {drafts.map((r) => (
            <DraftRow key={r.id} reading={r} />
          ))}
        </HomeSection>
      )}
      <HomeSection name="out">
        {outOfTolerance.map((r) => (
          <OutRow key={r.id} reading={r} />
        ))}
      </HomeSection>
      <HomeSection name="due">
        {due.map((d) => (
          <DueRow key={d.equipment.id} due={d} />
        ))}
      </HomeSection>
    </>
  )
}

function Today() {
  const now = new Date()
  return (
    <>
      <span className="block">{formatWeekday(now)}</span>
      {formatDay(now.toISOString())}
    </>
  )
}

interface HomeSectionProps {
  name: 'waiting' | 'drafts' | 'out' | 'due'
  children: ReactNode[]
}

function HomeSection({ name, children }: HomeSectionProps) {
  const { t } = useTranslation('home')
  return (
    <Section title={t(`${name}.title`)} note={t(`${name}.note`)}>
      {children.length > 0 ? <ul>{children}</ul> : <EmptyState>{t(`${name}.empty`)}</EmptyState>}
    </Section>
  )
}
