import {
  figureForStorage,
  type MarkedPhoto,
  readTraces,
  storedFinding,
  toReadingInput,
} from '@shared/metrology'
import type { Marks } from '@shared/schemas/marks'
import type { Figure } from '@shared/schemas/results'
import { findProblems, type Problem } from '../problems'

type Finding = Figure['findings'][number]

/** Everything of a reading but the marks; null without a light source. */
export type Circumstances = Omit<MarkedPhoto, 'marks'> | null

/** What the marks come to: mistakes that show in them, and a figure or what is missing for one. */
export interface MarksRead {
  problems: readonly Problem[]
  figure: Figure | null
  findings: readonly Finding[]
}

/** Mistakes that the table finds by itself, with their places; the engine's own word for them would be the second. */
const saidByProblems: Readonly<Record<string, readonly Problem['code'][]>> = {
  bandsCross: ['bandsCross'],
  orderMissing: ['noNumber'],
  pointsOutsideFace: ['outsideFace', 'insideLeaveOut'],
}

export function readMarks(marks: Marks, circumstances: Circumstances): MarksRead {
  const problems = findProblems(marks)
  if (!circumstances) return { problems, figure: null, findings: [] }
  const input = toReadingInput({ ...circumstances, marks })
  if (!input) return { problems, figure: null, findings: [missingOutline] }
  const outcome = readTraces(input)
  if (outcome.kind === 'refused')
    return { problems, figure: null, findings: unsaid(outcome.findings.map(storedFinding), problems) }
  const figure = figureForStorage(outcome.result)
  return { problems, figure, findings: unsaid(figure.findings, problems) }
}

const missingOutline: Finding = {
  code: 'noOutline',
  severity: 'refusal',
  params: {},
  place: null,
  traceIds: [],
}

/** A refusal always stays: it is why there is no figure. */
function unsaid(findings: readonly Finding[], problems: readonly Problem[]): Finding[] {
  const said = new Set(problems.map(({ code }) => code))
  return findings.filter(
    ({ code, severity }) => severity === 'refusal' || !saidByProblems[code]?.some((c) => said.has(c)),
  )
}
