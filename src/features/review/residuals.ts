import type { Reading } from '@shared/schemas/readings'

/** Clicks so far from their band are drawn darkest, px. */
export const residualScalePx = 3

/** Distance of each click from its fitted band, px, by trace; none without a figure. */
export function residualsByTrace({ fullResult }: Reading): ReadonlyMap<string, readonly number[]> {
  return new Map(fullResult?.figure?.residuals.map(({ traceId, residualsPx }) => [traceId, residualsPx]))
}

export interface ResidualSummary {
  rmsPx: number
  farthestPx: number
  setAside: number
}

/** How far the clicks lie from their bands; null without a figure. */
export function summariseResiduals(reading: Reading): ResidualSummary | null {
  const figure = reading.fullResult?.figure
  const all = [...residualsByTrace(reading).values()].flat()
  if (!figure || all.length === 0) return null
  return {
    rmsPx: Math.sqrt(all.reduce((sum, px) => sum + px * px, 0) / all.length),
    farthestPx: all.reduce((farthest, px) => Math.max(farthest, Math.abs(px)), 0),
    setAside: figure.fit.pointsSetAside,
  }
}
