import { type FormEvent, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { useNavigate, useParams } from 'react-router-dom'
import { Button } from '@/components/button'
import { TextField } from '@/components/fields/text-field'
import { LapwingMark } from '@/components/lapwing-mark'
import { Loading } from '@/components/loading'
import { CheckAnswer } from '@/features/certificates/check-answer'
import { useCheck } from '@/lib/queries/certificates'
import { useDocumentTitle } from '@/lib/use-document-title'

/** For whoever holds a certificate: is it genuine, and does it still stand? No account is needed. */
export function CheckPage() {
  const { code = '' } = useParams()
  const { t } = useTranslation('certificate')
  const check = useCheck(code)
  useDocumentTitle(t('check.title'))
  return (
    <main className="mx-auto min-h-screen max-w-[40rem] px-6 py-10">
      <p className="flex items-center gap-2.5 font-semibold text-[1.0625rem]">
        <LapwingMark />
        Lapwing
      </p>
      <h1 className="mt-8 font-light text-title">{t('check.title')}</h1>
      <div className="mt-6 flex flex-col gap-8">
        {check.data && <CheckAnswer check={check.data} />}
        {check.isLoading && <Loading />}
        {check.isError && (
          <p role="alert" className="border-chestnut border-t pt-4 text-chestnut">
            {check.error.message}
          </p>
        )}
        {!check.data && <CodeForm code={code} />}
      </div>
    </main>
  )
}

function CodeForm({ code }: { code: string }) {
  const { t } = useTranslation('certificate')
  const navigate = useNavigate()
  const [text, setText] = useState(code)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (text.trim()) navigate(`/check/${encodeURIComponent(text.trim())}`)
  }
  return (
    <form onSubmit={submit} className="flex flex-col gap-3">
      <p className="text-muted">{t('check.lead')}</p>
      <div className="flex items-end gap-3">
        <TextField
          label={t('check.code')}
          value={text}
          maxLength={40}
          autoCapitalize="characters"
          spellCheck={false}
          onChange={(event) => setText(event.target.value)}
          className="w-64"
        />
        <Button type="submit" kind="main">
          {t('check.submit')}
        </Button>
      </div>
    </form>
  )
}
