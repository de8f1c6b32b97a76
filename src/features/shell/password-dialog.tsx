import { zodResolver } from '@hookform/resolvers/zod'
import { ownPasswordChangeSchema } from '@shared/schemas/people'
import { useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { z } from 'zod'
import { Dialog } from '@/components/dialog'
import { TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { apiNothing } from '@/lib/api-client'
import { errorText, showFailure } from '@/lib/form-errors'

const formSchema = ownPasswordChangeSchema.extend({ again: z.string() })
type Form = z.infer<typeof formSchema>

export function PasswordDialog({ onClose }: { onClose: () => void }) {
  const { t } = useTranslation()
  const form = useForm<Form>({
    resolver: zodResolver(formSchema),
    defaultValues: { current: '', next: '', again: '' },
  })
  const { errors, isSubmitting } = form.formState

  const submit = form.handleSubmit(async ({ current, next, again }) => {
    if (next !== again) {
      form.setError('again', { type: 'server', message: t('nav:password.differs') }, { shouldFocus: true })
      return
    }
    try {
      await apiNothing('PUT', '/session/password', { body: { current, next } })
      toast(t('nav:password.changed'))
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('unexpected'))
    }
  })

  return (
    <Dialog open onClose={onClose} title={t('nav:password.title')} description={t('nav:password.ends')}>
      <form onSubmit={submit} noValidate className="flex flex-col gap-4">
        <TextField
          label={t('nav:password.current')}
          type="password"
          autoComplete="current-password"
          error={errorText(t, errors.current)}
          {...form.register('current')}
        />
        <TextField
          label={t('nav:password.next')}
          type="password"
          autoComplete="new-password"
          hint={t('nav:password.hint')}
          error={errorText(t, errors.next)}
          {...form.register('next')}
        />
        <TextField
          label={t('nav:password.again')}
          type="password"
          autoComplete="new-password"
          error={errorText(t, errors.again)}
          {...form.register('again')}
        />
        <FormFoot
          submitLabel={t('nav:password.submit')}
          isBusy={isSubmitting}
          error={errorText(t, errors.root)}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
