import type { Equipment, EquipmentKind, NewEquipment } from '@shared/schemas/equipment'
import { Controller, FormProvider, useForm, useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { Dialog } from '@/components/dialog'
import { CheckboxField } from '@/components/fields/checkbox-field'
import { TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { errorText, showFailure } from '@/lib/form-errors'
import { saveEquipment } from '@/lib/queries/equipment'
import { EquipmentDetailFields } from './equipment-detail-fields'
import { type EquipmentForm, equipmentResolver, toEquipmentForm } from './equipment-form'

interface Props {
  kind: EquipmentKind
  equipment?: Equipment
  onClose: () => void
}

export function EquipmentDialog({ kind, equipment, onClose }: Props) {
  const { t } = useTranslation('equipment')
  const form = useForm<EquipmentForm, unknown, NewEquipment>({
    resolver: equipmentResolver(kind),
    defaultValues: toEquipmentForm(equipment),
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (input) => {
    try {
      await saveEquipment(input, equipment?.id)
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <Dialog open onClose={onClose} title={equipment ? t(`kindOne.${kind}`) : t(`addKind.${kind}`)} wide>
      <FormProvider {...form}>
        <form onSubmit={submit} noValidate className="flex flex-col gap-4">
          <div className="grid grid-cols-2 gap-4">
            <TextField
              label={t('form.name')}
              hint={t('form.nameHint')}
              error={errorText(t, errors.name)}
              {...form.register('name')}
            />
            <TextField
              label={t('form.description')}
              error={errorText(t, errors.description)}
              {...form.register('description')}
            />
          </div>
          <EquipmentDetailFields kind={kind} />
          <CalibrationFields />
          <Controller
            control={form.control}
            name="inService"
            render={({ field }) => (
              <CheckboxField
                label={t('form.inService')}
                hint={t('form.inServiceHint')}
                checked={field.value}
                onChange={field.onChange}
              />
            )}
          />
          <FormFoot
            submitLabel={t('form.submit')}
            isBusy={isSubmitting}
            error={errorText(t, errors.root)}
            onCancel={onClose}
          />
        </form>
      </FormProvider>
    </Dialog>
  )
}

function CalibrationFields() {
  const { t } = useTranslation('equipment')
  const form = useFormContext<EquipmentForm>()
  const { errors } = form.formState
  const text = (
    name: 'laboratory' | 'certificateNumber' | 'calibratedOn' | 'dueOn',
    type: 'text' | 'date',
  ) => (
    <TextField
      label={t(`form.${name}`)}
      type={type}
      error={errorText(t, errors[name])}
      {...form.register(name)}
    />
  )
  return (
    <div>
      <Controller
        control={form.control}
        name="calibrated"
        render={({ field }) => (
          <CheckboxField label={t('form.calibrated')} checked={field.value} onChange={field.onChange} />
        )}
      />
      {form.watch('calibrated') && (
        <div className="mt-3 grid grid-cols-2 gap-4">
          {text('laboratory', 'text')}
          {text('certificateNumber', 'text')}
          {text('calibratedOn', 'date')}
          {text('dueOn', 'date')}
        </div>
      )}
    </div>
  )
}
