import type { PieceRow } from '@shared/schemas/pieces'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { classNames } from '@/lib/class-names'
import { formatSince } from '@/lib/format-when'
import { lineColumns, ReadingLine } from './reading-line'
import { ReadingThumb } from './reading-thumb'

/** A piece in a list with its latest reading. */
export function PieceLine({ piece }: { piece: PieceRow }) {
  const { t } = useTranslation('pieces')
  const to = `/pieces/${piece.id}`
  if (piece.latest) {
    const { number, faceName, createdAt } = piece.latest
    return (
      <ReadingLine
        reading={piece.latest}
        to={to}
        what={t('line.what', { number, face: faceName })}
        note={piece.customerName}
        when={formatSince(createdAt)}
      />
    )
  }
  return (
    <li
      className={classNames(
        lineColumns,
        'relative min-h-[52px] border-hairline border-t py-1.5 first:border-t-0 hover:bg-step-active',
      )}
    >
      <ReadingThumb reading={null} />
      <div className="min-w-0 pr-2">
        <Link to={to} className="block truncate font-semibold after:absolute after:inset-0">
          {piece.partNumber} · {piece.serial}
        </Link>
        <span className="block truncate text-muted text-second">{piece.partName}</span>
      </div>
      <div className="min-w-0 pr-3">
        <span className="block text-muted">{t('line.noReading')}</span>
        <span className="block truncate text-muted text-second">{piece.customerName}</span>
      </div>
    </li>
  )
}
