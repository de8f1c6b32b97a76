import type { Photo } from '@shared/schemas/readings'
import { useEffect, useState } from 'react'

export interface LoadedPhoto {
  image: HTMLImageElement | null
  failed: boolean
}

const firstWidthPx = 2048

const addressOf = ({ sha256 }: Photo, width: number | 'full') =>
  `/api/photos/${sha256}/preview?width=${width}`

/** A middling preview first; the full size once `wantsFull`, the one before staying until it is there. */
export function usePhoto(photo: Photo | null, wantsFull: boolean): LoadedPhoto {
  const [loaded, setLoaded] = useState<LoadedPhoto & { sha256: string | null }>({
    image: null,
    failed: false,
    sha256: null,
  })
  const isSmall = photo !== null && photo.widthPx <= firstWidthPx
  const width = wantsFull || isSmall ? 'full' : firstWidthPx
  useEffect(() => {
    if (!photo) return
    let cancelled = false
    const image = new Image()
    image.src = addressOf(photo, width)
    image
      .decode()
      .then(() => !cancelled && setLoaded({ image, failed: false, sha256: photo.sha256 }))
      .catch(() => !cancelled && setLoaded((before) => ({ ...before, failed: true, sha256: photo.sha256 })))
    return () => {
      cancelled = true
    }
  }, [photo, width])
  return loaded.sha256 === photo?.sha256 ? loaded : { image: null, failed: false }
}
