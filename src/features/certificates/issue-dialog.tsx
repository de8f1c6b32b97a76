import { zodResolver } from '@hookform/resolvers/zod'
import { type IssueCertificate, issueCertificateSchema } from '@shared/schemas/certificates'
import type { Reading } from '@shared/schemas/readings'
import { useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { useNavigate } from 'react-router-dom'
import { toast } from 'sonner'
import type { z } from 'zod'
import { Dialog } from '@/components/dialog'
import { TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { Quantity } from '@/components/quantity'
import { VerdictWords } from '@/components/tolerance-rule/verdict-words'
import { errorText, showFailure } from '@/lib/form-errors'
import { issueCertificate } from '@/lib/queries/certificates'

interface Props {
  reading: Reading
  /** The certificate that the new one takes the place of. */
  replaced: { id: string; number: string } | null
  onClose: () => void
}

/** Issues a certificate of an agreed reading, with the QA person's password once more. */
export function IssueDialog({ reading, replaced, onClose }: Props) {
  const { t } = useTranslation('certificate')
  const navigate = useNavigate()
  const form = useForm<z.input<typeof issueCertificateSchema>, unknown, IssueCertificate>({
    resolver: zodResolver(issueCertificateSchema),
    defaultValues: { password: '', received: '', replacesId: replaced?.id ?? null },
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (input) => {
    try {
      const issued = await issueCertificate(reading.id, input)
      toast(t('issue.done', { number: issued.number }))
      navigate(`/certificates/${issued.id}`)
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  const { result } = reading
  return (
    <Dialog
      open
      onClose={onClose}
      title={replaced ? t('issue.replacingTitle', { number: replaced.number }) : t('issue.title')}
      description={t('issue.note')}
    >
      <form onSubmit={submit} noValidate className="flex flex-col gap-4">
        {result && result.flatnessUm !== null && (
          <div>
            <p className="text-axis text-muted">{t('issue.figure')}</p>
            <p className="flex items-baseline gap-4">
              <Quantity
                valueUm={result.flatnessUm}
                uUm={result.expandedUncertaintyUm}
                bandUm={result.bandUm}
                withUnit
              />
              <VerdictWords verdict={result.verdict} />
            </p>
          </div>
        )}
        <TextField
          label={t('issue.received')}
          hint={t('issue.receivedHint')}
          maxLength={120}
          error={errorText(t, errors.received)}
          {...form.register('received')}
        />
        <TextField
          label={t('issue.password')}
          type="password"
          autoComplete="current-password"
          error={errorText(t, errors.password)}
          {...form.register('password')}
        />
        <FormFoot
          submitLabel={t('issue.submit')}
          isBusy={isSubmitting}
          error={errorText(t, errors.root)}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
