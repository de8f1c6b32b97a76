import type { ReactNode } from 'react'
import { classNames } from '@/lib/class-names'

/** A key beside the word of what it does; readers are told by `aria-keyshortcuts` where it matters. */
export function KeyCap({ children, onInk = false }: { children: ReactNode; onInk?: boolean }) {
  return (
    <kbd
      className={classNames(
        'inline-flex h-[18px] min-w-[16px] items-center justify-center rounded border px-1 font-normal font-sans text-key',
        onInk ? 'border-on-ink/50 text-on-ink' : 'border-edge text-muted',
      )}
    >
      {children}
    </kbd>
  )
}
