import type { PartRow } from '@shared/schemas/parts'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { useFaceWords } from '@/components/readings/face-words'
import { classNames } from '@/lib/class-names'

const columns = 'grid grid-cols-[minmax(0,1.2fr)_minmax(0,1fr)_minmax(0,1.3fr)_minmax(0,1fr)_4rem] gap-x-4'

export function PartHeads() {
  const { t } = useTranslation('parts')
  return (
    <div aria-hidden="true" className={classNames(columns, 'pb-2 text-axis text-muted')}>
      <span>{t('heads.part')}</span>
      <span>{t('heads.customer')}</span>
      <span>{t('heads.face')}</span>
      <span>{t('heads.tolerance')}</span>
      <span className="text-right">{t('heads.pieces')}</span>
    </div>
  )
}

export function PartLine({ part }: { part: PartRow }) {
  const { t } = useTranslation('parts')
  const words = useFaceWords()
  return (
    <li
      className={classNames(
        columns,
        'relative min-h-[52px] items-center border-hairline border-t py-1.5 first:border-t-0 hover:bg-step-active',
      )}
    >
      <div className="min-w-0">
        <Link to={`/parts/${part.id}`} className="font-semibold after:absolute after:inset-0">
          {part.number}
          {part.revision && <span className="font-normal text-muted"> {part.revision}</span>}
        </Link>
        <span className="block truncate text-muted text-second">{part.name}</span>
      </div>
      <span className="truncate">{part.customerName}</span>
      <FaceCells part={part} of={(face) => [face.name, words.size(face)]} empty={t('noFace')} />
      <FaceCells
        part={part}
        of={(face) => [words.tolerance(face.tolerance), words.rule(face.rule)]}
        empty=""
      />
      <span className="text-right">{part.pieceCount}</span>
    </li>
  )
}

interface CellsProps {
  part: PartRow
  of: (face: PartRow['faces'][number]) => [string, string]
  empty: string
}

/** The first face in two lines; how many more there are is told by their names. */
function FaceCells({ part, of, empty }: CellsProps) {
  if (part.faces.length === 0) return <span className="text-muted">{empty}</span>
  return (
    <div className="min-w-0">
      {part.faces.slice(0, 2).map((face) => {
        const [main, note] = of(face)
        return (
          <div key={face.id}>
            <span className="block truncate">{main}</span>
            <span className="block truncate text-muted text-second">{note}</span>
          </div>
        )
      })}
    </div>
  )
}
