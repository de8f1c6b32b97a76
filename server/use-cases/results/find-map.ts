import type { Figure } from '@shared/schemas/results'
import type { AppContext } from '../../context'
import { AppError } from '../../errors'
import { requireReading } from '../readings/reading-record'
import { requireResult } from './select-result'

/** The height map of a reading's latest result, under the result's id. */
export function findMap({ db }: AppContext, readingId: string): { resultId: string; map: Figure['map'] } {
  const { latestResultId } = requireReading(db, readingId)
  const result = latestResultId === null ? null : requireResult(db, latestResultId)
  if (!result?.figure) throw new AppError('notFound', { say: { key: 'notFoundThing.map' } })
  return { resultId: result.id, map: result.figure.map }
}
