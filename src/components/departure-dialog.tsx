import { useTranslation } from 'react-i18next'
import { ReasonDialog } from './reason-dialog'

interface Props {
  /** Sends the reading with the reason; throws when the server refuses. */
  onSubmit: (reason: string) => Promise<void>
  onClose: () => void
}

/** Asks why edge band or leave-outs are not those of the face, before a reading is sent. */
export function DepartureDialog({ onSubmit, onClose }: Props) {
  const { t } = useTranslation('review')
  return (
    <ReasonDialog
      title={t('departureDialog.title')}
      note={t('departureDialog.note')}
      label={t('departureDialog.reason')}
      field="departureReason"
      submitLabel={t('departureDialog.submit')}
      onSubmit={onSubmit}
      onClose={onClose}
    />
  )
}
