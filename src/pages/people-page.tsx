import type { Person } from '@shared/schemas/people'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { PageHead } from '@/components/page-head'
import { Section } from '@/components/section'
import { AddPersonDialog, ChangePersonDialog } from '@/features/people/person-dialog'
import { classNames } from '@/lib/class-names'
import { formatDay } from '@/lib/format-when'
import { usePeople } from '@/lib/queries/people'
import { useMay, useMe } from '@/lib/session'
import { useDocumentTitle } from '@/lib/use-document-title'

export function PeoplePage() {
  const { t } = useTranslation('people')
  const people = usePeople()
  const mayManage = useMay('person:manage')
  const [shown, setShown] = useState<Person | 'new' | null>(null)
  useDocumentTitle(t('title'))
  if (people.isPending) return <Loading />
  if (people.isError) return <ErrorState error={people.error} retry={people.refetch} />
  return (
    <>
      <PageHead
        title={t('title')}
        actions={
          mayManage && (
            <Button kind="main" onClick={() => setShown('new')}>
              {t('add')}
            </Button>
          )
        }
      />
      <Section title={t('list.title')} note={t('list.note')}>
        <ul>
          {people.data.rows.map((person) => (
            <PersonRow
              key={person.id}
              person={person}
              onEdit={mayManage ? () => setShown(person) : undefined}
            />
          ))}
        </ul>
      </Section>
      {shown === 'new' && <AddPersonDialog onClose={() => setShown(null)} />}
      {shown && shown !== 'new' && <ChangePersonDialog person={shown} onClose={() => setShown(null)} />}
    </>
  )
}

function PersonRow({ person, onEdit }: { person: Person; onEdit?: () => void }) {
  const { t } = useTranslation('people')
  const me = useMe()
  const { id, name, email, roles, active, createdAt } = person
  return (
    <li className="grid min-h-[52px] grid-cols-[minmax(0,1fr)_minmax(0,1.2fr)_minmax(0,1fr)_4rem] items-center gap-x-4 border-hairline border-t py-1.5 first:border-t-0">
      <div className="min-w-0">
        <span className={classNames('font-semibold', !active && 'text-muted')}>{name}</span>
        {id === me.id && <span className="text-muted text-second"> {t('you')}</span>}
        <span className="block truncate text-muted text-second">{email}</span>
      </div>
      <span>{roles.map((role) => t(`role.${role}`)).join(', ')}</span>
      <span className="text-muted text-second">
        {active ? t('since', { day: formatDay(createdAt) }) : t('inactive')}
      </span>
      {onEdit && (
        <Button kind="quiet" className="justify-self-end" onClick={onEdit} aria-label={t('edit', { name })}>
          {t('common:edit')}
        </Button>
      )}
    </li>
  )
}
