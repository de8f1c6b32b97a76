import { zodResolver } from '@hookform/resolvers/zod'
import { meSchema, type SignIn as SignInInput, signInSchema } from '@shared/schemas/people'
import { useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { TextField } from '@/components/fields/text-field'
import { LapwingMark } from '@/components/lapwing-mark'
import { api } from '@/lib/api-client'
import { errorText, showFailure } from '@/lib/form-errors'
import { queryClient } from '@/lib/query-client'
import { queryKeys } from '@/lib/query-keys'
import { useDocumentTitle } from '@/lib/use-document-title'
import { BandPlate } from './band-plate'

/** At whichever address was asked for: after signing in one is there. */
export function SignIn() {
  const { t } = useTranslation()
  useDocumentTitle(t('nav:signIn.title'))
  return (
    <main className="grid min-h-screen grid-cols-1 desk:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
      <div className="flex flex-col justify-center px-10 py-10 desk:px-24">
        <div className="w-full max-w-[22rem]">
          <p className="flex items-center gap-2.5 font-semibold text-[1.0625rem]">
            <LapwingMark />
            Lapwing
          </p>
          <h1 className="mt-10 font-light text-title">{t('nav:signIn.title')}</h1>
          <p className="mt-1 text-muted">{t('nav:signIn.lead')}</p>
          <SignInForm />
          <p className="mt-6 border-hairline border-t pt-3 text-muted text-second">
            {t('nav:signIn.forgotten')}
          </p>
        </div>
      </div>
      <BandPlate />
    </main>
  )
}

function SignInForm() {
  const { t } = useTranslation()
  const form = useForm<SignInInput>({
    resolver: zodResolver(signInSchema),
    defaultValues: { email: '', password: '' },
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (input) => {
    try {
      queryClient.setQueryData(queryKeys.session, await api('POST', '/session', meSchema, { body: input }))
    } catch (error) {
      showFailure(error, form.setError, t('unexpected'))
    }
  })
  const refusal = errorText(t, errors.root)
  return (
    <form onSubmit={submit} noValidate className="mt-8 flex flex-col gap-4">
      <TextField
        label={t('nav:signIn.email')}
        type="email"
        autoComplete="username"
        autoFocus
        error={errorText(t, errors.email)}
        {...form.register('email')}
      />
      <TextField
        label={t('nav:signIn.password')}
        type="password"
        autoComplete="current-password"
        error={errorText(t, errors.password)}
        {...form.register('password')}
      />
      {refusal && (
        <p role="alert" className="text-chestnut text-second">
          {refusal}
        </p>
      )}
      <Button type="submit" kind="main" disabled={isSubmitting} className="mt-2 self-start">
        {isSubmitting ? t('nav:signIn.busy') : t('nav:signIn.submit')}
      </Button>
    </form>
  )
}
