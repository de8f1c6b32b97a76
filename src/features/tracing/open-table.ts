import type { Reading } from '@shared/schemas/readings'
import type { StaleSave } from './saving/autosave'
import { copyInBrowser, readCopy } from './saving/copy-in-browser'
import { startTable, stepTable } from './table-state'
import { createTableStore, newMarkId, type TableStore } from './table-store'
import { usualFaceWay } from './tools/face-tool'
import type { ToolName } from './tools/tool'

export interface OpenedTable {
  store: TableStore
  /** Unsaved marks of an earlier visit are on the table again. */
  isRestored: boolean
  /** Unsaved marks of an earlier visit that others have overtaken, and by what. */
  overtaken: { mine: Reading['marks']; stale: StaleSave } | null
}

/** The table as a reading opens on it, with what an earlier visit could not save. */
export function openTable(reading: Reading, viewingAngleDeg: number): OpenedTable {
  const start = startTable(
    reading.marks,
    {
      faceWay: usualFaceWay(reading.face.size, viewingAngleDeg),
      leaveOutWay: 'circle',
      copyCount: 6,
      firstNumber: null,
    },
    firstTool(reading),
  )
  const copy = reading.mayEdit ? unsavedCopy(reading) : null
  if (!copy) return { store: createTableStore(start, reading.mayEdit), isRestored: false, overtaken: null }
  if (copy.basedOnVersion === reading.marksVersion) {
    const restored = stepTable(start, { type: 'edit', marks: copy.marks }, newMarkId)
    return { store: createTableStore(restored, true), isRestored: true, overtaken: null }
  }
  const stale = { currentVersion: reading.marksVersion, savedAt: null, savedBy: null }
  return {
    store: createTableStore(start, true),
    isRestored: false,
    overtaken: { mine: copy.marks, stale },
  }
}

/** A copy that says the same as the server was saved, only its acknowledgement was lost. */
function unsavedCopy(reading: Reading) {
  const copy = readCopy(reading.id)
  if (!copy) return null
  if (JSON.stringify(copy.marks) !== JSON.stringify(reading.marks)) return copy
  copyInBrowser(reading.id).forget()
  return null
}

/** The first thing that is missing. */
function firstTool({ marks, mayEdit }: Reading): ToolName {
  if (!mayEdit) return 'pick'
  if (!marks.outline) return 'face'
  return marks.traces.length === 0 ? 'band' : 'pick'
}
