import type { CertificateState } from '@shared/schemas/certificates'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'

/** Whether a certificate stands, in words; one that doesn't in chestnut. */
export function CertificateStateWords({ state }: { state: CertificateState }) {
  const { t } = useTranslation('certificate')
  return (
    <span className={classNames(state === 'issued' ? 'text-bottle' : 'text-chestnut')}>
      {t(`state.${state}`)}
    </span>
  )
}
