import { readFileSync } from 'node:fs'
import { isRefused, type MeasureLine } from '../../../server/cli/measure/measure-file'

/** What is known of a drawn photograph, out of `truth.json`. */
export interface Truth {
  minimumZoneUm: number
  bandUm: number
  /** Whether the middle is high; absent where neither is. */
  convex?: boolean | null
}

/** One file against its truth. Errors and U in bands; null where the reading was refused. */
export interface JudgedFile {
  name: string
  refusal: string | null
  errorBands: number | null
  expandedUncertaintyBands: number | null
  covered: boolean
  /** null where the truth or the press test doesn't tell. */
  signRight: boolean | null
  warnings: readonly string[]
}

export function judgeLine(name: string, line: MeasureLine, truth: Truth): JudgedFile {
  if (isRefused(line)) {
    const refusal = `${line.error.code}: ${line.error.message}`
    const nothing = { errorBands: null, expandedUncertaintyBands: null, covered: false, signRight: null }
    return { name, refusal, ...nothing, warnings: [] }
  }
  const errorBands = (line.flatness.minimumZoneUm - truth.minimumZoneUm) / truth.bandUm
  const expandedUncertaintyBands = line.expandedUncertaintyUm / truth.bandUm
  return {
    name,
    refusal: null,
    errorBands,
    expandedUncertaintyBands,
    covered: Math.abs(errorBands) <= expandedUncertaintyBands,
    signRight: signRight(line.file, line.sagittaUm, truth),
    warnings: line.warnings,
  }
}

/** A press test settles the sign, so none given in spite of it is as wrong as the other one. */
function signRight(file: string, sagittaUm: number | null, { convex }: Truth): boolean | null {
  if (convex === undefined || convex === null) return null
  if (sagittaUm !== null) return sagittaUm > 0 === convex
  return JSON.parse(readFileSync(file, 'utf8')).pressTest ? false : null
}
