import { useTranslation } from 'react-i18next'
import { useParams } from 'react-router-dom'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { PrintedPage } from '@/components/printed-page'
import { Section } from '@/components/section'
import { CertificateHead } from '@/features/certificates/certificate-head'
import { EventsSection } from '@/features/readings/events-section'
import { useCertificate, useCertificatePage } from '@/lib/queries/certificates'
import { useDocumentTitle } from '@/lib/use-document-title'

/** A certificate: whether it stands, and the page as it was issued. */
export function CertificatePage() {
  const { id = '' } = useParams()
  const { t } = useTranslation('certificate')
  const certificate = useCertificate(id)
  const page = useCertificatePage(id)
  useDocumentTitle(certificate.data && t('view.title', { number: certificate.data.number }))
  if (certificate.isPending) return <Loading />
  if (certificate.isError) return <ErrorState error={certificate.error} retry={certificate.refetch} />
  return (
    <>
      <CertificateHead certificate={certificate.data} />
      <Section title={t('view.paper')}>
        <div className="max-w-[50rem] pt-4">
          {page.isPending && <Loading />}
          {page.isError && <ErrorState error={page.error} retry={page.refetch} />}
          {page.data && (
            <div className="border border-hairline bg-white">
              <PrintedPage page={page.data} />
            </div>
          )}
        </div>
      </Section>
      <EventsSection of="certificate" id={id} />
    </>
  )
}
