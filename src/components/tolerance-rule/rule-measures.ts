export type RuleSize = 'full' | 'list' | 'tiny'

export interface RuleMeasures {
  widthPx: number
  heightPx: number
  baselineYPx: number
  barPx: number
  whiskerYPx: number
  capPx: number
  stemPx: number
  headRadiusPx: number
  gatePx: number
  /** Long and short graduations; none on the tiny rule. */
  graduationPx: { major: number; minor: number } | null
  gateBelowPx: number
}

export const ruleMeasures: Record<RuleSize, RuleMeasures> = {
  full: {
    widthPx: 272,
    heightPx: 62,
    baselineYPx: 31,
    barPx: 5,
    whiskerYPx: 12,
    capPx: 9,
    stemPx: 2.2,
    headRadiusPx: 4.6,
    gatePx: 1.6,
    graduationPx: { major: 7, minor: 4 },
    gateBelowPx: 12,
  },
  list: {
    widthPx: 220,
    heightPx: 26,
    baselineYPx: 17,
    barPx: 3,
    whiskerYPx: 6,
    capPx: 6,
    stemPx: 1.8,
    headRadiusPx: 3.2,
    gatePx: 1.4,
    graduationPx: { major: 5, minor: 3 },
    gateBelowPx: 8,
  },
  tiny: {
    widthPx: 120,
    heightPx: 18,
    baselineYPx: 13,
    barPx: 3,
    whiskerYPx: 5,
    capPx: 5,
    stemPx: 1.8,
    headRadiusPx: 2.6,
    gatePx: 1.4,
    graduationPx: null,
    gateBelowPx: 5,
  },
}

export const whiskerPx = 1.25
