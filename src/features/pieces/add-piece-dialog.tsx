import { zodResolver } from '@hookform/resolvers/zod'
import { type NewPiece, newPieceSchema, type Piece } from '@shared/schemas/parts'
import { Controller, useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import type { z } from 'zod'
import { Dialog } from '@/components/dialog'
import { SelectField } from '@/components/fields/select-field'
import { TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { errorText, showFailure } from '@/lib/form-errors'
import { usePart, usePartList } from '@/lib/queries/parts'
import { addPiece } from '@/lib/queries/pieces'

interface Props {
  /** Fixed where the piece is added from its part's page. */
  partId?: string
  onClose: () => void
  onAdded?: (piece: Piece) => void
}

export function AddPieceDialog({ partId, onClose, onAdded }: Props) {
  const { t } = useTranslation('pieces')
  const form = useForm<z.input<typeof newPieceSchema>, unknown, NewPiece>({
    resolver: zodResolver(newPieceSchema),
    defaultValues: { partId: partId ?? '', lotId: null, serial: '' },
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (piece) => {
    try {
      const added = await addPiece(piece)
      onAdded?.(added)
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  // The dialog stands in the page's tree: a form around it must not be sent too.
  return (
    <Dialog open onClose={onClose} title={t('add.title')}>
      <form
        onSubmit={(event) => {
          event.stopPropagation()
          void submit(event)
        }}
        noValidate
        className="flex flex-col gap-4"
      >
        {!partId && (
          <Controller
            control={form.control}
            name="partId"
            render={({ field }) => (
              <PartSelect value={field.value} onChange={field.onChange} error={errorText(t, errors.partId)} />
            )}
          />
        )}
        <TextField label={t('add.serial')} error={errorText(t, errors.serial)} {...form.register('serial')} />
        <Controller
          control={form.control}
          name="lotId"
          render={({ field }) => (
            <LotSelect
              partId={form.watch('partId')}
              value={field.value ?? ''}
              onChange={(value) => field.onChange(value === '' ? null : value)}
              error={errorText(t, errors.lotId)}
            />
          )}
        />
        <FormFoot
          submitLabel={t('add.submit')}
          isBusy={isSubmitting}
          error={errorText(t, errors.root)}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}

interface SelectProps {
  value: string
  onChange: (value: string) => void
  error: string | undefined
}

function PartSelect(props: SelectProps) {
  const { t } = useTranslation('pieces')
  const parts = usePartList('')
  const choices = (parts.data?.rows ?? []).map((part) => ({
    value: part.id,
    label: part.number,
    note: `${part.name}, ${part.customerName}`,
  }))
  return <SelectField label={t('add.part')} placeholder={t('add.choosePart')} choices={choices} {...props} />
}

function LotSelect({ partId, ...props }: SelectProps & { partId: string }) {
  const { t } = useTranslation('pieces')
  const part = usePart(partId)
  const lots = (part.data?.lots ?? []).map((lot) => ({ value: lot.id, label: lot.number, note: lot.order }))
  return (
    <SelectField label={t('add.lot')} choices={[{ value: '', label: t('add.noLot') }, ...lots]} {...props} />
  )
}
