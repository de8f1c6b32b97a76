import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { Button } from '@/components/button'
import { PageHead } from '@/components/page-head'
import { useDocumentTitle } from '@/lib/use-document-title'

export function NotFoundPage() {
  const { t } = useTranslation()
  useDocumentTitle(t('notFound.title'))
  return (
    <PageHead title={t('notFound.title')}>
      <p className="mt-3 mb-5 max-w-[60ch] text-muted">{t('notFound.sentence')}</p>
      <Button asChild>
        <Link to="/">{t('errorPage.home')}</Link>
      </Button>
    </PageHead>
  )
}
