import type { ReactNode } from 'react'

/** Fields that narrow a list, in one row above it. */
export function FilterBar({ children }: { children: ReactNode }) {
  return <div className="mb-4 flex flex-wrap items-end gap-4 desk:pl-margin">{children}</div>
}
