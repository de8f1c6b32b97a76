import { useTranslation } from 'react-i18next'
import { ApiFailure } from '@/lib/api-failure'
import { Button } from './button'

interface Props {
  error: unknown
  retry?: () => void
}

/** What went wrong in a sentence that says what to do, and a way to try again. */
export function ErrorState({ error, retry }: Props) {
  const { t } = useTranslation()
  const sentence = error instanceof ApiFailure ? error.message : t('common:unexpected')
  return (
    <div role="alert" className="flex flex-col items-start gap-3 py-3">
      <p className="max-w-[60ch] text-body text-chestnut">{sentence}</p>
      {retry && <Button onClick={retry}>{t('common:tryAgain')}</Button>}
    </div>
  )
}
