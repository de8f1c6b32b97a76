import type { ComponentProps } from 'react'
import { classNames } from '@/lib/class-names'
import { Field, type FieldProps, inputLook } from './field'

type TextFieldProps = FieldProps &
  Omit<ComponentProps<'input'>, 'id' | 'className'> & { inputClassName?: string }

export function TextField({ label, hint, error, className, inputClassName, ...input }: TextFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(wiring) => (
        <input type="text" {...input} {...wiring} className={classNames(inputLook, inputClassName)} />
      )}
    </Field>
  )
}

type TextAreaFieldProps = FieldProps & Omit<ComponentProps<'textarea'>, 'id' | 'className'>

export function TextAreaField({ label, hint, error, className, ...input }: TextAreaFieldProps) {
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(wiring) => (
        <textarea
          rows={3}
          {...input}
          {...wiring}
          className={classNames(inputLook, 'h-auto max-desk:h-auto py-1.5')}
        />
      )}
    </Field>
  )
}
