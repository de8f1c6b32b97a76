import { useTranslation } from 'react-i18next'
import { Button } from './button'

interface Props {
  submitLabel: string
  isBusy: boolean
  /** What stands against the form as a whole. */
  error?: string
  onCancel?: () => void
}

/** The last row of a form: what went wrong, then the one filled button. */
export function FormFoot({ submitLabel, isBusy, error, onCancel }: Props) {
  const { t } = useTranslation()
  return (
    <div className="mt-5 flex flex-col gap-3">
      {error && (
        <p role="alert" className="text-chestnut text-second">
          {error}
        </p>
      )}
      <div className="flex gap-2.5">
        <Button type="submit" kind="main" disabled={isBusy}>
          {isBusy ? t('common:saving') : submitLabel}
        </Button>
        {onCancel && <Button onClick={onCancel}>{t('common:cancel')}</Button>}
      </div>
    </div>
  )
}
