import { useSyncExternalStore } from 'react'

/** The width of the `desk` screens in tailwind.config.ts. */
const query = '(min-width: 1100px)'

function subscribe(onChange: () => void): () => void {
  const list = window.matchMedia(query)
  list.addEventListener('change', onChange)
  return () => list.removeEventListener('change', onChange)
}

/** Wide enough for the margin column; below it pages are laid out for a tablet. */
export function useIsDesk(): boolean {
  return useSyncExternalStore(subscribe, () => window.matchMedia(query).matches)
}
