import { decide, ENGINE_VERSION } from '@shared/metrology'
import type { Face } from '@shared/schemas/parts'
import type { Figure, ReadingResult, Verdict } from '@shared/schemas/results'
import { eq } from 'drizzle-orm'
import type { ComputedOutcome } from '../../analysis/analysis'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction, type Tx } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { readings } from '../../db/schema/readings'
import { type ResultInputs, results } from '../../db/schema/results'
import { readSettings } from '../../db/settings'
import { requireEditableReading } from '../readings/reading-record'
import { gatherInputs } from './result-inputs'
import { type ResultRecord, selectResult } from './select-result'

/** Computes the figure of the saved marks and keeps it beside the earlier ones; a refusal is kept as well. */
export async function computeResult(
  context: AppContext,
  actor: Actor,
  readingId: string,
): Promise<ReadingResult> {
  const { db, analysis, now } = context
  const record = requireEditableReading(db, actor, readingId)
  const { face, inputs } = gatherInputs(db, record)
  const outcome = await analysis.readTraces(inputs.traced)

  return inTransaction(db, (tx) => {
    // It may have been sent, or changed, while the threads were at it.
    const { marksVersion } = requireEditableReading(tx, actor, readingId)
    const at = now()
    const id = newId()
    const row: ResultRecord = {
      ...resultColumns(tx, face, outcome),
      id,
      readingId,
      marksVersion: record.marksVersion,
      engineVersion: ENGINE_VERSION,
      computedAt: at.toISOString(),
      computedById: actor.id,
      face,
      inputs,
    }
    store(tx, row, marksVersion)
    recordComputed(tx, actor, row, inputs, at)
    return selectResult(tx, id)
  })
}

type OutcomeColumns = Omit<
  ResultRecord,
  'id' | 'readingId' | 'marksVersion' | 'engineVersion' | 'computedAt' | 'computedById' | 'face' | 'inputs'
>

function resultColumns(tx: Tx, face: Face, outcome: ComputedOutcome): OutcomeColumns {
  if (outcome.kind === 'refused') return { ...nothingRead, findings: outcome.findings }
  const { figure } = outcome
  return {
    mode: figure.mode,
    outcome: 'figure',
    flatnessUm: flatnessOf(figure, face),
    minimumZoneUm: figure.flatness.minimumZoneUm,
    leastSquaresUm: figure.flatness.leastSquaresUm,
    expandedUncertaintyUm: figure.expandedUncertaintyUm,
    sagittaUm: figure.terms.sagittaUm,
    bandUm: figure.bandUm,
    form: figure.form,
    verdict: verdictOf(tx, figure, face),
    supportedShare: figure.supportedShare,
    findings: figure.findings,
    figure,
  }
}

const nothingRead = {
  mode: 'traced',
  outcome: 'refused',
  flatnessUm: null,
  minimumZoneUm: null,
  leastSquaresUm: null,
  expandedUncertaintyUm: null,
  sagittaUm: null,
  bandUm: null,
  form: null,
  verdict: 'noVerdict',
  supportedShare: null,
  figure: null,
} as const

/** Flatness by the reference that the drawing asks for. */
function flatnessOf({ flatness }: Figure, face: Face): number {
  return face.reference === 'minimumZone' ? flatness.minimumZoneUm : flatness.leastSquaresUm
}

function verdictOf(tx: Tx, figure: Figure, face: Face): Verdict {
  return decide({
    tolerance: face.tolerance,
    rule: face.rule,
    flatnessUm: flatnessOf(figure, face),
    expandedUncertaintyUm: figure.expandedUncertaintyUm,
    sagittaUm: figure.terms.sagittaUm,
    sagittaUUm: figure.terms.sagittaUUm,
    supportedShare: figure.supportedShare,
    leastSupportedShare: readSettings(tx).leastSupportedShare,
  }).verdict
}

/** What was computed from newer marks stays the latest, whichever is done first. */
function store(tx: Tx, row: ResultRecord, marksVersion: number): void {
  tx.insert(results).values(row).run()
  if (row.marksVersion < marksVersion && hasNewer(tx, row)) return
  tx.update(readings)
    .set({ latestResultId: row.id, verdict: row.verdict, updatedAt: row.computedAt })
    .where(eq(readings.id, row.readingId))
    .run()
}

function hasNewer(tx: Tx, row: ResultRecord): boolean {
  const latest = tx
    .select({ marksVersion: results.marksVersion })
    .from(readings)
    .innerJoin(results, eq(results.id, readings.latestResultId))
    .where(eq(readings.id, row.readingId))
    .get()
  return latest !== undefined && latest.marksVersion > row.marksVersion
}

/** The trail has the figure and what it was computed from, set-up and marks alike. */
function recordComputed(tx: Tx, actor: Actor, row: ResultRecord, inputs: ResultInputs, at: Date): void {
  const { outcome, marksVersion, engineVersion, flatnessUm, expandedUncertaintyUm, verdict } = row
  recordEvent(tx, {
    kind: 'reading.computed',
    subject: { type: 'reading', id: row.readingId },
    actor,
    data: {
      resultId: row.id,
      outcome,
      marksVersion,
      engineVersion,
      flatnessUm,
      expandedUncertaintyUm,
      verdict,
      traces: inputs.traced.traces.length,
    },
    at,
  })
}
