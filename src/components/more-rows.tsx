import { useTranslation } from 'react-i18next'
import { Button } from './button'

interface Props {
  hasMore: boolean
  isLoading: boolean
  load: () => void
}

/** The foot of a list that goes on. */
export function MoreRows({ hasMore, isLoading, load }: Props) {
  const { t } = useTranslation()
  if (!hasMore) return null
  return (
    <Button onClick={load} disabled={isLoading} className="mt-4">
      {isLoading ? t('loading') : t('loadMore')}
    </Button>
  )
}
