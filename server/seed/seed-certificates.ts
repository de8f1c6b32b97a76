import type { Actor } from '../auth/actor'
import type { AppContext } from '../context'
import { issueCertificate } from '../use-cases/certificates/issue-certificate'
import { withdrawCertificate } from '../use-cases/certificates/withdraw-certificate'
import { decideDisposition } from '../use-cases/dispositions/decide-disposition'
import type { DemoClock } from './demo-clock'
import { demoSignIns } from './demo-people'

/** An agreed reading of the demo shop, by its piece. */
export interface AgreedReading {
  id: string
  pieceId: string
  serial: string
}

const from = { address: 'the demo shop itself', origin: '' }

/** Certificates that stand, one withdrawn, one replaced; and what is done with pieces that don't conform. */
export async function seedCertificates(
  context: AppContext,
  clock: DemoClock,
  { qa, reviewer }: { qa: Actor; reviewer: Actor },
  agreed: readonly AgreedReading[],
): Promise<void> {
  const password = passwordOf(qa)
  const readingOf = (serial: string) => requireReading(agreed, serial)
  const issue = (serial: string, received: string, replacesId: string | null = null) =>
    issueCertificate(context, qa, readingOf(serial).id, { password, received, replacesId }, from)

  clock.moveTo(1, '16:10')
  await issue('GB-35-2', 'sound, in its box')
  const ring = await issue('SR-40-101', 'sound')
  clock.pass(20)
  const disc = await issue('LD-60-21', '')
  clock.pass(30)
  await issue('LD-60-21', 'sound, wrapped', disc.id)
  clock.pass(12)
  await withdrawCertificate(
    context,
    qa,
    ring.id,
    { password, reason: 'The customer asks for a reading with the ring clamped as in the pump.' },
    from.address,
  )
  clock.pass(8)
  const saddle = readingOf('SR-40-102')
  decideDisposition(context, reviewer, saddle.pieceId, {
    readingId: saddle.id,
    kind: 'rework',
    reason: 'Back on the conditioned plate: the saddle shows that it was pressed unevenly.',
    onWordOf: '',
  })
}

function passwordOf(person: Actor): string {
  const signIn = demoSignIns.find(({ name }) => name === person.name)
  if (!signIn) throw new Error(`${person.name} is not of the demo shop.`)
  return signIn.password
}

function requireReading(agreed: readonly AgreedReading[], serial: string): AgreedReading {
  const found = agreed.findLast((reading) => reading.serial === serial)
  if (!found) throw new Error(`No reading of ${serial} was agreed to in the demo shop.`)
  return found
}
