import { may } from '@shared/access/permissions'
import type { Reading } from '@shared/schemas/readings'
import { isEditable } from '@shared/workflow/reading-states'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import type { Connection } from '../../db/client'
import { requirePiece } from '../../db/pieces'
import { selectReadingRows } from '../../db/reading-rows'
import { readings } from '../../db/schema/readings'
import { notFound } from '../../errors'
import { selectPhotos } from '../photos/select-photos'
import { selectCurrentFigure } from '../results/current-figure'
import { selectResult } from '../results/select-result'
import { requireReading } from './reading-record'

export function showReading({ db }: AppContext, actor: Actor, id: string): Reading {
  return readReading(db, actor, id)
}

/** A reading whole, and what the actor may do with it. */
export function readReading(db: Connection, actor: Actor, id: string): Reading {
  const [row] = selectReadingRows(db, { where: eq(readings.id, id), limit: 1 })
  if (!row) throw notFound('reading')
  const record = requireReading(db, id)
  const own = record.takenById === actor.id
  return {
    ...row,
    piece: requirePiece(db, record.pieceId),
    setUp: record.setUp,
    conditions: record.conditions,
    marks: record.marks,
    photos: selectPhotos(db, id),
    fullResult: record.latestResultId === null ? null : selectResult(db, record.latestResultId),
    correctsId: record.correctsId,
    mayEdit: own && isEditable(record.state) && may(actor.roles, 'reading:edit-own'),
    maySend: own && record.state === 'draft' && may(actor.roles, 'reading:send-own'),
    setAsideCause: record.setAsideCause,
    figureIsStale:
      row.result?.outcome === 'figure' && isEditable(record.state) && !selectCurrentFigure(db, record),
  }
}
