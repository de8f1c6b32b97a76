import type { ReactNode } from 'react'

/** Nothing here yet, and what to do next. */
export function EmptyState({ children, action }: { children: ReactNode; action?: ReactNode }) {
  return (
    <div className="flex flex-col items-start gap-3 py-3">
      <p className="max-w-[80ch] text-body text-muted">{children}</p>
      {action}
    </div>
  )
}
