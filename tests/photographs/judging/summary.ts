import type { JudgedFile } from './judged-file'

/** Figures of a whole folder. Errors and U in bands. */
export interface Summary {
  files: number
  medianError: number
  error90th: number
  largestError: number
  coveredShare: number
  medianU: number
  signsWrong: number
  refused: number
  warnedShare: number
}

export function summarize(files: readonly JudgedFile[]): Summary {
  const errors = numbers(files.map(({ errorBands }) => errorBands)).map(Math.abs)
  const uncertainties = numbers(files.map((file) => file.expandedUncertaintyBands))
  const share = (holds: (file: JudgedFile) => boolean) => files.filter(holds).length / files.length
  return {
    files: files.length,
    medianError: percentile(errors, 0.5),
    error90th: percentile(errors, 0.9),
    largestError: percentile(errors, 1),
    coveredShare: share(({ covered }) => covered),
    medianU: percentile(uncertainties, 0.5),
    signsWrong: files.filter(({ signRight }) => signRight === false).length,
    refused: files.filter(({ refusal }) => refusal !== null).length,
    warnedShare: share(({ warnings }) => warnings.length > 0),
  }
}

function numbers(values: readonly (number | null)[]): number[] {
  return values.filter((value) => value !== null)
}

/** Between the two nearest of the sorted values; infinite where there are none, which misses every target. */
function percentile(values: readonly number[], share: number): number {
  if (values.length === 0) return Number.POSITIVE_INFINITY
  const sorted = values.toSorted((a, b) => a - b)
  const at = share * (sorted.length - 1)
  const below = sorted[Math.floor(at)]
  const above = sorted[Math.ceil(at)]
  return below + (above - below) * (at - Math.floor(at))
}
