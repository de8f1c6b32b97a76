import type { TFunction } from 'i18next'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'
import type { SaveState } from '../saving/autosave'

const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', second: '2-digit' })

export function clockTime(iso: string): string {
  return clock.format(new Date(iso))
}

/** Whether what is on the table is kept. */
export function SaveWords({ state, mayEdit }: { state: SaveState; mayEdit: boolean }) {
  const { t } = useTranslation('table')
  const needsPerson = state.kind === 'offline' || state.kind === 'stale' || state.kind === 'refused'
  return (
    <p
      role="status"
      data-save={state.kind}
      title={state.kind === 'offline' ? t('save.offline') : undefined}
      className={classNames(
        'min-w-0 max-w-[22rem] truncate text-second',
        needsPerson ? 'text-chestnut' : 'text-muted max-desk:hidden',
      )}
    >
      {mayEdit ? words(t, state) : t('save.readOnly')}
    </p>
  )
}

function words(t: TFunction<'table'>, state: SaveState): string {
  switch (state.kind) {
    case 'saved':
      return state.savedAt ? t('save.savedAt', { time: clockTime(state.savedAt) }) : t('save.saved')
    case 'saving':
      return t('save.saving')
    case 'offline':
      return t('save.offlineShort')
    case 'stale':
      return t('save.stale')
    case 'refused':
      return t('save.refused', { message: state.message })
  }
}
