import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { Tx } from '../../db/client'
import { recordEvent } from '../../db/events'
import { certificates } from '../../db/schema/certificates'
import { AppError } from '../../errors'
import type { CertificateRecord } from './certificate-refusals'

interface End {
  state: 'withdrawn' | 'replaced'
  reason?: string
  data: Record<string, unknown>
  at: Date
}

/** The certificate stands no more; what it said stays. */
export function endCertificate(
  tx: Tx,
  actor: Actor,
  certificate: CertificateRecord,
  { state, reason, data, at }: End,
): void {
  if (certificate.state !== 'issued') throw new AppError('certificateEnded')
  tx.update(certificates)
    .set({ state, endedById: actor.id, endedAt: at.toISOString(), withdrawalReason: reason ?? null })
    .where(eq(certificates.id, certificate.id))
    .run()
  recordEvent(tx, {
    kind: state === 'withdrawn' ? 'certificate.withdrawn' : 'certificate.replaced',
    subject: { type: 'certificate', id: certificate.id },
    actor,
    data: { number: certificate.number, ...data },
    at,
  })
}
