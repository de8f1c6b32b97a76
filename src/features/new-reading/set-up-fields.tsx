import type { Equipment, EquipmentKind } from '@shared/schemas/equipment'
import { Controller, useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { CheckboxField } from '@/components/fields/checkbox-field'
import { SelectField } from '@/components/fields/select-field'
import { Section } from '@/components/section'
import { errorText } from '@/lib/form-errors'
import { NumberOf } from './condition-fields'
import { fieldOfKind, inServiceOf, type NewReadingForm } from './new-reading-form'

interface Props {
  rows: readonly Equipment[]
  isLoaded: boolean
}

export function SetUpFields({ rows, isLoaded }: Props) {
  const { t } = useTranslation('readings')
  const { control } = useFormContext<NewReadingForm>()
  const noLights = isLoaded && inServiceOf(rows, 'lightSource').length === 0
  return (
    <Section title={t('new.setUp.title')} note={t('new.setUp.note')}>
      <div className="grid max-w-[48rem] grid-cols-2 gap-x-6 gap-y-4 pt-3">
        <EquipmentOf
          kind="lightSource"
          rows={rows}
          hint={noLights ? t('new.setUp.noLights') : t('new.setUp.lightHint')}
        />
        <EquipmentOf kind="referenceFlat" rows={rows} />
        <EquipmentOf kind="cameraSetUp" rows={rows} />
        <EquipmentOf kind="thermometer" rows={rows} />
        <NumberOf
          name="viewingAngleDeg"
          label={t('new.setUp.viewingAngle')}
          unit="°"
          hint={t('new.setUp.fromCamera')}
        />
        <NumberOf name="viewingAngleUDeg" label={t('new.setUp.viewingAngleU')} unit="°" />
        <Controller
          control={control}
          name="mirrored"
          render={({ field }) => (
            <CheckboxField
              label={t('new.setUp.mirrored')}
              hint={t('new.setUp.mirroredHint')}
              checked={field.value}
              onChange={field.onChange}
              className="col-span-2"
            />
          )}
        />
      </div>
    </Section>
  )
}

interface EquipmentProps {
  kind: EquipmentKind
  rows: readonly Equipment[]
  hint?: string
}

function EquipmentOf({ kind, rows, hint }: EquipmentProps) {
  const { t } = useTranslation('readings')
  const form = useFormContext<NewReadingForm>()
  const name = fieldOfKind[kind]
  // What was in service when it was chosen stays among the choices.
  const chosenBefore = form.formState.defaultValues?.[name]
  const offered = rows.filter(
    (row) => row.details.kind === kind && (row.inService || row.id === chosenBefore),
  )
  const choices = offered.map(({ id, name: label, details }) => ({
    value: id,
    label,
    note: details.kind === 'lightSource' ? `${details.wavelengthNm} nm` : undefined,
  }))
  const withNothing =
    kind === 'lightSource' ? choices : [{ value: '', label: t('common:notStated') }, ...choices]
  const choose = (id: string) => {
    const chosen = rows.find((row) => row.id === id)
    if (chosen?.details.kind === 'cameraSetUp') form.setValue('mirrored', chosen.details.mirrored)
  }
  return (
    <Controller
      control={form.control}
      name={name}
      render={({ field, fieldState }) => (
        <SelectField
          label={t(`new.setUp.${kind}`)}
          placeholder={t('new.setUp.choose')}
          hint={hint}
          choices={withNothing}
          value={field.value}
          onChange={(id) => {
            field.onChange(id)
            choose(id)
          }}
          error={errorText(t, fieldState.error)}
        />
      )}
    />
  )
}
