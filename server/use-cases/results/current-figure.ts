import { ENGINE_VERSION } from '@shared/metrology'
import type { Face } from '@shared/schemas/parts'
import type { Connection } from '../../db/client'
import { canonicalJson } from '../../db/events'
import { AppError } from '../../errors'
import type { ReadingRecord } from '../readings/reading-record'
import { gatherInputs } from './result-inputs'
import { type ResultRecord, requireResult } from './select-result'

/**
 * The reading's latest figure, if computing it again would give the same: not the marks alone count, but also the
 * set-up, the equipment and the face's sizes and tolerance, which others may have changed meanwhile.
 */
export function selectCurrentFigure(db: Connection, record: ReadingRecord): ResultRecord | null {
  if (record.latestResultId === null) return null
  const result = requireResult(db, record.latestResultId)
  if (result.outcome !== 'figure' || result.engineVersion !== ENGINE_VERSION) return null
  const now = gatherOrNull(db, record)
  if (!now) return null
  const then = { face: result.face, inputs: result.inputs }
  return canonicalJson(whatCounts(now)) === canonicalJson(whatCounts(then)) ? result : null
}

/** The face's template is laid on photographs to come; no figure comes from it. */
function whatCounts<Given extends { face: Face }>({ face, ...rest }: Given) {
  const { template: _template, ...counted } = face
  return { ...rest, face: counted }
}

function gatherOrNull(db: Connection, record: ReadingRecord) {
  try {
    return gatherInputs(db, record)
  } catch (error) {
    if (error instanceof AppError) return null
    throw error
  }
}
