import type { ReadingRow } from '@shared/schemas/readings'
import type { Verdict } from '@shared/schemas/results'
import { readingFacts } from '@/components/tolerance-rule/reading-rule'

export interface TimelineReading {
  id: string
  at: string
  valueUm: number
  uUm: number | null
  /** null for a draft: it has none yet. */
  verdict: Verdict | null
}

/** Readings with a figure as points in time; signed where the tolerance is. */
export function timelineReadings(readings: readonly ReadingRow[]): TimelineReading[] {
  return readings.flatMap((reading) => {
    const facts = readingFacts(reading)
    if (facts.resultUm === null) return []
    return [
      {
        id: reading.id,
        at: reading.createdAt,
        valueUm: facts.resultUm,
        uUm: facts.expandedUncertaintyUm,
        verdict: facts.draft ? null : facts.verdict,
      },
    ]
  })
}
