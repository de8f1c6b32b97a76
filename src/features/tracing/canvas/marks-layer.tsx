import type { PartFrame } from '@shared/geometry/part-frame'
import type { Marks } from '@shared/schemas/marks'
import { memo, useCallback, useMemo, useRef } from 'react'
import { useTranslation } from 'react-i18next'
import { Layer } from 'react-konva'
import { edgeBandPaths } from '../geometry/edge-band-paths'
import { marksOf } from '../table-state'
import { useTable } from '../table-store'
import type { Selection } from '../tools/tool'
import {
  drawDatum,
  drawEdgeBand,
  drawLeaveOut,
  drawOutline,
  drawPressArrow,
  drawStraightedge,
  drawTrace,
} from './draw-marks'
import { Painted } from './painted'
import type { Pen } from './pen'
import type { View } from './use-viewport'

interface Props {
  view: View
  frame: PartFrame | null
}

/** Everything that isn't in the hand. Dragging one band leaves this layer as it is. */
export const MarksLayer = memo(function MarksLayer({ view, frame }: Props) {
  const { t } = useTranslation('table')
  const marks = useTable(marksOf)
  const selection = useTable((table) => table.selection)
  const still = useStill(marks, selection)
  const { outline, leaveOuts, edgeBandMm } = marks
  const edgePaths = useMemo(
    () => (frame ? edgeBandPaths({ outline, leaveOuts, edgeBandMm }, frame) : []),
    [frame, outline, leaveOuts, edgeBandMm],
  )
  const press = t('stage.press')

  const drawStill = useCallback(
    (pen: Pen) => {
      drawOutline(pen, still.outline, false)
      for (const leaveOut of still.leaveOuts) drawLeaveOut(pen, leaveOut, false)
      for (const trace of still.traces) drawTrace(pen, trace, false)
      drawStraightedge(pen, still.straightedge, false)
      drawPressArrow(pen, still.pressArrow, press, false)
      for (const mark of still.datumMarks) drawDatum(pen, mark, false)
    },
    [still, press],
  )
  const drawEdge = useCallback((pen: Pen) => drawEdgeBand(pen, edgePaths), [edgePaths])
  return (
    <Layer listening={false}>
      <Painted viewport={view.viewport} draw={drawEdge} />
      <Painted viewport={view.viewport} draw={drawStill} />
    </Layer>
  )
})

type Still = Pick<Marks, 'outline' | 'leaveOuts' | 'traces' | 'straightedge' | 'pressArrow' | 'datumMarks'>

/** The marks without what is selected; the same object as long as nothing of it changes. */
function useStill(marks: Marks, selection: Selection | null): Still {
  const before = useRef<Still | null>(null)
  const id = selection && 'id' in selection ? selection.id : null
  const is = (kind: Selection['kind']) => selection?.kind === kind
  const now: Still = {
    outline: is('outline') ? null : marks.outline,
    leaveOuts: marks.leaveOuts.filter((leaveOut) => leaveOut.id !== id),
    traces: marks.traces.filter((trace) => trace.id !== id),
    straightedge: is('straightedge') ? null : marks.straightedge,
    pressArrow: is('pressArrow') ? null : marks.pressArrow,
    datumMarks: marks.datumMarks.filter((mark) => mark.id !== id),
  }
  if (!before.current || !isSame(before.current, now)) before.current = now
  return before.current
}

function isSame(a: Still, b: Still): boolean {
  return (
    a.outline === b.outline &&
    a.straightedge === b.straightedge &&
    a.pressArrow === b.pressArrow &&
    haveSame(a.leaveOuts, b.leaveOuts) &&
    haveSame(a.traces, b.traces) &&
    haveSame(a.datumMarks, b.datumMarks)
  )
}

function haveSame<T>(a: readonly T[], b: readonly T[]): boolean {
  return a.length === b.length && a.every((item, i) => item === b[i])
}
