import { useEffect } from 'react'
import { useTranslation } from 'react-i18next'
import { useParams } from 'react-router-dom'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { PrintedPage } from '@/components/printed-page'
import { useCertificate, useCertificatePage } from '@/lib/queries/certificates'
import { useDocumentTitle } from '@/lib/use-document-title'

/** The page alone, for the printer; the browser's print dialog opens by itself. */
export function CertificatePrintPage() {
  const { id = '' } = useParams()
  const { t } = useTranslation('certificate')
  const certificate = useCertificate(id)
  const page = useCertificatePage(id)
  const isReady = page.isSuccess
  useDocumentTitle(certificate.data && t('view.title', { number: certificate.data.number }))
  useEffect(() => {
    if (isReady) void document.fonts.ready.then(() => window.print())
  }, [isReady])
  if (page.isPending) return <Loading />
  if (page.isError) return <ErrorState error={page.error} retry={page.refetch} />
  return (
    <main className="bg-white">
      <PrintedPage page={page.data} />
    </main>
  )
}
