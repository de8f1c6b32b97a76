import type { FaceTemplate } from '@shared/schemas/parts'
import type { Photo, Reading } from '@shared/schemas/readings'
import { useMutation } from '@tanstack/react-query'
import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { Button } from '@/components/button'
import { EmptyState } from '@/components/empty-state'
import { Section } from '@/components/section'
import { apiNothing } from '@/lib/api-client'
import { keepTemplate } from '@/lib/queries/parts'
import { refreshReadings } from '@/lib/queries/readings'
import { useMay } from '@/lib/session'

interface Props {
  reading: Reading
  /** Where more can be added, while the reading may be edited. */
  uploader?: ReactNode
}

export function PhotoSection({ reading, uploader }: Props) {
  const { t } = useTranslation('readings')
  return (
    <Section title={t('page.photos.title')}>
      {reading.photos.length === 0 && <EmptyState>{t('page.photos.none')}</EmptyState>}
      <ul className="flex flex-wrap gap-x-8 gap-y-6 pt-4">
        {reading.photos.map((photo) => (
          <PhotoFigure key={photo.id} photo={photo} reading={reading} />
        ))}
      </ul>
      <KeepTemplate reading={reading} />
      {uploader && <div className="mt-6 max-w-[52rem]">{uploader}</div>}
    </Section>
  )
}

/** For who may change the part: the next reading's leave-outs are compared with these. */
function KeepTemplate({ reading: { face, marks } }: { reading: Reading }) {
  const { t } = useTranslation('readings')
  const mayEdit = useMay('part:edit')
  const { outline, leaveOuts } = marks
  const keep = useMutation({
    mutationFn: (template: FaceTemplate) => keepTemplate(face.id, template),
    onSuccess: () => toast(t('page.template.kept')),
    onError: (error) => toast.error(error.message),
  })
  if (!mayEdit || !outline) return null
  const template = { outline, leaveOuts }
  if (keep.isSuccess || JSON.stringify(face.template) === JSON.stringify(template)) {
    return <p className="mt-4 text-muted text-second">{t('page.template.same')}</p>
  }
  return (
    <Button kind="quiet" className="mt-2" disabled={keep.isPending} onClick={() => keep.mutate(template)}>
      {t('page.template.keep')}
    </Button>
  )
}

function PhotoFigure({ photo, reading }: { photo: Photo; reading: Reading }) {
  const { t } = useTranslation('readings')
  const { sha256, fileName, role, widthPx, heightPx, bitDepth, bytes } = photo
  const preview = `/api/photos/${sha256}/preview`
  return (
    <li className="w-[20rem]">
      <a href={`${preview}?width=full`} target="_blank" rel="noreferrer" title={t('page.photos.open')}>
        <img
          src={`${preview}?width=640`}
          alt={t('page.photos.alt', { name: fileName, piece: `${reading.partNumber} · ${reading.serial}` })}
          loading="lazy"
          className="w-full bg-step-active object-contain"
          style={{ aspectRatio: `${widthPx} / ${heightPx}` }}
        />
      </a>
      <p className="mt-1.5 truncate">
        <span className="font-semibold">{t(`page.photos.role.${role}`)}</span>{' '}
        <span className="text-muted">{fileName}</span>
      </p>
      <p className="text-axis text-muted">
        {t('page.photos.size', {
          width: widthPx,
          height: heightPx,
          bits: bitDepth,
          megabytes: (bytes / 1e6).toFixed(1),
        })}
      </p>
      {reading.mayEdit && (
        <Button
          kind="quiet"
          onClick={() => removePhoto(reading.id, photo.id, t('page.photos.removed'))}
          aria-label={t('page.photos.remove', { name: fileName })}
        >
          {t('page.photos.removeShort')}
        </Button>
      )}
    </li>
  )
}

async function removePhoto(readingId: string, photoId: string, said: string): Promise<void> {
  try {
    await apiNothing('DELETE', `/readings/${readingId}/photos/${photoId}`)
    refreshReadings()
    toast(said)
  } catch (error) {
    toast.error(error instanceof Error ? error.message : String(error))
  }
}
