import { type ReactNode, useEffect, useRef } from 'react'

interface Props {
  /** Stands in the margin column. */
  margin?: ReactNode
  title: ReactNode
  actions?: ReactNode
  children?: ReactNode
}

/** The top of a page: margin column, title, what can be done. Takes focus when the page opens. */
export function PageHead({ margin, title, actions, children }: Props) {
  const headingRef = useRef<HTMLHeadingElement>(null)
  useEffect(() => {
    headingRef.current?.focus({ preventScroll: true })
  }, [])
  return (
    <header className="grid grid-cols-1 pt-6 pb-5 desk:grid-cols-[9.5rem_minmax(0,1fr)]">
      <div className="pt-1 text-muted text-second">{margin}</div>
      <div className="min-w-0">
        <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3 desk:flex-nowrap">
          <h1 ref={headingRef} tabIndex={-1} className="min-w-0 text-headline">
            {title}
          </h1>
          {actions && <div className="flex shrink-0 flex-wrap gap-2.5">{actions}</div>}
        </div>
        {children}
      </div>
    </header>
  )
}
