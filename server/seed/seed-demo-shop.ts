import type { Customer } from '@shared/schemas/parts'
import type { Actor } from '../auth/actor'
import type { AppContext } from '../context'
import { addCustomer } from '../use-cases/customers/add-customer'
import { addEquipment } from '../use-cases/equipment/add-equipment'
import { addFace } from '../use-cases/faces/add-face'
import { addLot } from '../use-cases/lots/add-lot'
import { addPart } from '../use-cases/parts/add-part'
import { addPerson } from '../use-cases/people/add-person'
import { addPiece } from '../use-cases/pieces/add-piece'
import { changeSettings } from '../use-cases/settings/change-settings'
import { createDemoClock } from './demo-clock'
import { demoEquipment } from './demo-equipment'
import { type DemoPart, demoCustomers, demoParts } from './demo-parts'
import { demoSignIns } from './demo-people'
import { seedCertificates } from './seed-certificates'
import { type DemoShop, seedReadings } from './seed-readings'

const openedDaysAgo = 21

/** The demo shop: people, customers, parts, pieces, equipment and readings, by way of the use-cases. */
export async function seedDemoShop(live: AppContext): Promise<void> {
  const clock = createDemoClock(live.now())
  const context: AppContext = { ...live, now: clock.now }
  clock.moveTo(openedDaysAgo, '07:30')
  changeSettings(context, null, {
    shopName: 'Quillmere Lapping Works',
    shopAddress: '4 Staithe Row, Quillmere QM3 7LP',
    shopEmail: 'flatness@quillmere.example',
    certificatePrefix: 'QL',
    procedure: 'LP 12, flatness by optical flat',
    publicAddress: 'https://lapwing.quillmere.example',
  })
  const people = await seedPeople(context)
  // The first of them enters the rest.
  const [actor] = people
  const equipment = demoEquipment.map((item) => addEquipment(context, actor, item))
  const customers = demoCustomers.map((customer) => addCustomer(context, actor, customer))
  const pieces = demoParts.flatMap((part) => seedPart(context, actor, customers, part))
  const agreed = await seedReadings(context, clock, { people, equipment, pieces })
  const qa = requirePerson(people, 'Ines Calloway')
  const reviewer = requirePerson(people, 'Tobias Fenwright')
  await seedCertificates(context, clock, { qa, reviewer }, agreed)
}

function requirePerson(people: readonly Actor[], name: string): Actor {
  const person = people.find((candidate) => candidate.name === name)
  if (!person) throw new Error(`The demo shop has no ${name}.`)
  return person
}

async function seedPeople(context: AppContext): Promise<Actor[]> {
  const added: Actor[] = []
  for (const person of demoSignIns) added.push(await addPerson(context, null, person))
  return added
}

function seedPart(
  context: AppContext,
  actor: Actor,
  customers: readonly Customer[],
  demo: DemoPart,
): DemoShop['pieces'] {
  const { face, lot, serials, customer: name, ...columns } = demo
  const customer = customers.find((candidate) => candidate.name === name)
  if (!customer) throw new Error(`The demo part ${demo.number} names no customer of the demo shop.`)
  const part = addPart(context, actor, { ...columns, customerId: customer.id })
  const { id: faceId } = addFace(context, actor, part.id, face)
  const { id: lotId } = addLot(context, actor, { partId: part.id, number: lot, order: '' })
  return serials.map((serial) => ({
    ...addPiece(context, actor, { partId: part.id, lotId, serial }),
    faceId,
  }))
}
