import type { TFunction } from 'i18next'
import type { FieldValues, Path, UseFormSetError } from 'react-hook-form'
import { ApiFailure } from './api-failure'
import { i18n } from './i18n'

/** A field's or a form's own error, as react-hook-form keeps it. */
export interface FaultyField {
  type?: string | number
  message?: string
}

/** The sentence of a field's error: schemas give keys of the `errors` file, the server gives sentences. */
export function errorText(t: TFunction, error: FaultyField | undefined): string | undefined {
  if (!error) return undefined
  if (error.type === 'server') return error.message
  if (error.message && i18n.exists(`errors:${error.message}`)) return t(`errors:${error.message}`)
  return t(`errors:${generalKey(error.type)}`)
}

function generalKey(type: FaultyField['type']): string {
  switch (type) {
    case 'invalid_type':
    case 'required':
      return 'field.missing'
    case 'too_small':
      return 'field.tooSmall'
    case 'too_big':
      return 'field.tooBig'
    default:
      return 'field.invalid'
  }
}

/** Puts what the server refused at the fields it names, and at the form's foot. */
export function showFailure<T extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<T>,
  fallback: string,
): void {
  if (!(error instanceof ApiFailure)) {
    setError('root', { type: 'server', message: fallback })
    return
  }
  const fields = Object.entries(error.fields)
  for (const [path, message] of fields)
    setError(path as Path<T>, { type: 'server', message }, { shouldFocus: true })
  // Said once is enough where it is the field's own sentence.
  if (!Object.values(error.fields).includes(error.message)) {
    setError('root', { type: 'server', message: error.message })
  }
}
