import { may } from '@shared/access/permissions'
import type { EquipmentDue, Home } from '@shared/schemas/home'
import type { ReadingRow } from '@shared/schemas/readings'
import { and, desc, eq, gt, inArray, lte, ne, or, type SQL, sql } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { selectEquipment } from '../../db/equipment'
import { oldestFirst, selectReadingRows } from '../../db/reading-rows'
import { equipment } from '../../db/schema/equipment'
import { readings } from '../../db/schema/readings'
import { results } from '../../db/schema/results'

const rowsEach = 20
const dayMs = 24 * 3_600_000
const recentMs = 60 * dayMs
const dueWithinMs = 8 * 7 * dayMs

/** What waits for the person, their drafts, what lately came out of tolerance, and what falls due. */
export function showHome(context: AppContext, actor: Actor): Home {
  return {
    waiting: selectWaiting(context, actor),
    drafts: selectDrafts(context, actor),
    outOfTolerance: selectOutOfTolerance(context),
    due: selectDue(context),
  }
}

function selectWaiting({ db }: AppContext, actor: Actor): ReadingRow[] {
  const toReview = and(eq(readings.state, 'sentForReview'), ne(readings.takenById, actor.id))
  const backToMe = and(eq(readings.state, 'sentBack'), eq(readings.takenById, actor.id))
  const mine: (SQL | undefined)[] = []
  if (may(actor.roles, 'reading:review')) mine.push(toReview)
  if (may(actor.roles, 'reading:edit-own')) mine.push(backToMe)
  if (may(actor.roles, 'certificate:issue')) mine.push(toCertify(actor))
  if (mine.length === 0) return []
  return selectReadingRows(db, { where: or(...mine), orderBy: oldestFirst, limit: rowsEach })
}

/** Agreed, conforming, the latest of its face, and neither taken nor agreed to by the one who would certify it. */
function toCertify(actor: Actor): SQL | undefined {
  const isLatest = sql`NOT EXISTS (
    SELECT 1 FROM readings AS later
    WHERE later.piece_id = ${readings.pieceId} AND later.face_id = ${readings.faceId}
    AND later.number > ${readings.number} AND later.state <> 'setAside'
  )`
  return and(
    eq(readings.state, 'agreed'),
    inArray(readings.verdict, ['conforms', 'noTolerance']),
    ne(readings.takenById, actor.id),
    ne(readings.agreedById, actor.id),
    isLatest,
  )
}

function selectDrafts({ db }: AppContext, actor: Actor): ReadingRow[] {
  return selectReadingRows(db, {
    where: and(eq(readings.state, 'draft'), eq(readings.takenById, actor.id)),
    orderBy: [desc(readings.updatedAt), desc(readings.id)],
    limit: rowsEach,
  })
}

// What the lap has been at since is no news: the reading after it tells.
const notLappedSince = sql`NOT EXISTS (
  SELECT 1 FROM readings AS later
  WHERE later.piece_id = ${readings.pieceId} AND later.face_id = ${readings.faceId}
  AND later.number > ${readings.number} AND later.lapped_since AND later.state <> 'setAside'
)`

/** A draft has no verdict yet, and a reading that was sent back has lost its own. */
function selectOutOfTolerance({ db, now }: AppContext): ReadingRow[] {
  const since = new Date(now().getTime() - recentMs).toISOString()
  const lately = db
    .select({ id: results.readingId })
    .from(results)
    .where(and(eq(results.verdict, 'doesNotConform'), gt(results.computedAt, since)))
  return selectReadingRows(db, {
    where: and(
      inArray(readings.id, lately),
      // Of its latest result: an older one may have been mended since.
      eq(results.verdict, 'doesNotConform'),
      inArray(readings.state, ['sentForReview', 'agreed', 'certified']),
      notLappedSince,
    ),
    limit: rowsEach,
  })
}

function selectDue({ db, now }: AppContext): EquipmentDue[] {
  const today = dayOf(now())
  const lastDay = dayOf(new Date(now().getTime() + dueWithinMs))
  const inService = and(eq(equipment.inService, true), lte(equipment.dueOn, lastDay))
  return selectEquipment(db, inService, [sql`${equipment.dueOn}`, sql`lower(${equipment.name})`]).map(
    (item) => {
      const dueOn = item.calibration?.dueOn ?? lastDay
      return { equipment: item, dueOn, daysLeft: Math.round((Date.parse(dueOn) - Date.parse(today)) / dayMs) }
    },
  )
}

function dayOf(at: Date): string {
  return at.toISOString().slice(0, 10)
}
