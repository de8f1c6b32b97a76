import { type KeyboardEvent, useEffect, useId, useRef, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { useLocation, useNavigate } from 'react-router-dom'
import { KeyCap } from '@/components/key-cap'
import { useHotKey } from '@/lib/use-hot-key'
import { type FoundEntry, foundEntries } from './found-entries'
import { FoundList } from './found-list'
import { useSearch } from './use-search'

/** "/" from anywhere; arrows choose, Enter opens, Escape leaves. */
export function SearchBox() {
  const { t } = useTranslation()
  const inputRef = useRef<HTMLInputElement>(null)
  const listId = useId()
  const navigate = useNavigate()
  const [text, setText] = useState('')
  const [isOpen, setOpen] = useState(false)
  const [at, setAt] = useState(0)
  const search = useSearch(text)
  const entries = search.data && text.trim() !== '' ? foundEntries(search.data, t) : []
  const chosen = entries[Math.min(at, entries.length - 1)]
  const isShown = isOpen && text.trim() !== ''
  useHotKey('/', () => inputRef.current?.focus())
  useClosedByMove(() => setOpen(false))

  const go = (entry: FoundEntry) => {
    setOpen(false)
    setText('')
    inputRef.current?.blur()
    navigate(entry.to)
  }
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Escape') {
      setOpen(false)
      inputRef.current?.blur()
    } else if (event.key === 'Enter' && isShown && chosen) {
      go(chosen)
    } else if ((event.key === 'ArrowDown' || event.key === 'ArrowUp') && entries.length > 0) {
      event.preventDefault()
      const step = event.key === 'ArrowDown' ? 1 : -1
      setAt((before) => (Math.min(before, entries.length - 1) + step + entries.length) % entries.length)
    }
  }
  return (
    <search className="relative min-w-0 max-desk:flex-1 max-desk:max-w-[22rem]">
      <input
        ref={inputRef}
        type="text"
        role="combobox"
        aria-label={t('nav:search.label')}
        aria-keyshortcuts="/"
        aria-expanded={isShown}
        aria-controls={listId}
        aria-autocomplete="list"
        aria-activedescendant={isShown && chosen ? `${listId}-${chosen.key}` : undefined}
        autoComplete="off"
        placeholder={t('nav:search.placeholder')}
        value={text}
        onFocus={() => setOpen(true)}
        onBlur={() => setOpen(false)}
        onKeyDown={onKeyDown}
        onChange={(event) => {
          setText(event.target.value)
          setAt(0)
          setOpen(true)
        }}
        className="h-[30px] w-[15.625rem] rounded border border-edge bg-field pr-8 pl-2.5 text-second placeholder:text-muted max-desk:h-10 max-desk:w-full"
      />
      <span className="pointer-events-none absolute inset-y-0 right-2 flex items-center">
        <KeyCap>/</KeyCap>
      </span>
      <div hidden={!isShown}>
        <FoundList
          id={listId}
          entries={entries}
          chosenKey={chosen?.key}
          text={text.trim()}
          isSearching={search.isFetching && entries.length === 0}
          onChoose={go}
        />
      </div>
    </search>
  )
}

function useClosedByMove(close: () => void): void {
  const { key } = useLocation()
  const latest = useRef(close)
  latest.current = close
  // biome-ignore lint/correctness/useExhaustiveDependencies: runs on every move to another page
  useEffect(() => latest.current(), [key])
}
