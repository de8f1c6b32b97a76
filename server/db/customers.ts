import type { Customer } from '@shared/schemas/parts'
import { eq } from 'drizzle-orm'
import { notFound } from '../errors'
import type { Connection } from './client'
import { customers } from './schema/parts'

export const customerColumns = {
  id: customers.id,
  name: customers.name,
  address: customers.address,
  email: customers.email,
}

export function requireCustomer(db: Connection, id: string): Customer {
  const row = db.select(customerColumns).from(customers).where(eq(customers.id, id)).get()
  if (!row) throw notFound('customer')
  return row
}
