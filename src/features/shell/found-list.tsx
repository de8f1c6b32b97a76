import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'
import type { FoundEntry } from './found-entries'

interface Props {
  id: string
  entries: readonly FoundEntry[]
  chosenKey: string | undefined
  text: string
  isSearching: boolean
  onChoose: (entry: FoundEntry) => void
}

export function FoundList({ id, entries, chosenKey, text, isSearching, onChoose }: Props) {
  const { t } = useTranslation('nav')
  const said = isSearching
    ? t('search.searching')
    : entries.length === 0
      ? t('search.nothing', { text })
      : t('search.count', { count: entries.length })
  return (
    <div className="absolute top-full right-0 z-40 mt-1.5 w-[26rem] max-w-[92vw] rounded border border-ink bg-field">
      <p
        role="status"
        className={classNames('px-3 py-2 text-muted text-second', entries.length > 0 && 'sr-only')}
      >
        {said}
      </p>
      <div id={id} role="listbox" aria-label={t('search.label')} className="max-h-[60vh] overflow-y-auto">
        {entries.map((entry, i) => (
          <FoundRow
            key={entry.key}
            id={`${id}-${entry.key}`}
            entry={entry}
            groupName={entries[i - 1]?.group === entry.group ? '' : t(`search.${entry.group}`)}
            isChosen={entry.key === chosenKey}
            onChoose={onChoose}
          />
        ))}
      </div>
    </div>
  )
}

interface RowProps {
  id: string
  entry: FoundEntry
  groupName: string
  isChosen: boolean
  onChoose: (entry: FoundEntry) => void
}

function FoundRow({ id, entry, groupName, isChosen, onChoose }: RowProps) {
  return (
    // biome-ignore lint/a11y/useFocusableInteractive: focus stays in the field, which names the active option
    // biome-ignore lint/a11y/useKeyWithClickEvents: the field's arrows and Enter choose
    <div
      id={id}
      role="option"
      aria-selected={isChosen}
      // Before the field loses focus, which would close the list.
      onMouseDown={(event) => event.preventDefault()}
      onClick={() => onChoose(entry)}
      className={classNames(
        'grid cursor-pointer grid-cols-[5.5rem_minmax(0,1fr)] items-baseline px-3 py-1.5 hover:bg-step-active max-desk:py-3',
        groupName && 'border-hairline border-t first:border-t-0',
        isChosen && 'bg-tool-active',
      )}
    >
      <span className="text-axis text-muted">{groupName}</span>
      <span className="truncate">
        <span className="font-semibold">{entry.main}</span>
        {entry.note && <span className="text-muted text-second"> {entry.note}</span>}
      </span>
    </div>
  )
}
