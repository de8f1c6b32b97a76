import type { ReadingRow } from '@shared/schemas/readings'
import { useState } from 'react'
import { classNames } from '@/lib/class-names'

interface Props {
  reading: Pick<ReadingRow, 'id' | 'face' | 'photoSha256' | 'result'> | null
  sizePx?: number
}

/** The height map in small; before there is one the photograph; before that an empty outline. Ornament: words stand beside it. */
export function ReadingThumb({ reading, sizePx = 34 }: Props) {
  const sources = reading ? sourcesOf(reading) : []
  const [failed, setFailed] = useState<readonly string[]>([])
  const source = sources.find((candidate) => !failed.includes(candidate))
  const isRound = reading ? reading.face.size.shape === 'disc' || reading.face.size.shape === 'annulus' : true
  return (
    <span
      className={classNames(
        'block shrink-0 overflow-hidden outline-1 outline-edge',
        isRound && 'rounded-full',
        !source && 'outline-hairline outline-dashed',
      )}
      style={{ width: sizePx, height: sizePx }}
    >
      {source && (
        <img
          src={source}
          alt=""
          loading="lazy"
          className={classNames('size-full', isRound ? 'object-cover' : 'object-contain')}
          onError={() => setFailed((before) => [...before, source])}
        />
      )}
    </span>
  )
}

function sourcesOf({ id, photoSha256, result }: NonNullable<Props['reading']>): string[] {
  const sources: string[] = []
  // The result's id keeps an older map out of the browser's cache.
  if (result?.outcome === 'figure') sources.push(`/api/readings/${id}/map.png?size=96&result=${result.id}`)
  if (photoSha256) sources.push(`/api/photos/${photoSha256}/preview?width=160`)
  return sources
}
