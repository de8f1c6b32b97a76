import { emptyMarks, type Marks } from '@shared/schemas/marks'
import { describe, expect, it } from 'vitest'
import { i18n } from '@/lib/i18n'
import { type ChecklistFacts, checklist } from './checklist'
import { findProblems } from './problems'
import { uprightBands } from './tools/at-the-table.fixture'

const t = i18n.getFixedT('en', 'table')
const outline = { kind: 'circle', cx: 50, cy: 50, r: 60 } as const
const frame = {
  toMm: (x: number, y: number) => [x, y] as const,
  toPx: (x: number, y: number) => [x, y] as const,
  mmPerPx: () => 0.0612,
}

function stepsOf(marks: Partial<Marks>, facts: Partial<ChecklistFacts> = {}) {
  const whole = { ...emptyMarks(), ...marks }
  const steps = checklist(t, {
    marks: whole,
    size: { shape: 'disc', diameterMm: 60 },
    frame: whole.outline ? frame : null,
    living: { read: { problems: findProblems(whole), figure: null, findings: [] }, isCurrent: true },
    hasLight: true,
    figureWords: null,
    isFinal: false,
    ...facts,
  })
  return Object.fromEntries(steps.map(({ name, state, words }) => [name, `${state}: ${words}`]))
}

describe('the checklist', () => {
  it('says at the start what is missing and what the result is worth without it', () => {
    expect(stepsOf({})).toEqual({
      face: 'open: missing: no scale without it',
      leaveOuts: 'open: none, no edge band',
      pressArrow: 'open: not drawn: high or hollow stays unsaid',
      bands: 'open: none traced yet',
      result: 'open: nothing to read yet',
    })
  })

  it('counts the copies of a leave-out, and gives the scale of the face', () => {
    const shape = { kind: 'circle', cx: 80, cy: 50, r: 5 } as const
    const leaveOuts = [{ id: 'slot', shape, copies: { count: 13, cx: 50, cy: 50 } }]
    const steps = stepsOf({ outline, leaveOuts, edgeBandMm: 0.8 })
    expect(steps.face).toBe('done: circle, 60.00 mm, 0.061 mm a pixel')
    expect(steps.leaveOuts).toBe('done: 13 places, edge band 0.8 mm')
  })

  it('tells bands without numbers from bands that are done', () => {
    expect(stepsOf({ outline, traces: uprightBands([10, 1], 30) }).bands).toBe(
      'attention: 2 traced; 1 without a number',
    )
    expect(stepsOf({ outline, traces: uprightBands([10, 1], [30, 2], [50, 2]) }).bands).toBe(
      'done: 3 pieces on 2 bands',
    )
  })

  it('counts mistakes as remarks', () => {
    const traces = uprightBands([10, 1], [30, 2], [50, 4], [70, 5])
    expect(stepsOf({ outline, traces }).bands).toBe('attention: 4 pieces on 4 bands; 1 remark')
  })

  it('never shows a figure that is not of these marks', () => {
    const marks = { outline, traces: uprightBands([10, 1]) }
    const living = { read: null, isCurrent: false }
    expect(stepsOf(marks, { living, figureWords: '0.464 µm' }).result).toBe('open: being read …')
    expect(stepsOf(marks, { figureWords: '0.464 µm' }).result).toBe('open: 0.464 µm; high or hollow unsaid')
  })

  it('asks for an outline that can be the face, and for a light source', () => {
    const steps = stepsOf({ outline }, { frame: null, hasLight: false })
    expect(steps.face).toContain("attention: circle, 60.00 mm: can't be the face")
    expect(steps.result).toBe('attention: no light source: no band height')
  })
})
