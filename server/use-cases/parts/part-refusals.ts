import type { NewPart } from '@shared/schemas/parts'
import { eq } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { customers } from '../../db/schema/parts'
import { type AppError, alreadyThere, invalidField } from '../../errors'

export function partTaken({ number, revision }: Pick<NewPart, 'number' | 'revision'>): AppError {
  const key = revision === '' ? 'part.number.taken' : 'part.number.takenWithRevision'
  return alreadyThere('number', { key, params: { number, revision } })
}

export function assertCustomer(db: Connection, customerId: string): void {
  const known = db.select({ id: customers.id }).from(customers).where(eq(customers.id, customerId)).get()
  if (!known) throw invalidField('customerId', { key: 'part.customer.unknown' })
}
