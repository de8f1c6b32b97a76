import { zodResolver } from '@hookform/resolvers/zod'
import type { ReadingRow } from '@shared/schemas/readings'
import { dispositionKindSchema, type NewDisposition, newDispositionSchema } from '@shared/schemas/reviews'
import { Controller, useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import type { z } from 'zod'
import { Dialog } from '@/components/dialog'
import { SelectField } from '@/components/fields/select-field'
import { TextAreaField, TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { errorText, showFailure } from '@/lib/form-errors'
import { decideDisposition } from '@/lib/queries/reviews'

interface Props {
  pieceId: string
  reading: ReadingRow
  onClose: () => void
}

/** Rework, concession on somebody's word, or reject. */
export function DispositionDialog({ pieceId, reading, onClose }: Props) {
  const { t } = useTranslation('review')
  const form = useForm<z.input<typeof newDispositionSchema>, unknown, NewDisposition>({
    resolver: zodResolver(newDispositionSchema),
    defaultValues: { readingId: reading.id, kind: 'rework', reason: '', onWordOf: '' },
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (disposition) => {
    try {
      await decideDisposition(pieceId, disposition)
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <Dialog
      open
      onClose={onClose}
      title={t('disposition.dialog')}
      description={t('disposition.dialogNote', { number: reading.number })}
    >
      <form onSubmit={submit} noValidate className="flex flex-col gap-4">
        <Controller
          control={form.control}
          name="kind"
          render={({ field }) => (
            <SelectField
              label={t('disposition.kind')}
              choices={dispositionKindSchema.options.map((kind) => ({
                value: kind,
                label: t(`disposition.kinds.${kind}`),
              }))}
              value={field.value}
              onChange={field.onChange}
            />
          )}
        />
        <TextAreaField
          label={t('disposition.reason')}
          rows={3}
          error={errorText(t, errors.reason)}
          {...form.register('reason')}
        />
        {form.watch('kind') === 'concession' && (
          <TextField
            label={t('disposition.onWordOf')}
            hint={t('disposition.onWordOfHint')}
            error={errorText(t, errors.onWordOf)}
            {...form.register('onWordOf')}
          />
        )}
        <FormFoot
          submitLabel={t('disposition.submit')}
          isBusy={isSubmitting}
          error={errorText(t, errors.root)}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
