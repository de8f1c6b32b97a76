import type { Certificate, WithdrawCertificate } from '@shared/schemas/certificates'
import type { Actor } from '../../auth/actor'
import { confirmPassword } from '../../auth/confirm-password'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { requireCertificate } from './certificate-refusals'
import { endCertificate } from './end-certificate'
import { selectCertificate } from './select-certificates'

/** The certificate stands no more, for a reason that stays with it. */
export async function withdrawCertificate(
  context: AppContext,
  actor: Actor,
  id: string,
  { password, reason }: WithdrawCertificate,
  address: string,
): Promise<Certificate> {
  await confirmPassword(context, actor, { password, address, field: 'password' })
  const { db, now } = context
  return inTransaction(db, (tx) => {
    const certificate = requireCertificate(tx, id)
    endCertificate(tx, actor, certificate, { state: 'withdrawn', reason, data: { reason }, at: now() })
    return selectCertificate(tx, id)
  })
}
