import type { Customer } from '@shared/schemas/parts'
import { sql } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { customerColumns } from '../../db/customers'
import { customers } from '../../db/schema/parts'

export function listCustomers({ db }: AppContext): Customer[] {
  return db.select(customerColumns).from(customers).orderBy(sql`lower(${customers.name})`).all()
}
