import { useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { errorText, showFailure } from '@/lib/form-errors'
import { Dialog } from './dialog'
import { TextAreaField } from './fields/text-field'
import { FormFoot } from './form-foot'

interface Props {
  title: string
  note: string
  label: string
  /** The field's name in the server's answers. */
  field: string
  submitLabel: string
  /** Throws when the server refuses; the words stay. */
  onSubmit: (words: string) => Promise<void>
  onClose: () => void
}

/** Asks for one reason before something is done. */
export function ReasonDialog({ title, note, label, field, submitLabel, onSubmit, onClose }: Props) {
  const { t } = useTranslation()
  const form = useForm<Record<string, string>>({ defaultValues: { [field]: '' } })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (values) => {
    try {
      await onSubmit(values[field])
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <Dialog open onClose={onClose} title={title} description={note}>
      <form onSubmit={submit} noValidate>
        <TextAreaField
          label={label}
          rows={3}
          maxLength={1000}
          error={errorText(t, errors[field])}
          {...form.register(field)}
        />
        <FormFoot
          submitLabel={submitLabel}
          isBusy={isSubmitting}
          error={errorText(t, errors.root)}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
