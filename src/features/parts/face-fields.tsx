import { Controller, useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { NumberField } from '@/components/fields/number-field'
import { SelectField } from '@/components/fields/select-field'
import { errorText } from '@/lib/form-errors'
import type { FaceForm } from './face-form'

type NamesOf<T> = { [K in keyof FaceForm]: FaceForm[K] extends T ? K : never }[keyof FaceForm]

interface NumberProps {
  name: Exclude<NamesOf<number | null>, NamesOf<string>>
  label: string
  unit?: string
}

export function NumberOf({ name, label, unit }: NumberProps) {
  const { t } = useTranslation('parts')
  const { control } = useFormContext<FaceForm>()
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <NumberField
          label={label}
          unit={unit}
          value={field.value}
          onChange={field.onChange}
          onBlur={field.onBlur}
          ref={field.ref}
          error={errorText(t, fieldState.error)}
        />
      )}
    />
  )
}

interface ChoiceProps {
  name: 'shape' | 'toleranceKind' | 'reference' | 'ruleKind' | 'support'
  label: string
  values: readonly string[]
  /** Key under which the values have their words. */
  words: string
  hint?: string
  className?: string
}

export function ChoiceOf({ name, label, values, words, hint, className }: ChoiceProps) {
  const { t } = useTranslation('parts')
  const { control } = useFormContext<FaceForm>()
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <SelectField
          label={label}
          hint={hint}
          className={className}
          choices={values.map((value) => ({ value, label: t(`${words}.${value}`) }))}
          value={field.value}
          onChange={field.onChange}
          error={errorText(t, fieldState.error)}
        />
      )}
    />
  )
}
