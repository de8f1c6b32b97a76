import { zodResolver } from '@hookform/resolvers/zod'
import { type Customer, type NewCustomer, newCustomerSchema } from '@shared/schemas/parts'
import { useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import type { z } from 'zod'
import { Dialog } from '@/components/dialog'
import { TextAreaField, TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { errorText, showFailure } from '@/lib/form-errors'
import { saveCustomer } from '@/lib/queries/parts'

export function CustomerDialog({ customer, onClose }: { customer?: Customer; onClose: () => void }) {
  const { t } = useTranslation('parts')
  const form = useForm<z.input<typeof newCustomerSchema>, unknown, NewCustomer>({
    resolver: zodResolver(newCustomerSchema),
    defaultValues: {
      name: customer?.name ?? '',
      address: customer?.address ?? '',
      email: customer?.email ?? '',
    },
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (input) => {
    try {
      await saveCustomer(input, customer?.id)
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <Dialog open onClose={onClose} title={customer ? t('customers.editTitle') : t('customers.add')}>
      <form onSubmit={submit} noValidate className="flex flex-col gap-4">
        <TextField label={t('customers.name')} error={errorText(t, errors.name)} {...form.register('name')} />
        <TextAreaField
          label={t('customers.address')}
          error={errorText(t, errors.address)}
          {...form.register('address')}
        />
        <TextField
          label={t('customers.email')}
          type="email"
          error={errorText(t, errors.email)}
          {...form.register('email')}
        />
        <FormFoot
          submitLabel={t('customers.submit')}
          isBusy={isSubmitting}
          error={errorText(t, errors.root)}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
