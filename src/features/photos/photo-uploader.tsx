import type { Photo } from '@shared/schemas/readings'
import { type ChangeEvent, useEffect, useRef, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { SelectField } from '@/components/fields/select-field'
import { classNames } from '@/lib/class-names'
import { UploadLine } from './upload-line'
import { useFileDrop } from './use-file-drop'
import { useUploads } from './use-uploads'

interface Props {
  readingId: string
  /** Told whenever sending begins or ends. */
  onBusyChange?: (isBusy: boolean) => void
}

const roles = ['bands', 'pressed', 'other'] as const
const accepted = 'image/jpeg,image/png,image/webp,image/tiff,image/avif,.tif,.tiff,.avif'

/** Drop, choose, or take photographs; each is sent by itself with its own progress. */
export function PhotoUploader({ readingId, onBusyChange }: Props) {
  const { t } = useTranslation('readings')
  const [role, setRole] = useState<Photo['role']>('bands')
  const { uploads, isBusy, add, cancel, retry } = useUploads(readingId)
  const drop = useFileDrop((files) => add(files, role))
  useBusyGuard(isBusy, onBusyChange)
  return (
    <div className="flex flex-col gap-4">
      <SelectField
        label={t('new.photos.role')}
        choices={roles.map((value) => ({ value, label: t(`new.photos.roles.${value}`) }))}
        value={role}
        onChange={(value) => setRole(value as Photo['role'])}
        className="w-64"
      />
      <div
        {...drop.handlers}
        className={classNames(
          'flex flex-col items-center gap-3 rounded border border-edge border-dashed px-6 py-10 text-center',
          drop.isOver && 'border-iris bg-tool-active',
        )}
      >
        <p className="font-light text-headline">
          {drop.isOver ? t('new.photos.dropNow') : t('new.photos.drop')}
        </p>
        <p className="text-muted text-second">{t('new.photos.or')}</p>
        <div className="flex flex-wrap justify-center gap-2.5">
          <FileButton label={t('new.photos.choose')} onFiles={(files) => add(files, role)} />
          <FileButton label={t('new.photos.camera')} camera onFiles={(files) => add(files, role)} />
        </div>
        <p className="max-w-[60ch] text-muted text-second">{t('new.photos.limits')}</p>
      </div>
      <ul aria-live="polite">
        {uploads.map((upload) => (
          <UploadLine
            key={upload.key}
            upload={upload}
            onCancel={() => cancel(upload.key)}
            onRetry={() => retry(upload.key)}
          />
        ))}
      </ul>
    </div>
  )
}

interface FileButtonProps {
  label: string
  /** Opens the camera of a tablet or phone, the one that looks away from the person. */
  camera?: boolean
  onFiles: (files: File[]) => void
}

function FileButton({ label, camera = false, onFiles }: FileButtonProps) {
  const inputRef = useRef<HTMLInputElement>(null)
  const take = (event: ChangeEvent<HTMLInputElement>) => {
    onFiles([...(event.target.files ?? [])])
    // So that the same file can be chosen again after it failed.
    event.target.value = ''
  }
  return (
    <>
      <input
        ref={inputRef}
        type="file"
        accept={camera ? 'image/*' : accepted}
        capture={camera ? 'environment' : undefined}
        multiple={!camera}
        onChange={take}
        aria-label={label}
        tabIndex={-1}
        className="sr-only"
      />
      <Button onClick={() => inputRef.current?.click()}>{label}</Button>
    </>
  )
}

/** Leaving the page while something is sent would lose it: the browser asks first. */
function useBusyGuard(isBusy: boolean, onBusyChange: Props['onBusyChange']): void {
  // biome-ignore lint/correctness/useExhaustiveDependencies: told when it changes, not when the listener does
  useEffect(() => onBusyChange?.(isBusy), [isBusy])
  useEffect(() => {
    if (!isBusy) return
    const ask = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', ask)
    return () => window.removeEventListener('beforeunload', ask)
  }, [isBusy])
}
