import { eq, max } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { certificates } from '../../db/schema/certificates'

export interface CertificateNumber {
  year: number
  count: number
  /** As it is printed: prefix, year, count of four digits and more. */
  number: string
}

/** The number after the last of the year. Only its insert, in the same transaction, makes it taken. */
export function nextNumber(db: Connection, prefix: string, at: Date): CertificateNumber {
  const year = at.getUTCFullYear()
  const last = db
    .select({ count: max(certificates.count) })
    .from(certificates)
    .where(eq(certificates.year, year))
    .get()
  const count = (last?.count ?? 0) + 1
  return { year, count, number: `${prefix}-${year}-${String(count).padStart(4, '0')}` }
}
