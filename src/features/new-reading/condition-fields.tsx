import { Controller, useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { HeightField } from '@/components/fields/height-field'
import { NumberField } from '@/components/fields/number-field'
import { TextAreaField } from '@/components/fields/text-field'
import { Section } from '@/components/section'
import { errorText } from '@/lib/form-errors'
import type { NewReadingForm } from './new-reading-form'

export function ConditionFields() {
  const { t } = useTranslation('readings')
  const { register, formState } = useFormContext<NewReadingForm>()
  return (
    <Section title={t('new.conditions.title')} note={t('new.conditions.note')}>
      <div className="grid max-w-[48rem] grid-cols-3 gap-x-6 gap-y-4 pt-3">
        <NumberOf name="airTemperatureC" label={t('new.conditions.air')} unit="°C" />
        <NumberOf name="partTemperatureC" label={t('new.conditions.part')} unit="°C" />
        <NumberOf name="soakMinutes" label={t('new.conditions.soak')} unit={t('new.conditions.minutes')} />
        <HeightOf
          name="temperatureHalfWidthUm"
          label={t('new.conditions.gradient')}
          hint={t('new.conditions.gradientHint')}
        />
        <HeightOf name="meanGapUm" label={t('new.conditions.gap')} />
        <HeightOf name="supportHalfWidthUm" label={t('new.conditions.support')} />
        <NumberOf
          name="edgePlacementUMm"
          label={t('new.conditions.placement')}
          unit="mm"
          hint={t('new.conditions.placementHint')}
        />
        <HeightOf
          name="repeatSpreadUm"
          label={t('new.conditions.repeatSpread')}
          hint={t('new.conditions.repeatSpreadHint')}
        />
        <NumberOf name="repeatCount" label={t('new.conditions.repeatCount')} />
        <TextAreaField
          label={t('new.conditions.remark')}
          className="col-span-3"
          rows={2}
          error={errorText(t, formState.errors.note)}
          {...register('note')}
        />
      </div>
    </Section>
  )
}

interface NumberProps {
  name:
    | 'airTemperatureC'
    | 'partTemperatureC'
    | 'soakMinutes'
    | 'viewingAngleDeg'
    | 'viewingAngleUDeg'
    | 'edgePlacementUMm'
    | 'repeatCount'
  label: string
  unit?: string
  hint?: string
}

export function NumberOf({ name, label, unit, hint }: NumberProps) {
  const { t } = useTranslation('readings')
  const { control } = useFormContext<NewReadingForm>()
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <NumberField
          label={label}
          unit={unit}
          hint={hint}
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

interface HeightProps {
  name: 'temperatureHalfWidthUm' | 'meanGapUm' | 'supportHalfWidthUm' | 'repeatSpreadUm'
  label: string
  hint?: string
}

function HeightOf({ name, label, hint }: HeightProps) {
  const { t } = useTranslation('readings')
  const { control } = useFormContext<NewReadingForm>()
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <HeightField
          label={label}
          hint={hint}
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
