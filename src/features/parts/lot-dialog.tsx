import { zodResolver } from '@hookform/resolvers/zod'
import { type NewLot, newLotSchema } from '@shared/schemas/parts'
import { useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import type { z } from 'zod'
import { Dialog } from '@/components/dialog'
import { TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { errorText, showFailure } from '@/lib/form-errors'
import { addLot } from '@/lib/queries/parts'

export function LotDialog({ partId, onClose }: { partId: string; onClose: () => void }) {
  const { t } = useTranslation('parts')
  const form = useForm<z.input<typeof newLotSchema>, unknown, NewLot>({
    resolver: zodResolver(newLotSchema),
    defaultValues: { partId, number: '', order: '' },
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (lot) => {
    try {
      await addLot(lot)
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <Dialog open onClose={onClose} title={t('lots.add')}>
      <form onSubmit={submit} noValidate className="flex flex-col gap-4">
        <TextField
          label={t('lots.number')}
          error={errorText(t, errors.number)}
          {...form.register('number')}
        />
        <TextField label={t('lots.order')} error={errorText(t, errors.order)} {...form.register('order')} />
        <FormFoot
          submitLabel={t('lots.submit')}
          isBusy={isSubmitting}
          error={errorText(t, errors.root)}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
