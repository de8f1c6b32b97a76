import { zodResolver } from '@hookform/resolvers/zod'
import {
  type Certificate,
  type WithdrawCertificate,
  withdrawCertificateSchema,
} from '@shared/schemas/certificates'
import { useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { Dialog } from '@/components/dialog'
import { TextAreaField, TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { errorText, showFailure } from '@/lib/form-errors'
import { withdrawCertificate } from '@/lib/queries/certificates'

/** Withdraws a certificate, for a reason and with the QA person's password once more. */
export function WithdrawDialog({ certificate, onClose }: { certificate: Certificate; onClose: () => void }) {
  const { t } = useTranslation('certificate')
  const { id, number } = certificate
  const form = useForm<WithdrawCertificate>({
    resolver: zodResolver(withdrawCertificateSchema),
    defaultValues: { password: '', reason: '' },
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (input) => {
    try {
      await withdrawCertificate(id, input)
      toast(t('withdraw.done', { number }))
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <Dialog open onClose={onClose} title={t('withdraw.title', { number })} description={t('withdraw.note')}>
      <form onSubmit={submit} noValidate className="flex flex-col gap-4">
        <TextAreaField
          label={t('withdraw.reason')}
          rows={3}
          maxLength={500}
          error={errorText(t, errors.reason)}
          {...form.register('reason')}
        />
        <TextField
          label={t('withdraw.password')}
          type="password"
          autoComplete="current-password"
          error={errorText(t, errors.password)}
          {...form.register('password')}
        />
        <FormFoot
          submitLabel={t('withdraw.submit')}
          isBusy={isSubmitting}
          error={errorText(t, errors.root)}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
