import type { CertificateRow } from '@shared/schemas/certificates'
import { useTranslation } from 'react-i18next'
import { CertificateLine } from '@/components/certificates/certificate-line'
import { Section } from '@/components/section'

export function CertificatesSection({ certificates }: { certificates: readonly CertificateRow[] }) {
  const { t } = useTranslation('certificate')
  return (
    <Section title={t('pieceSection.title')} note={t('pieceSection.note')}>
      {certificates.length === 0 && <p className="py-3 text-muted">{t('pieceSection.none')}</p>}
      <ul>
        {certificates.map((certificate) => (
          <CertificateLine key={certificate.id} certificate={certificate} />
        ))}
      </ul>
    </Section>
  )
}
