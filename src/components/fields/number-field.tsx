import { type ComponentProps, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'
import { Field, type FieldProps, inputLook } from './field'

interface NumberFieldProps
  extends FieldProps,
    Pick<ComponentProps<'input'>, 'name' | 'disabled' | 'ref' | 'placeholder'> {
  /** null is empty, NaN is something that isn't a number. */
  value: number | null
  onChange: (value: number | null) => void
  onBlur?: () => void
  /** Stands after the input: mm, nm, °C. */
  unit?: string
}

/** A number, with a comma or a point; whatever else is typed is said to be none and given as NaN. */
export function NumberField({
  label,
  hint,
  error,
  className,
  value,
  onChange,
  onBlur,
  unit,
  ...input
}: NumberFieldProps) {
  const { t } = useTranslation()
  const [text, setText] = useState(() => textOf(value))
  const typed = parseNumber(text)
  // A value set from outside, such as by a reset, replaces what was typed.
  const shown = Object.is(typed, value) ? text : textOf(value)
  const problem = Number.isNaN(typed) && Number.isNaN(value) ? t('common:number.notANumber') : error
  return (
    <Field label={unit ? `${label}, ${unit}` : label} hint={hint} error={problem} className={className}>
      {(wiring) => (
        <input
          {...input}
          {...wiring}
          type="text"
          inputMode="decimal"
          autoComplete="off"
          value={shown}
          onBlur={onBlur}
          onChange={(event) => {
            setText(event.target.value)
            onChange(parseNumber(event.target.value))
          }}
          className={classNames(inputLook, 'text-right')}
        />
      )}
    </Field>
  )
}

function textOf(value: number | null): string {
  return value === null || Number.isNaN(value) ? '' : String(value).replace('-', '\u2212')
}

/** null when empty, NaN when it isn't a number. */
export function parseNumber(text: string): number | null {
  const plain = text.trim().replace(',', '.').replace('\u2212', '-')
  if (plain === '') return null
  return /^[+-]?(\d+(\.\d*)?|\.\d+)$/.test(plain) ? Number(plain) : Number.NaN
}
