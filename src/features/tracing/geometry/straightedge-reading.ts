import type { Straightedge } from '@shared/schemas/marks'

export interface StraightedgeReading {
  bowPx: number
  spacingPx: number
  /** Bow over spacing: how many bands the band bows. */
  bands: number
}

/** As with a ruler on paper: how far the band bows from the chord, over how far the next band stands. */
export function readStraightedge({ from, to, bowAt, nextBandAt }: Straightedge): StraightedgeReading | null {
  const [dx, dy] = [to[0] - from[0], to[1] - from[1]]
  const length = Math.hypot(dx, dy)
  if (length === 0) return null
  const off = ([x, y]: Straightedge['from']) => ((x - from[0]) * dy - (y - from[1]) * dx) / length
  const bowPx = Math.abs(off(bowAt))
  const spacingPx = Math.abs(off(nextBandAt) - off(bowAt))
  if (spacingPx === 0) return null
  return { bowPx, spacingPx, bands: bowPx / spacingPx }
}
