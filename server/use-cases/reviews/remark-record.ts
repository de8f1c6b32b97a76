import type { Remark } from '@shared/schemas/reviews'
import { and, asc, count, eq, inArray, isNull } from 'drizzle-orm'
import { alias } from 'drizzle-orm/sqlite-core'
import type { Connection } from '../../db/client'
import { people } from '../../db/schema/people'
import { remarkAnswers, reviewRemarks } from '../../db/schema/reviews'
import { notFound } from '../../errors'

export type RemarkRecord = typeof reviewRemarks.$inferSelect

export function requireRemark(db: Connection, id: string): RemarkRecord {
  const record = db.select().from(reviewRemarks).where(eq(reviewRemarks.id, id)).get()
  if (!record) throw notFound('remark')
  return record
}

export function countOpenRemarks(db: Connection, readingId: string): number {
  const open = and(eq(reviewRemarks.readingId, readingId), isNull(reviewRemarks.closedAt))
  return db.select({ open: count() }).from(reviewRemarks).where(open).get()?.open ?? 0
}

/** Remarks on a reading with their answers, oldest first. */
export function selectRemarks(db: Connection, readingId: string): Remark[] {
  const closers = alias(people, 'closer')
  const rows = db
    .select({ remark: reviewRemarks, author: people.name, closer: closers.name })
    .from(reviewRemarks)
    .innerJoin(people, eq(people.id, reviewRemarks.authorId))
    .leftJoin(closers, eq(closers.id, reviewRemarks.closedById))
    .where(eq(reviewRemarks.readingId, readingId))
    .orderBy(asc(reviewRemarks.createdAt), asc(reviewRemarks.id))
    .all()
  const answers = selectAnswers(
    db,
    rows.map(({ remark }) => remark.id),
  )
  return rows.map(({ remark, author, closer }) => ({
    id: remark.id,
    author: { id: remark.authorId, name: author },
    text: remark.text,
    place: remark.place,
    createdAt: remark.createdAt,
    answers: answers.get(remark.id) ?? [],
    closed:
      remark.closedAt === null
        ? null
        : { by: { id: remark.closedById ?? '', name: closer ?? '' }, at: remark.closedAt },
  }))
}

function selectAnswers(db: Connection, remarkIds: string[]): Map<string, Remark['answers']> {
  const byRemark = new Map<string, Remark['answers']>()
  const rows = db
    .select({ answer: remarkAnswers, author: people.name })
    .from(remarkAnswers)
    .innerJoin(people, eq(people.id, remarkAnswers.authorId))
    .where(inArray(remarkAnswers.remarkId, remarkIds))
    .orderBy(asc(remarkAnswers.createdAt), asc(remarkAnswers.id))
    .all()
  for (const { answer, author } of rows) {
    const list = byRemark.get(answer.remarkId) ?? []
    const { id, authorId, text, createdAt } = answer
    list.push({ id, author: { id: authorId, name: author }, text, createdAt })
    byRemark.set(answer.remarkId, list)
  }
  return byRemark
}
