import type { Reading } from '@shared/schemas/readings'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { Button } from '@/components/button'
import { KeyCap } from '@/components/key-cap'
import { LapwingMark } from '@/components/lapwing-mark'
import { canRedo, canUndo } from '../marks-history'
import type { SaveState } from '../saving/autosave'
import { isGestureOpen } from '../table-state'
import { useTable, useTableStore } from '../table-store'
import { SaveWords } from './save-words'

interface Props {
  reading: Reading
  setUpWords: readonly string[]
  saving: SaveState
  isSending: boolean
  onSend: () => void
}

export function TableTopBar({ reading, setUpWords, saving, isSending, onSend }: Props) {
  const { t } = useTranslation('table')
  const { partNumber, partName, serial, mayEdit, maySend } = reading
  return (
    <header className="flex h-[54px] items-center gap-3.5 px-4 max-desk:px-5 desk:h-[46px]">
      <Link
        to={`/readings/${reading.id}`}
        aria-label={t('back')}
        title={t('back')}
        className="flex min-h-11 items-center text-ink desk:min-h-0"
      >
        <LapwingMark />
      </Link>
      <h1 className="min-w-0 flex-1 truncate text-body">
        <span className="font-semibold text-section">
          {partNumber} · {serial}
        </span>
        <span className="ml-3 text-muted">{[partName, ...setUpWords].join('  ·  ')}</span>
      </h1>
      <SaveWords state={saving} mayEdit={mayEdit} />
      {mayEdit && <HistoryButtons />}
      {maySend && (
        <Button kind="main" className="h-[30px]" disabled={isSending} onClick={onSend}>
          {t(isSending ? 'send.busy' : 'send.word')}
        </Button>
      )}
    </header>
  )
}

function HistoryButtons() {
  const { t } = useTranslation('table')
  const store = useTableStore()
  const mayUndo = useTable((table) => canUndo(table.history) || isGestureOpen(table))
  const mayRedo = useTable((table) => canRedo(table.history))
  const look =
    'flex h-[30px] items-center gap-1.5 text-body disabled:text-muted disabled:opacity-80 max-desk:h-11 max-desk:px-1'
  return (
    <div className="flex gap-4">
      <button
        type="button"
        disabled={!mayUndo}
        aria-keyshortcuts="Control+Z"
        onClick={() => store.dispatch({ type: 'undo' })}
        className={look}
      >
        {t('undo')}
        <span aria-hidden="true" className="max-desk:hidden">
          <KeyCap>Z</KeyCap>
        </span>
      </button>
      <button
        type="button"
        disabled={!mayRedo}
        aria-keyshortcuts="Control+Shift+Z"
        onClick={() => store.dispatch({ type: 'redo' })}
        className={look}
      >
        {t('redo')}
        <span aria-hidden="true" className="max-desk:hidden">
          <KeyCap>⇧ Z</KeyCap>
        </span>
      </button>
    </div>
  )
}
