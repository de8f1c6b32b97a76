import type { Photo } from '@shared/schemas/readings'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'

interface Props {
  photos: readonly Photo[]
  shownId: string | null
  onShow: (id: string) => void
}

/** Which photograph is on the table, where there are several: the bands, or the flat pressed as evidence. */
export function PhotoChoice({ photos, shownId, onShow }: Props) {
  const { t } = useTranslation('table')
  if (photos.length < 2) return null
  return (
    <fieldset
      aria-label={t('photos.label')}
      className="absolute m-0 min-w-0 top-3 left-3 flex rounded border border-edge bg-ground/90"
    >
      {photos.map((photo, i) => (
        <button
          key={photo.id}
          type="button"
          aria-pressed={photo.id === shownId}
          title={photo.fileName}
          onClick={() => onShow(photo.id)}
          className={classNames(
            'h-7 border-hairline border-l px-3 text-second first:border-l-0 max-desk:h-11',
            photo.id === shownId && 'bg-tool-active font-semibold',
          )}
        >
          {t(`photos.${photo.role}`, { number: i + 1 })}
        </button>
      ))}
    </fieldset>
  )
}
