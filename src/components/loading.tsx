import { useEffect, useState } from 'react'
import { useTranslation } from 'react-i18next'

const patienceMs = 400

/** Says that something is on its way, but only once it takes long enough to be noticed. */
export function Loading() {
  const { t } = useTranslation()
  const [isLong, setLong] = useState(false)
  useEffect(() => {
    const timer = setTimeout(() => setLong(true), patienceMs)
    return () => clearTimeout(timer)
  }, [])
  return (
    <p role="status" className="py-6 text-muted text-second">
      {isLong ? t('common:loading') : ''}
    </p>
  )
}
