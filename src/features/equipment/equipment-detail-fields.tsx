import type { EquipmentKind } from '@shared/schemas/equipment'
import { Controller, useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { CheckboxField } from '@/components/fields/checkbox-field'
import { HeightField } from '@/components/fields/height-field'
import { NumberField } from '@/components/fields/number-field'
import { SelectField } from '@/components/fields/select-field'
import { errorText } from '@/lib/form-errors'
import type { EquipmentForm } from './equipment-form'

export function EquipmentDetailFields({ kind }: { kind: EquipmentKind }) {
  const { t } = useTranslation('equipment')
  switch (kind) {
    case 'lightSource':
      return (
        <div className="grid grid-cols-3 gap-4">
          <NumberOf name="wavelengthNm" unit="nm" />
          <NumberOf name="relativeUPercent" unit="%" hint={t('form.relativeUHint')} />
          <LampField />
        </div>
      )
    case 'referenceFlat':
      return (
        <div className="grid grid-cols-3 gap-4">
          <NumberOf name="diameterMm" unit="mm" />
          <HeightOf name="formUm" hint={t('form.formHint')} />
          <HeightOf name="expandedUUm" />
        </div>
      )
    case 'cameraSetUp':
      return (
        <div className="grid grid-cols-3 items-end gap-4">
          <NumberOf name="viewingAngleDeg" unit="°" />
          <NumberOf name="viewingAngleUDeg" unit="°" />
          <NumberOf name="distanceMm" unit="mm" />
          <MirrorField />
        </div>
      )
    case 'thermometer':
      return (
        <div className="grid grid-cols-3 gap-4">
          <NumberOf name="uC" unit="°C" />
        </div>
      )
  }
}

interface NumberProps {
  name:
    | 'wavelengthNm'
    | 'relativeUPercent'
    | 'diameterMm'
    | 'viewingAngleDeg'
    | 'viewingAngleUDeg'
    | 'distanceMm'
    | 'uC'
  unit: string
  hint?: string
}

function NumberOf({ name, unit, hint }: NumberProps) {
  const { t } = useTranslation('equipment')
  const { control } = useFormContext<EquipmentForm>()
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <NumberField
          label={t(`form.${name}`)}
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

function HeightOf({ name, hint }: { name: 'formUm' | 'expandedUUm'; hint?: string }) {
  const { t } = useTranslation('equipment')
  const { control } = useFormContext<EquipmentForm>()
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <HeightField
          label={t(`form.${name}`)}
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

const lamps = ['sodium', 'helium', 'mercury', 'laser', 'led', 'other'] as const

function LampField() {
  const { t } = useTranslation('equipment')
  const { control } = useFormContext<EquipmentForm>()
  return (
    <Controller
      control={control}
      name="lamp"
      render={({ field }) => (
        <SelectField
          label={t('form.lamp')}
          choices={lamps.map((lamp) => ({ value: lamp, label: t(`lamps.${lamp}`) }))}
          value={field.value}
          onChange={field.onChange}
        />
      )}
    />
  )
}

function MirrorField() {
  const { t } = useTranslation('equipment')
  const { control } = useFormContext<EquipmentForm>()
  return (
    <Controller
      control={control}
      name="mirrored"
      render={({ field }) => (
        <CheckboxField label={t('form.mirrored')} checked={field.value} onChange={field.onChange} />
      )}
    />
  )
}
