// @vitest-environment happy-dom
import { emptyMarks, type Marks } from '@shared/schemas/marks'
import type { Reading } from '@shared/schemas/readings'
import { beforeEach, describe, expect, it } from 'vitest'
import { openTable } from './open-table'
import { copyInBrowser, readCopy } from './saving/copy-in-browser'
import { marksToKeep } from './table-state'
import { uprightBands } from './tools/at-the-table.fixture'

/** As much of a reading as a table opens with. */
function reading(marks: Marks, marksVersion: number, mayEdit = true): Reading {
  const face = { size: { shape: 'disc', diameterMm: 40 } }
  return { id: 'reading-1', marks, marksVersion, mayEdit, face } as Reading
}

const saved = emptyMarks(0.5)
const unsaved = { ...saved, traces: uprightBands([10, 1]) }

beforeEach(() => localStorage.clear())

describe('opening the table', () => {
  it('takes up the first tool that is needed', () => {
    const outline = { kind: 'circle', cx: 0, cy: 0, r: 9 } as const
    const toolOf = (marks: Marks, mayEdit = true) =>
      openTable(reading(marks, 1, mayEdit), 0).store.get().tool.tool
    expect(toolOf(saved)).toBe('face')
    expect(toolOf({ ...saved, outline })).toBe('band')
    expect(toolOf({ ...unsaved, outline })).toBe('pick')
    expect(toolOf(saved, false)).toBe('pick')
  })

  it('marks a disc seen at an angle as an ellipse', () => {
    expect(openTable(reading(saved, 1), 20).store.get().options.faceWay).toBe('ellipse')
    expect(openTable(reading(saved, 1), 0).store.get().options.faceWay).toBe('circle')
  })

  it('puts back what an earlier visit could not save, as a step that can be undone', () => {
    copyInBrowser('reading-1').keep({ basedOnVersion: 3, marks: unsaved })
    const opened = openTable(reading(saved, 3), 0)
    expect(opened.isRestored).toBe(true)
    expect(marksToKeep(opened.store.get())).toEqual(unsaved)
    opened.store.dispatch({ type: 'undo' })
    expect(marksToKeep(opened.store.get())).toEqual(saved)
  })

  it('leaves the choice to a person where others have saved meanwhile', () => {
    copyInBrowser('reading-1').keep({ basedOnVersion: 3, marks: unsaved })
    const opened = openTable(reading(saved, 5), 0)
    expect(opened.overtaken).toMatchObject({ mine: unsaved, stale: { currentVersion: 5 } })
    expect(marksToKeep(opened.store.get())).toBe(saved)
    expect(readCopy('reading-1')).not.toBeNull()
  })

  it('forgets a copy that had been saved after all', () => {
    copyInBrowser('reading-1').keep({ basedOnVersion: 3, marks: unsaved })
    const opened = openTable(reading(unsaved, 4), 0)
    expect(opened).toMatchObject({ isRestored: false, overtaken: null })
    expect(readCopy('reading-1')).toBeNull()
  })

  it('does not trip over a copy that can’t be read', () => {
    localStorage.setItem('lapwing.marks.reading-1', '{"marks":')
    expect(openTable(reading(saved, 1), 0).isRestored).toBe(false)
  })
})
