import { Label } from 'radix-ui'
import { type ReactNode, useId } from 'react'
import { classNames } from '@/lib/class-names'

export interface FieldProps {
  label: string
  /** Stands below the label: what to give, in which unit. */
  hint?: ReactNode
  /** A whole sentence; the field counts as wrong while it is there. */
  error?: string
  className?: string
}

/** What ties an input to its label, hint and error. */
export interface Wiring {
  id: string
  'aria-describedby': string | undefined
  'aria-invalid': true | undefined
}

interface Props extends FieldProps {
  children: (wiring: Wiring) => ReactNode
}

export const inputLook =
  'h-[34px] w-full rounded border border-edge bg-field px-2.5 text-body text-ink placeholder:text-muted max-desk:h-10 disabled:bg-transparent disabled:text-muted aria-invalid:border-chestnut aria-invalid:border-[1.5px]'

/** Label above, hint and error below, tied together for whoever doesn't see them. */
export function Field({ label, hint, error, className, children }: Props) {
  const id = useId()
  const hintId = `${id}-hint`
  const errorId = `${id}-error`
  const describedBy = [hint && hintId, error && errorId].filter(Boolean).join(' ')
  return (
    <div className={classNames('flex flex-col gap-1', className)}>
      <Label.Root htmlFor={id} className="text-second text-muted">
        {label}
      </Label.Root>
      {children({
        id,
        'aria-describedby': describedBy || undefined,
        'aria-invalid': error ? true : undefined,
      })}
      {hint && (
        <p id={hintId} className="text-axis text-muted">
          {hint}
        </p>
      )}
      {error && (
        <p id={errorId} role="alert" className="text-second text-chestnut">
          {error}
        </p>
      )}
    </div>
  )
}
