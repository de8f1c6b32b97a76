import { zodResolver } from '@hookform/resolvers/zod'
import { type NewPart, newPartSchema, type Part } from '@shared/schemas/parts'
import { Controller, useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import type { z } from 'zod'
import { Dialog } from '@/components/dialog'
import { SelectField } from '@/components/fields/select-field'
import { TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { errorText, showFailure } from '@/lib/form-errors'
import { savePart, useCustomers } from '@/lib/queries/parts'

interface Props {
  part?: Part
  onClose: () => void
  onSaved?: (part: Part) => void
}

export function PartDialog({ part, onClose, onSaved }: Props) {
  const { t } = useTranslation('parts')
  const customers = useCustomers()
  const form = useForm<z.input<typeof newPartSchema>, unknown, NewPart>({
    resolver: zodResolver(newPartSchema),
    defaultValues: {
      customerId: part?.customerId ?? '',
      number: part?.number ?? '',
      revision: part?.revision ?? '',
      name: part?.name ?? '',
      material: part?.material ?? '',
    },
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (input) => {
    try {
      const saved = await savePart(input, part?.id)
      onSaved?.(saved)
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  const choices = (customers.data?.rows ?? []).map(({ id, name }) => ({ value: id, label: name }))
  const text = (name: 'number' | 'revision' | 'name' | 'material', className?: string) => (
    <TextField
      label={t(`part.${name}`)}
      error={errorText(t, errors[name])}
      className={className}
      {...form.register(name)}
    />
  )
  return (
    <Dialog open onClose={onClose} title={part ? t('part.editTitle') : t('part.add')}>
      <form onSubmit={submit} noValidate className="flex flex-col gap-4">
        <Controller
          control={form.control}
          name="customerId"
          render={({ field }) => (
            <SelectField
              label={t('part.customer')}
              placeholder={t('part.chooseCustomer')}
              hint={customers.data?.rows.length === 0 ? t('customers.empty') : undefined}
              choices={choices}
              value={field.value}
              onChange={field.onChange}
              error={errorText(t, errors.customerId)}
            />
          )}
        />
        <div className="grid grid-cols-[1fr_7rem] gap-4">
          {text('number')}
          {text('revision')}
        </div>
        {text('name')}
        {text('material')}
        <FormFoot
          submitLabel={t('part.submit')}
          isBusy={isSubmitting}
          error={errorText(t, errors.root)}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
