import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { useMay } from '@/lib/session'
import { Button } from './button'
import { KeyCap } from './key-cap'

/** The page's one filled button, for whoever takes readings. */
export function NewReadingLink({ pieceId }: { pieceId?: string }) {
  const { t } = useTranslation('nav')
  if (!useMay('reading:create')) return null
  return (
    <Button asChild kind="main">
      <Link to={pieceId ? `/readings/new?piece=${pieceId}` : '/readings/new'} aria-keyshortcuts="N">
        {t('newReading')}
        <KeyCap onInk>N</KeyCap>
      </Link>
    </Button>
  )
}
