import type { Marks, Trace } from '@shared/schemas/marks'
import { X } from 'lucide-react'
import { memo } from 'react'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'
import { removeSelected, withNumber } from '../geometry/edit-marks'
import { marksOf, type TableState } from '../table-state'
import { useTable, useTableStore } from '../table-store'
import { SmallNumber } from './small-number'

/** The bands as a list, for the keyboard and for those who don't see the photograph. */
export function BandList({ mayEdit }: { mayEdit: boolean }) {
  const { t } = useTranslation('table')
  const traces = useTable(tracesOf)
  const selectedId = useTable((table) => (table.selection?.kind === 'trace' ? table.selection.id : null))
  return (
    <section aria-label={t('bands.title')} className="pt-4">
      <h2 className="px-4 pb-1 max-desk:px-0 font-semibold text-muted text-second">{t('bands.title')}</h2>
      {traces.length === 0 && <p className="px-4 max-desk:px-0 text-axis text-muted">{t('bands.none')}</p>}
      <ul className="max-desk:grid max-desk:grid-cols-3 max-desk:gap-x-6">
        {traces.map((trace, i) => (
          <BandLine
            key={trace.id}
            trace={trace}
            index={i + 1}
            isSelected={trace.id === selectedId}
            mayEdit={mayEdit}
          />
        ))}
      </ul>
    </section>
  )
}

const tracesOf = (table: TableState) => marksOf(table).traces

interface LineProps {
  trace: Trace
  index: number
  isSelected: boolean
  mayEdit: boolean
}

const BandLine = memo(function BandLine({ trace, index, isSelected, mayEdit }: LineProps) {
  const { t } = useTranslation('table')
  const store = useTableStore()
  const { id, order, points } = trace
  const edit = (change: (marks: Marks) => Marks) =>
    store.dispatch({ type: 'edit', marks: change(marksOf(store.get())) })
  return (
    <li
      className={classNames(
        'flex h-8 items-center gap-1.5 pr-1.5 pl-4 max-desk:h-12 max-desk:pl-0',
        isSelected && 'bg-step-active',
      )}
    >
      <SmallNumber
        label={t('bands.number', { index })}
        labelHidden
        value={order}
        least={-9999}
        most={9999}
        whole
        mayBeEmpty
        placeholder="–"
        disabled={!mayEdit}
        onCommit={(number) => edit((marks) => withNumber(marks, id, number))}
        className={classNames('h-6 w-11', order === null && 'border-chestnut')}
      />
      <button
        type="button"
        aria-label={t('bands.selectNamed', { index })}
        onClick={() => store.dispatch({ type: 'select', selection: { kind: 'trace', id, point: null } })}
        className="flex-1 self-stretch whitespace-nowrap text-left text-axis text-muted hover:text-ink"
      >
        {t('bands.points', { count: points.length })}
      </button>
      {mayEdit && (
        <button
          type="button"
          aria-label={t('bands.delete', { index })}
          onClick={() => edit((marks) => removeSelected(marks, { kind: 'trace', id, point: null }))}
          className="flex size-7 items-center justify-center rounded text-muted hover:text-ink max-desk:size-11"
        >
          <X aria-hidden="true" size={14} />
        </button>
      )}
    </li>
  )
})
