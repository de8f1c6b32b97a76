import { type ReactNode, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { Button } from '@/components/button'
import { Dialog } from '@/components/dialog'
import type { Conflict, Saving } from '../saving/use-autosave'
import { clockTime } from './save-words'

/** Somebody saved meanwhile: first who and when, then theirs on the table, then the choice. Nothing is lost by either. */
export function ConflictView({ saving }: { saving: Saving }) {
  const { conflict } = saving
  if (!conflict) return null
  return conflict.theirs ? (
    <Choice conflict={conflict} saving={saving} />
  ) : (
    <Told conflict={conflict} saving={saving} />
  )
}

interface Props {
  conflict: Conflict
  saving: Saving
}

function Told({ conflict, saving }: Props) {
  const { t } = useTranslation('table')
  const [isHidden, setHidden] = useState(false)
  const [isLoading, setLoading] = useState(false)
  const { stale, mine } = conflict
  const look = () => {
    setLoading(true)
    saving
      .showTheirs()
      .catch((error: Error) => toast.error(error.message))
      .finally(() => setLoading(false))
  }
  if (isHidden) {
    return (
      <Banner>
        <span>{t('save.stale')}</span>
        <Button onClick={look}>{t('conflict.look')}</Button>
      </Banner>
    )
  }
  return (
    <Dialog
      open
      onClose={() => setHidden(true)}
      title={t('conflict.title')}
      description={
        stale.savedBy && stale.savedAt
          ? t('conflict.description', { name: stale.savedBy, time: clockTime(stale.savedAt) })
          : t('conflict.descriptionUnknown')
      }
    >
      <p className="mb-5 text-body">
        {t('conflict.mine', { bands: mine.traces.length, leaveOuts: mine.leaveOuts.length })}
      </p>
      <Button kind="main" disabled={isLoading} onClick={look}>
        {t(isLoading ? 'conflict.looking' : 'conflict.look')}
      </Button>
    </Dialog>
  )
}

function Choice({ conflict: { stale }, saving }: Props) {
  const { t } = useTranslation('table')
  return (
    <Banner>
      <span>
        {stale.savedBy && stale.savedAt
          ? t('conflict.shown', { name: stale.savedBy, time: clockTime(stale.savedAt) })
          : t('conflict.shownUnknown')}{' '}
        <span className="text-muted">{t('conflict.undoNote')}</span>
      </span>
      <Button kind="main" onClick={saving.keepTheirs}>
        {t('conflict.keepTheirs')}
      </Button>
      <Button onClick={saving.keepMine}>{t('conflict.keepMine')}</Button>
    </Banner>
  )
}

function Banner({ children }: { children: ReactNode }) {
  return (
    <div
      role="alert"
      className="absolute inset-x-3 top-3 flex flex-wrap items-center gap-x-4 gap-y-2 border-chestnut border-l-2 bg-ground/95 px-4 py-2.5 text-body"
    >
      {children}
    </div>
  )
}
