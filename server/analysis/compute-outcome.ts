import { figureForStorage, readTraces, storedFinding, type TracedReading } from '@shared/metrology'
import type { Figure, ReadingResult } from '@shared/schemas/results'

/** A figure or a refusal as they are stored: plain JSON that goes between threads as it is. */
export type ComputedOutcome =
  | { kind: 'figure'; figure: Figure }
  | { kind: 'refused'; findings: ReadingResult['findings'] }

export function computeOutcome(reading: TracedReading): ComputedOutcome {
  const outcome = readTraces(reading)
  return outcome.kind === 'figure'
    ? { kind: 'figure', figure: figureForStorage(outcome.result) }
    : { kind: 'refused', findings: outcome.findings.map(storedFinding) }
}
