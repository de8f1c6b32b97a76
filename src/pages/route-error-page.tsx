import { useTranslation } from 'react-i18next'
import { useRouteError } from 'react-router-dom'
import { Button } from '@/components/button'
import { LapwingMark } from '@/components/lapwing-mark'
import { useDocumentTitle } from '@/lib/use-document-title'

/** What is left when a page fails: a sentence and two ways on. */
export function RouteErrorPage() {
  const { t } = useTranslation()
  const error = useRouteError()
  useDocumentTitle(t('errorPage.title'))
  return (
    <main className="mx-auto max-w-[1280px] px-6 py-10 desk:px-10">
      <LapwingMark />
      <h1 className="mt-5 text-headline">{t('errorPage.title')}</h1>
      <p className="mt-3 max-w-[60ch] text-muted">{t('errorPage.sentence')}</p>
      {error instanceof Error && <p className="mt-3 max-w-[60ch] text-axis text-muted">{error.message}</p>}
      <div className="mt-5 flex gap-2.5">
        <Button onClick={() => window.location.reload()}>{t('tryAgain')}</Button>
        <Button asChild>
          <a href="/">{t('errorPage.home')}</a>
        </Button>
      </div>
    </main>
  )
}
