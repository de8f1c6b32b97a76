import type { PartFrame } from '@shared/geometry/part-frame'
import { copiesOf } from '@shared/geometry/shape'
import type { Marks, Outline } from '@shared/schemas/marks'
import type { FaceSizes } from '@shared/schemas/parts'
import type { TFunction } from 'i18next'
import { centreOfShape } from './geometry/shape-path'
import type { LivingResult } from './result/use-living-result'

export type StepName = 'face' | 'leaveOuts' | 'pressArrow' | 'bands' | 'result'

export interface ChecklistStep {
  name: StepName
  /** `open` is not done and needn't be; `attention` needs a person. */
  state: 'done' | 'attention' | 'open'
  words: string
  /** For narrow screens, where it differs. */
  shortWords?: string
}

export interface ChecklistFacts {
  marks: Marks
  size: FaceSizes
  frame: PartFrame | null
  living: LivingResult
  hasLight: boolean
  /** "0.464 ± 0.041 µm", or null without a figure. */
  figureWords: string | null
  isFinal: boolean
}

/** What is done, what is missing, and what the result is worth without it. */
export function checklist(t: TFunction<'table'>, facts: ChecklistFacts): ChecklistStep[] {
  return [
    faceStep(t, facts),
    leaveOutStep(t, facts.marks),
    arrowStep(t, facts.marks),
    bandStep(t, facts),
    resultStep(t, facts),
  ]
}

function faceStep(t: TFunction<'table'>, { marks: { outline }, size, frame }: ChecklistFacts): ChecklistStep {
  if (!outline)
    return {
      name: 'face',
      state: 'open',
      words: t('checklist.faceMissing'),
      shortWords: t('checklist.faceMissingShort'),
    }
  const shape = shapeWords(t, outline, sizeWords(size))
  if (!frame) return { name: 'face', state: 'attention', words: `${shape}: ${t('checklist.faceBad')}` }
  const mm = frame.mmPerPx(...centreOfShape(outline))
  return {
    name: 'face',
    state: 'done',
    words: `${shape}, ${t('checklist.faceScale', { mm: mm.toPrecision(2) })}`,
    shortWords: shape,
  }
}

function shapeWords(t: TFunction<'table'>, outline: Outline, size: string): string {
  switch (outline.kind) {
    case 'circle':
      return t('checklist.faceCircle', { size })
    case 'ellipse':
      return t('checklist.faceEllipse', { size })
    case 'polygon':
      return t('checklist.facePolygon', { count: outline.points.length, size })
  }
}

function sizeWords(size: FaceSizes): string {
  switch (size.shape) {
    case 'disc':
    case 'annulus':
      return `${size.diameterMm.toFixed(2)} mm`
    case 'block':
      return `${size.widthMm} × ${size.heightMm} mm`
    case 'free':
      return `${size.longestSideMm} mm`
  }
}

function leaveOutStep(t: TFunction<'table'>, { leaveOuts, edgeBandMm }: Marks): ChecklistStep {
  const count = leaveOuts.reduce((sum, leaveOut) => sum + copiesOf(leaveOut).length, 0)
  const places = count === 0 ? t('checklist.leaveOutNone') : t('checklist.leaveOutCount', { count })
  const edge = edgeBandMm > 0 ? t('checklist.edgeBand', { mm: edgeBandMm }) : t('checklist.edgeBandNone')
  const isDone = count > 0 || edgeBandMm > 0
  return {
    name: 'leaveOuts',
    state: isDone ? 'done' : 'open',
    words: `${places}, ${edge}`,
    shortWords: count > 0 ? places : edge,
  }
}

function arrowStep(t: TFunction<'table'>, { pressArrow }: Marks): ChecklistStep {
  return {
    name: 'pressArrow',
    state: pressArrow ? 'done' : 'open',
    words: t(pressArrow ? 'checklist.arrowSet' : 'checklist.arrowMissing'),
    shortWords: t(pressArrow ? 'checklist.arrowSetShort' : 'checklist.arrowMissingShort'),
  }
}

function bandStep(t: TFunction<'table'>, { marks: { traces }, living }: ChecklistFacts): ChecklistStep {
  if (traces.length === 0) return { name: 'bands', state: 'open', words: t('checklist.bandsNone') }
  const orders = new Set(traces.flatMap(({ order }) => (order === null ? [] : [order])))
  const unnumbered = traces.filter(({ order }) => order === null).length
  const traced = t('checklist.bandsTraced', { count: traces.length })
  const counted =
    orders.size === 0 || unnumbered > 0
      ? traced
      : `${t('checklist.bandsOf', { count: traces.length })} ${t('checklist.onBands', { count: orders.size })}`
  if (unnumbered > 0)
    return {
      name: 'bands',
      state: 'attention',
      words: `${counted}; ${t('checklist.unnumbered', { count: unnumbered })}`,
      shortWords: t('checklist.unnumbered', { count: unnumbered }),
    }
  const remarks = living.read?.problems.length ?? 0
  if (remarks === 0) return { name: 'bands', state: 'done', words: counted, shortWords: traced }
  return {
    name: 'bands',
    state: 'attention',
    words: `${counted}; ${t('checklist.remarks', { count: remarks })}`,
    shortWords: t('checklist.remarks', { count: remarks }),
  }
}

function resultStep(t: TFunction<'table'>, facts: ChecklistFacts): ChecklistStep {
  const { marks, living, hasLight, figureWords, isFinal } = facts
  const open = (key: `checklist.result${string}`): ChecklistStep => ({
    name: 'result',
    state: 'open',
    words: t(key),
  })
  if (!hasLight) return { ...open('checklist.resultNoLight'), state: 'attention' }
  if (!marks.outline || marks.traces.length === 0) return open('checklist.resultNone')
  if (!living.isCurrent) return open('checklist.resultWorking')
  if (figureWords === null)
    return { ...open('checklist.resultRefused'), shortWords: t('checklist.resultRefusedShort') }
  const key = isFinal ? 'resultFinal' : marks.pressArrow ? 'resultFigure' : 'resultUnsigned'
  return {
    name: 'result',
    state: 'open',
    words: t(`checklist.${key}`, { figure: figureWords }),
    shortWords: figureWords,
  }
}
