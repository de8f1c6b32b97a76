import type { Tolerance } from '../schemas/parts'

/** The scale runs past the tolerance by this much of it, so that the gate stands at 5/8 of every rule. */
const reach = 1.6

export interface RuleScale {
  leastUm: number
  mostUm: number
  /** Gates at the limits, in µm from low to high. */
  gatesUm: readonly number[]
  /** From the left end of the rule, in whatever its width is given in. */
  toX: (valueUm: number) => number
}

/**
 * The scale of a tolerance rule. A plain tolerance runs from 0; a signed one shows as much beyond either limit; without one the result
 * decides, and one of 1 µm where there is none.
 *
 * @param width of the rule, px on a screen or points on paper
 */
export function ruleScale(tolerance: Tolerance, resultUm: number | null, width: number): RuleScale {
  const { leastUm, mostUm, gatesUm } = extent(tolerance, resultUm)
  const toX = (valueUm: number) => ((valueUm - leastUm) / (mostUm - leastUm)) * width
  return { leastUm, mostUm, gatesUm, toX }
}

function extent(tolerance: Tolerance, resultUm: number | null): Omit<RuleScale, 'toX'> {
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
      return { leastUm: 0, mostUm: reach * (resultUm && resultUm > 0 ? resultUm : 1), gatesUm: [] }
  }
}

export interface Graduation {
  value: number
  major: boolean
}

/** Between short graduations, and between long ones with their figures: px or points alike. */
const leastMinor = 5.5
const leastMajor = 48

/** Graduations from `least` to `most` in steps of 1, 2 or 5, as near as can be told apart; in the unit that is shown. */
export function graduations(least: number, most: number, width: number): Graduation[] {
  const perUnit = (most - least) / width
  const minor = niceStep(leastMinor * perUnit)
  const major = majorOf(minor, leastMajor * perUnit)
  const first = Math.ceil(least / minor - 1e-9)
  const last = Math.floor(most / minor + 1e-9)
  const each = Math.round(major / minor)
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
