import type { Server } from 'node:http'
import { eq } from 'drizzle-orm'
import type { AppContext } from '../context'
import { selectPeople } from '../db/people'
import { events } from '../db/schema/events'
import { demoSignIns } from '../seed/demo-people'
import type { FirstAdministrator } from './set-up-new-shop'

/** Tells whoever started the program where it is and how to get in. */
export function writeWelcome(context: AppContext, server: Server, first: FirstAdministrator | null): void {
  const lines = [`Lapwing is at ${addressOf(context, server)}`, ...demoLines(context)]
  if (first) {
    lines.push(
      '',
      'A new shop. Sign in as its administrator, and change the password, which is shown only now:',
    )
    lines.push(`  ${first.email}   ${first.password}`)
  }
  process.stdout.write(`${lines.join('\n')}\n`)
}

function addressOf({ env }: AppContext, server: Server): string {
  const address = server.address()
  const port = typeof address === 'object' && address ? address.port : env.port
  const anywhere = env.host === undefined || env.host === '0.0.0.0' || env.host === '::'
  const host = anywhere ? 'localhost' : env.host?.includes(':') ? `[${env.host}]` : env.host
  return `${env.tls === 'direct' ? 'https' : 'http'}://${host}:${port}`
}

/** The demo shop's sign-ins that still hold. */
function demoLines({ db }: AppContext): string[] {
  const seeded = db.select({ seq: events.seq }).from(events).where(eq(events.kind, 'demo.seeded')).get()
  if (!seeded) return []
  const changed = db
    .select({ id: events.subjectId })
    .from(events)
    .where(eq(events.kind, 'person.passwordChanged'))
    .all()
  const unchanged = selectPeople(db)
    .filter((person) => person.active && !changed.some(({ id }) => id === person.id))
    .map((person) => person.email)
  const valid = demoSignIns.filter(({ email }) => unchanged.includes(email))
  if (valid.length === 0) return []
  const widest = (pick: (person: (typeof valid)[number]) => string) =>
    Math.max(...valid.map((person) => pick(person).length))
  const nameWidth = widest(({ name }) => name)
  const emailWidth = widest(({ email }) => email)
  const passwordWidth = widest(({ password }) => password)
  return [
    '',
    'Demo shop. Sign in as one of these (name, e-mail, password, roles):',
    ...valid.map(
      ({ name, email, password, roles }) =>
        `  ${name.padEnd(nameWidth)}  ${email.padEnd(emailWidth)}  ${password.padEnd(passwordWidth)}  ${roles.join(', ')}`,
    ),
  ]
}
