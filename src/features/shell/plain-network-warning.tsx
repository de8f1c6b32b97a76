import { useTranslation } from 'react-i18next'

export function PlainNetworkWarning() {
  const { t } = useTranslation()
  return (
    <p
      role="note"
      className="border-chestnut border-b bg-chestnut/8 px-6 py-1.5 text-chestnut text-second desk:px-10"
    >
      {t('nav:plainNetwork')}
    </p>
  )
}
