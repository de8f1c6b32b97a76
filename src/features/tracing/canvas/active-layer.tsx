import { memo, useCallback } from 'react'
import { useTranslation } from 'react-i18next'
import { Layer } from 'react-konva'
import { marksOf } from '../table-state'
import { useTable, useTableStore } from '../table-store'
import { drawGesture, drawSelected } from './draw-gesture'
import { Painted } from './painted'
import type { Pen } from './pen'
import type { View } from './use-viewport'

/** What is in the hand: the selected mark with its handles, and what the tool has set so far. */
export const ActiveLayer = memo(function ActiveLayer({ view }: { view: View }) {
  const { t } = useTranslation('table')
  const store = useTableStore()
  const marks = useTable(marksOf)
  const selection = useTable((table) => table.selection)
  const tool = useTable((table) => table.tool)
  const profile = useTable((table) => table.profile)
  const press = t('stage.press')

  const drawHeld = useCallback(
    (pen: Pen) => {
      if (selection) drawSelected(pen, marks, selection, press)
    },
    [marks, selection, press],
  )
  // biome-ignore lint/correctness/useExhaustiveDependencies: tool and profile are what is drawn of the store's state.
  const drawTool = useCallback((pen: Pen) => drawGesture(pen, store.get()), [store, tool, profile])
  return (
    <Layer listening={false}>
      <Painted viewport={view.viewport} draw={drawHeld} />
      <Painted viewport={view.viewport} draw={drawTool} />
    </Layer>
  )
})
