import { useId, useState } from 'react'
import { parseNumber } from '@/components/fields/number-field'
import { classNames } from '@/lib/class-names'

interface Props {
  label: string
  value: number | null
  /** Not called for what isn't a number or lies outside the limits; what was there then stands again. */
  onCommit: (value: number | null) => void
  least: number
  most: number
  whole?: boolean
  mayBeEmpty?: boolean
  placeholder?: string
  disabled?: boolean
  labelHidden?: boolean
  className?: string
}

/** A number that counts once Enter is pressed or the field is left, so that it is one step for undo. */
export function SmallNumber(props: Props) {
  const { label, value, labelHidden, placeholder, disabled, className } = props
  const id = useId()
  const [text, setText] = useState<string | null>(null)
  const commit = () => {
    if (text === null) return
    setText(null)
    const typed = parseNumber(text)
    if (typed !== value && isAllowed(typed, props)) props.onCommit(typed)
  }
  const shown = text ?? (value === null ? '' : String(value).replace('-', '\u2212'))
  const input = (
    <input
      id={id}
      type="text"
      inputMode="decimal"
      autoComplete="off"
      aria-label={labelHidden ? label : undefined}
      placeholder={placeholder}
      disabled={disabled}
      value={shown}
      onChange={(event) => setText(event.target.value)}
      onBlur={commit}
      onKeyDown={(event) => {
        if (event.key === 'Enter') commit()
        if (event.key === 'Escape') setText(null)
      }}
      className={classNames(
        'h-7 w-16 rounded border border-edge bg-field px-1.5 text-right text-second text-ink placeholder:text-muted disabled:opacity-60 max-desk:h-11',
        className,
      )}
    />
  )
  if (labelHidden) return input
  return (
    <div className="flex items-center justify-between gap-2 text-second">
      <label htmlFor={id} className="text-muted">
        {label}
      </label>
      {input}
    </div>
  )
}

function isAllowed(typed: number | null, { least, most, whole, mayBeEmpty }: Props): boolean {
  if (typed === null) return mayBeEmpty === true
  if (Number.isNaN(typed) || typed < least || typed > most) return false
  return !whole || Number.isInteger(typed)
}
