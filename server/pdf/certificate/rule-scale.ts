import type { Tolerance } from '@shared/schemas/parts'

/** The scale runs past the tolerance by this much of it, so that the gate stands at 5/8 of every rule. */
const reach = 1.6

export interface RuleScale {
  leastUm: number
  mostUm: number
  /** Gates at the limits, from low to high. */
  gatesUm: readonly number[]
  /** Units from the rule's left end. */
  toX: (valueUm: number) => number
}

export function ruleScale(tolerance: Tolerance, resultUm: number, width: number): RuleScale {
  const { leastUm, mostUm, gatesUm } = extent(tolerance, resultUm)
  return { leastUm, mostUm, gatesUm, toX: (um) => ((um - leastUm) / (mostUm - leastUm)) * width }
}

function extent(tolerance: Tolerance, resultUm: number): Omit<RuleScale, 'toX'> {
  switch (tolerance.kind) {
    case 'plain':
      return { leastUm: 0, mostUm: reach * tolerance.max.valueUm, gatesUm: [tolerance.max.valueUm] }
    case 'signed': {
      const least = tolerance.least.valueUm
      const most = tolerance.most.valueUm
      const beyond = ((reach - 1) / 2) * (most - least)
      return { leastUm: least - beyond, mostUm: most + beyond, gatesUm: [least, most] }
    }
    case 'none':
      return { leastUm: 0, mostUm: reach * (resultUm > 0 ? resultUm : 1), gatesUm: [] }
  }
}

export interface Graduation {
  value: number
  major: boolean
}

const leastMinor = 5.5
const leastMajor = 48

/** Graduations in steps of 1, 2 or 5, at least `leastMinor` units apart. */
export function graduations({ leastUm, mostUm }: RuleScale, width: number): Graduation[] {
  const perUnit = (mostUm - leastUm) / width
  const minor = niceStep(leastMinor * perUnit)
  const major = majorOf(minor, leastMajor * perUnit)
  const each = Math.round(major / minor)
  const first = Math.ceil(leastUm / minor - 1e-9)
  const last = Math.floor(mostUm / minor + 1e-9)
  return Array.from({ length: last - first + 1 }, (_, i) => first + i).map((n) => ({
    value: n * minor,
    major: n % each === 0,
  }))
}

/** The smallest of 1, 2, 5 × 10ⁿ that is at least `wanted`. */
export function niceStep(wanted: number): number {
  const decade = 10 ** Math.floor(Math.log10(wanted))
  const factor = [1, 2, 5, 10].find((f) => f * decade >= wanted * (1 - 1e-9)) ?? 10
  return factor * decade
}

/** The smallest nice step that is whole in minor ones. */
function majorOf(minor: number, wanted: number): number {
  let step = niceStep(wanted)
  while (Math.abs(step / minor - Math.round(step / minor)) > 1e-6) step = niceStep(step * 1.01)
  return step
}

/** Decimals that figures in steps of this size need. */
export function stepDecimals(step: number): number {
  return Math.max(0, -Math.floor(Math.log10(step) + 1e-9))
}
