import { bandHeightUm } from '@shared/metrology'
import type { Reading } from '@shared/schemas/readings'
import { formatWithUncertainty } from '@shared/units/height'
import { isEditable } from '@shared/workflow/reading-states'
import { useMemo } from 'react'
import { useTranslation } from 'react-i18next'
import { useHeights } from '@/lib/use-heights'
import { type ChecklistStep, checklist } from './checklist'
import { flatnessOf } from './panels/figure-head'
import { partFrameOf } from './part-frame-of'
import type { Problem } from './problems'
import type { LineMm } from './result/profile-along'
import type { Circumstances } from './result/read-marks'
import { type LivingResult, useLivingResult } from './result/use-living-result'
import { marksOf } from './table-state'
import { useTable, useTableStore } from './table-store'
import { useOpenRemarks } from './use-open-remarks'

/** The figure as it is marked, or as it was sent, and what follows from it for the parts of the page. */
export function useTableResult(reading: Reading, circumstances: Circumstances) {
  const { t } = useTranslation('table')
  const marks = useTable(marksOf)
  const store = useTableStore()
  const readNow = useLivingResult(store, circumstances)
  const isFinal = !isEditable(reading.state) && reading.fullResult?.figure != null
  const living = useMemo(() => (isFinal ? asSent(reading) : readNow), [isFinal, reading, readNow])
  const remarks = useOpenRemarks(reading)
  const frame = useMemo(() => partFrameOf(marks.outline, circumstances), [marks.outline, circumstances])
  const figure = living.read?.figure ?? null
  const bandUm = circumstances
    ? bandHeightUm(circumstances.setUp.wavelengthNm, circumstances.setUp.viewingAngleDeg)
    : null
  const { unit, band } = useHeights(bandUm)
  const figureWords =
    figure &&
    unitWords(formatWithUncertainty(flatnessOf(figure, reading), figure.expandedUncertaintyUm, unit, band))
  const steps: ChecklistStep[] = checklist(t, {
    marks,
    size: reading.face.size,
    frame,
    living,
    hasLight: circumstances !== null,
    figureWords,
    isFinal,
  })
  return { living: withRemarks(living, remarks), isFinal, frame, figure, bandUm, steps, line: useLine(frame) }
}

function unitWords({ value, u, unit }: { value: string; u: string; unit: string }): string {
  return `${value} ${u.replace('±', '±\u2009')} ${unit}`
}

/** The checklist counts mistakes alone; what a reviewer asks is shown beside them. */
function withRemarks(living: LivingResult, remarks: readonly Problem[]): LivingResult {
  if (!living.read || remarks.length === 0) return living
  return { ...living, read: { ...living.read, problems: [...remarks, ...living.read.problems] } }
}

function asSent({ fullResult }: Reading): LivingResult {
  const figure = fullResult?.figure ?? null
  return { read: { figure, findings: fullResult?.findings ?? [], problems: [] }, isCurrent: true }
}

/** The drawn profile line on the part. */
function useLine(frame: ReturnType<typeof partFrameOf>): LineMm | null {
  const profile = useTable((table) => table.profile)
  return useMemo(
    () => profile && frame && { from: frame.toMm(...profile.from), to: frame.toMm(...profile.to) },
    [profile, frame],
  )
}
