import type { Summary } from './summary'

export interface Check {
  says: string
  passed: boolean
}

type Figure = Exclude<keyof Summary, 'files'>

interface Target {
  figure: Figure
  name: string
  /** What is aimed at: at most this, or at least it. */
  most?: number
  least?: number
  /** How much worse than recorded still counts as the same. */
  slack: number
}

const targets: readonly Target[] = [
  { figure: 'medianError', name: 'Median error, bands', most: 0.003, slack: 0.0002 },
  { figure: 'error90th', name: 'Error of nine in ten, bands', most: 0.012, slack: 0.0005 },
  { figure: 'largestError', name: 'Largest error, bands', most: 0.03, slack: 0.001 },
  { figure: 'coveredShare', name: 'Share of truths within U', least: 0.93, slack: 0 },
  { figure: 'medianU', name: 'Median U, bands', most: 0.03, slack: 0.0005 },
  { figure: 'signsWrong', name: 'Sagittas of the wrong sign', most: 0, slack: 0 },
  { figure: 'refused', name: 'Refused', most: 0, slack: 0 },
  { figure: 'warnedShare', name: 'Share with warnings', most: 0.05, slack: 0 },
]

/** Whether every target is met. */
export function checkTargets(summary: Summary): Check[] {
  return targets.map(({ figure, name, most, least }) => {
    const value = summary[figure]
    return most === undefined
      ? check(name, value, `at least ${least}`, value >= (least ?? 0))
      : check(name, value, `at most ${most}`, value <= most)
  })
}

/** Whether anything got worse than it was when the figures were recorded. */
export function checkAgainst(summary: Summary, recorded: Summary): Check[] {
  return [
    check('Files', summary.files, `recorded ${recorded.files}`, summary.files >= recorded.files),
    ...targets.map(({ figure, name, most, slack }) => {
      const value = summary[figure]
      const before = recorded[figure]
      const held = most === undefined ? value >= before - slack : value <= before + slack
      return check(name, value, `recorded ${shown(before)}`, held)
    }),
  ]
}

function check(name: string, value: number, aim: string, passed: boolean): Check {
  return { says: `${name}: ${shown(value)} (${aim})`, passed }
}

function shown(value: number): string {
  return Number.isInteger(value) ? `${value}` : value.toFixed(4)
}
