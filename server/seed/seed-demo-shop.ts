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
import { demoEquipment } from './demo-equipment'
import { type DemoPart, demoCustomers, demoParts } from './demo-parts'
import { demoSignIns } from './demo-people'

/** The demo shop: people, customers, parts, pieces and equipment, all by way of the use-cases. */
export async function seedDemoShop(context: AppContext): Promise<void> {
  changeSettings(context, null, { shopName: 'Quillmere Lapping Works' })
  const actor = await seedPeople(context)
  for (const item of demoEquipment) addEquipment(context, actor, item)
  const customers = demoCustomers.map((customer) => addCustomer(context, actor, customer))
  for (const part of demoParts) seedPart(context, actor, customers, part)
}

/** Gives the first of them, who enters the rest. */
async function seedPeople(context: AppContext): Promise<Actor> {
  const added = []
  for (const person of demoSignIns) added.push(await addPerson(context, null, person))
  return added[0]
}

function seedPart(context: AppContext, actor: Actor, customers: readonly Customer[], demo: DemoPart): void {
  const { face, lot, serials, customer: name, ...columns } = demo
  const customer = customers.find((candidate) => candidate.name === name)
  if (!customer) throw new Error(`The demo part ${demo.number} names no customer of the demo shop.`)
  const part = addPart(context, actor, { ...columns, customerId: customer.id })
  addFace(context, actor, part.id, face)
  const { id: lotId } = addLot(context, actor, { partId: part.id, number: lot, order: '' })
  for (const serial of serials) addPiece(context, actor, { partId: part.id, lotId, serial })
}
