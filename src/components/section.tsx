import { type ReactNode, useId } from 'react'
import { classNames } from '@/lib/class-names'

interface Props {
  title: string
  /** Second line of the margin. */
  note?: ReactNode
  children: ReactNode
  className?: string
}

/** Opens with a line of ink; the heading stands in the margin column, what it heads beside it. */
export function Section({ title, note, children, className }: Props) {
  const headingId = useId()
  return (
    <section
      aria-labelledby={headingId}
      className={classNames(
        'grid grid-cols-1 border-ink border-t desk:grid-cols-[9.5rem_minmax(0,1fr)]',
        className,
      )}
    >
      <div className="pt-3 pr-3 pb-2">
        <h2 id={headingId} className="text-section">
          {title}
        </h2>
        {note && <p className="text-muted text-second">{note}</p>}
      </div>
      <div className="min-w-0 pb-6">{children}</div>
    </section>
  )
}
