import { Progress } from 'radix-ui'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { isUnderway, type Upload } from './uploads'

interface Props {
  upload: Upload
  onCancel: () => void
  onRetry: () => void
}

/** One file: its name, how far it is or what became of it, and what can be done. */
export function UploadLine({ upload, onCancel, onRetry }: Props) {
  const { t } = useTranslation('readings')
  const { file, role, state } = upload
  const mayRetry = state.kind === 'failed' || state.kind === 'cancelled'
  return (
    <li className="grid min-h-[52px] grid-cols-[minmax(0,1fr)_minmax(0,1.6fr)_7rem] items-center gap-x-4 border-hairline border-t py-2">
      <div className="min-w-0">
        <span className="block truncate font-semibold">{file.name}</span>
        <span className="text-muted text-second">
          {t(`page.photos.role.${role}`)}, {(file.size / 1e6).toFixed(1)} MB
        </span>
      </div>
      <UploadStatus upload={upload} />
      <div className="flex justify-end">
        {isUnderway(upload) && (
          <Button
            kind="quiet"
            onClick={onCancel}
            aria-label={t('new.photos.cancelNamed', { name: file.name })}
          >
            {t('new.photos.cancel')}
          </Button>
        )}
        {mayRetry && (
          <Button kind="quiet" onClick={onRetry} aria-label={t('new.photos.retryNamed', { name: file.name })}>
            {t('new.photos.retry')}
          </Button>
        )}
      </div>
    </li>
  )
}

function UploadStatus({ upload: { file, state } }: { upload: Upload }) {
  const { t } = useTranslation('readings')
  switch (state.kind) {
    case 'waiting':
    case 'sending': {
      const percent = state.kind === 'sending' ? Math.round(state.share * 100) : 0
      return (
        <div className="flex items-center gap-3">
          <Progress.Root
            value={percent}
            aria-label={file.name}
            className="h-[5px] flex-1 overflow-hidden border-graduation border-b"
          >
            <Progress.Indicator className="h-full bg-bottle" style={{ width: `${percent}%` }} />
          </Progress.Root>
          <span className="w-28 text-muted text-second">
            {percent === 100 ? t('new.photos.checking') : t('new.photos.sending', { percent })}
          </span>
        </div>
      )
    }
    case 'kept':
      return (
        <div className="flex items-center gap-3">
          <img
            src={`/api/photos/${state.photo.sha256}/preview?width=160`}
            alt=""
            className="h-9 w-12 object-cover"
          />
          <span className="text-bottle text-second">
            {t('new.photos.kept', { width: state.photo.widthPx, height: state.photo.heightPx })}
          </span>
        </div>
      )
    case 'failed':
      return <p className="text-chestnut text-second">{state.sentence}</p>
    case 'cancelled':
      return <p className="text-muted text-second">{t('new.photos.cancelled')}</p>
  }
}
