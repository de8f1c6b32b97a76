import { memo, useCallback } from 'react'
import { Layer } from 'react-konva'
import type { Problem } from '../problems'
import { marksOf } from '../table-state'
import { useTable } from '../table-store'
import { drawNumbers, drawProblem } from './draw-marks'
import { Painted } from './painted'
import { drawChip, type Pen } from './pen'
import type { View } from './use-viewport'

interface Props {
  view: View
  problems: readonly Problem[]
}

/** Numbers and mistakes, above all lines. */
export const NotesLayer = memo(function NotesLayer({ view, problems }: Props) {
  const traces = useTable((table) => marksOf(table).traces)
  const selectedId = useTable((table) => (table.selection?.kind === 'trace' ? table.selection.id : null))
  const isNumbering = useTable((table) => table.tool.tool === 'number')
  const draw = useCallback(
    (pen: Pen) => {
      drawNumbers(pen, traces, { onAllPieces: isNumbering, selectedId })
      for (const { place, code } of problems) {
        if (code === 'noNumber') drawChip(pen, { text: '?', place, attention: true })
        else drawProblem(pen, place)
      }
    },
    [traces, problems, isNumbering, selectedId],
  )
  return (
    <Layer listening={false}>
      <Painted viewport={view.viewport} draw={draw} />
    </Layer>
  )
})
