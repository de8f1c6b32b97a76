import { useEffect, useRef } from 'react'

/** Typing in a field, or a dialog on top, is never a command. */
function isBusyElsewhere(event: KeyboardEvent): boolean {
  const target = event.target instanceof Element ? event.target : null
  const typing = target?.closest('input, textarea, select, [contenteditable="true"]') != null
  return typing || document.querySelector('[role="dialog"], [role="alertdialog"], [role="menu"]') !== null
}

/** Runs `act` when the key is pressed alone on this page. */
export function useHotKey(key: string, act: () => void, enabled = true): void {
  const latest = useRef(act)
  latest.current = act
  useEffect(() => {
    if (!enabled) return
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key.toLowerCase() !== key.toLowerCase()) return
      if (event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return
      if (isBusyElsewhere(event)) return
      event.preventDefault()
      latest.current()
    }
    document.addEventListener('keydown', onKeyDown)
    return () => document.removeEventListener('keydown', onKeyDown)
  }, [key, enabled])
}
