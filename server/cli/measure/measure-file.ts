import { type Finding, type FlatnessResult, readTraces, type TracedReading } from '@shared/metrology'
import { sentence } from '../../i18n'
import { loadMeasureFile, MeasureRefusal } from './load-measure-file'
import { findingSentence } from './sentences'

/** One line of the measuring command: figures, or why there are none. */
export type MeasureLine = MeasuredLine | RefusedLine

export interface MeasuredLine
  extends Pick<
    FlatnessResult,
    'mode' | 'bandUm' | 'flatness' | 'expandedUncertaintyUm' | 'form' | 'notStated'
  > {
  file: string
  sagittaUm: number | null
  /** Sentences for the person. */
  warnings: string[]
}

export interface RefusedLine {
  file: string
  error: { code: string; message: string }
}

/** Measures one file; whatever goes wrong with it is in the line, so that the others are still done. */
export async function measureFile(file: string): Promise<MeasureLine> {
  try {
    return measureReading(file, await loadMeasureFile(file))
  } catch (error) {
    if (error instanceof MeasureRefusal) return refusedLine(file, error.code, error.message)
    return refusedLine(file, 'internal', sentence('measureFile.fault', { reason: String(error) }))
  }
}

export function isRefused(line: MeasureLine): line is RefusedLine {
  return 'error' in line
}

function measureReading(file: string, reading: TracedReading): MeasureLine {
  const outcome = readTraces(reading)
  if (outcome.kind === 'refused') return refusedByFindings(file, outcome.findings)
  const { mode, bandUm, flatness, expandedUncertaintyUm, terms, form, notStated, findings } = outcome.result
  return {
    file,
    mode,
    bandUm,
    flatness,
    expandedUncertaintyUm,
    sagittaUm: terms.sagittaUm,
    form,
    notStated,
    warnings: [
      ...findings.filter(({ severity }) => severity === 'warning').map(findingSentence),
      ...perspectiveWarning(reading),
    ],
  }
}

/** Without the photograph's size nobody knows on which side of a tilted face the camera stood. */
function perspectiveWarning({ outline, photo }: TracedReading): string[] {
  return outline.kind === 'ellipse' && !photo ? [sentence('measureFile.photoSizeUnknown')] : []
}

function refusedByFindings(file: string, findings: readonly Finding[]): RefusedLine {
  const refusals = findings.filter(({ severity }) => severity === 'refusal')
  const [first] = refusals
  return refusedLine(file, first?.code ?? 'refused', refusals.map(findingSentence).join(' '))
}

function refusedLine(file: string, code: string, message: string): RefusedLine {
  return { file, error: { code, message } }
}
