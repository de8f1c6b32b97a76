import type { ReactNode } from 'react'

export interface Fact {
  name: string
  value: ReactNode
}

/** Names above values in a row, parted by air alone. */
export function Facts({ facts }: { facts: readonly Fact[] }) {
  return (
    <dl className="flex flex-wrap gap-x-10 gap-y-3">
      {facts.map(({ name, value }) => (
        <div key={name} className="min-w-0">
          <dt className="text-axis text-muted">{name}</dt>
          <dd className="text-body">{value}</dd>
        </div>
      ))}
    </dl>
  )
}
