import { type Role, roleSchema } from '@shared/access/permissions'
import { type ReadingState, readingStateSchema } from '@shared/workflow/reading-states'
import { describe, expect, it } from 'vitest'
import { verifyChain } from '../../server/db/events'
import { agreeMeasured, type CertificateBench, issue, sendMeasured, startWithQa } from './certified'
import { bowedMarks, takeMeasuredReading } from './readings-support'
import { type SignedIn, testPassword } from './support'

/**
 * Who may do what to a reading in which state, written down apart from the code. `taker` took it, `reviewer` agreed
 * to it or would; everybody else is a stranger with one role. What isn't listed is refused: 403 for who may never,
 * 409 for a state in which nobody may.
 */
const moves = {
  change: { by: ['taker'], in: ['draft', 'sentBack'] },
  mark: { by: ['taker'], in: ['draft', 'sentBack'] },
  compute: { by: ['taker'], in: ['draft', 'sentBack'] },
  send: { by: ['taker'], in: ['draft'] },
  reopen: { by: ['taker'], in: ['sentBack'] },
  remark: { by: ['reviewer'], in: ['sentForReview'] },
  agree: { by: ['reviewer'], in: ['sentForReview'] },
  sendBack: { by: ['reviewer'], in: ['sentForReview'] },
  certify: { by: ['qa'], in: ['agreed'] },
} as const satisfies Record<string, { by: readonly Who[]; in: readonly ReadingState[] }>

type Move = keyof typeof moves
type Who = 'taker' | Role | 'nobody'
const everybody: Who[] = ['taker', ...roleSchema.options, 'nobody']

interface InState {
  bench: CertificateBench
  id: string
  marksVersion: number
}

/** A reading brought into a state by the people who do it. */
async function bringInto(state: ReadingState): Promise<InState> {
  const bench = await startWithQa()
  const id = await idOf(bench, state)
  const { body } = await bench.inspector.agent.get(`/api/readings/${id}`).expect(200)
  expect(body.state).toBe(state)
  return { bench, id, marksVersion: body.marksVersion }
}

async function idOf(bench: CertificateBench, state: ReadingState): Promise<string> {
  switch (state) {
    case 'draft':
      return (await takeMeasuredReading(bench, 1)).id
    case 'sentForReview':
      return (await sendMeasured(bench)).id
    case 'sentBack': {
      const { id } = await sendMeasured(bench)
      await bench.reviewer.agent.post(`/api/readings/${id}/send-back`).send({ reason: 'dust' }).expect(200)
      return id
    }
    case 'agreed':
      return (await agreeMeasured(bench)).id
    case 'certified': {
      const { id } = await agreeMeasured(bench)
      await issue(bench.qa, id)
      return id
    }
    case 'setAside': {
      const { id } = await sendMeasured(bench)
      await bench.reviewer.agent.post(`/api/readings/${id}/set-aside`).send({ cause: 'wet' }).expect(200)
      return id
    }
  }
}

/** Somebody who has nothing to do with the reading but their role; the reviewer and QA of the shop are such. */
async function actorOf(bench: CertificateBench, who: Who): Promise<SignedIn['agent']> {
  switch (who) {
    case 'taker':
      return bench.inspector.agent
    case 'nobody':
      return bench.agent()
    default:
      return (await bench.signInAs(who)).agent
  }
}

function attempt(agent: SignedIn['agent'], move: Move, { id, marksVersion }: InState) {
  const path = `/api/readings/${id}`
  switch (move) {
    case 'change':
      return agent.patch(path).send({})
    case 'mark':
      return agent.put(`${path}/marks`).send({ basedOnVersion: marksVersion, marks: bowedMarks(1) })
    case 'compute':
      return agent.post(`${path}/compute`)
    case 'send':
      return agent.post(`${path}/send`)
    case 'reopen':
      return agent.post(`${path}/reopen`)
    case 'remark':
      return agent.post(`${path}/remarks`).send({ text: 'Look here.' })
    case 'agree':
      return agent.post(`${path}/agree`)
    case 'sendBack':
      return agent.post(`${path}/send-back`).send({ reason: 'dust' })
    case 'certify':
      return agent.post(`${path}/certificate`).send({ password: testPassword })
  }
}

function expected(move: Move, who: Who, state: ReadingState): 'done' | 401 | 403 | 409 {
  if (who === 'nobody') return 401
  const { by, in: states } = moves[move]
  if (!(by as readonly Who[]).includes(who)) return 403
  return (states as readonly ReadingState[]).includes(state) ? 'done' : 409
}

describe.each(readingStateSchema.options)('a reading that is %s', (state) => {
  it.each(Object.keys(moves) as Move[])(
    'lets those do “%s” who may, and nobody else',
    { timeout: 240_000 },
    async (move) => {
      const mayDo = (who: Who) => expected(move, who, state) === 'done'
      // Whoever may comes last, since the state is another one afterwards.
      const inOrder = [...everybody.filter((who) => !mayDo(who)), ...everybody.filter(mayDo)]
      const reading = await bringInto(state)
      for (const who of inOrder) {
        const { status, body } = await attempt(await actorOf(reading.bench, who), move, reading)
        const want = expected(move, who, state)
        const label = `${who}, ${move}, ${state}: ${status} ${body.error?.code ?? ''}`
        if (want === 'done') expect(status, label).toBeLessThan(300)
        else expect(status, label).toBe(want)
        if (want === 409) expect(body.error.message, label).toMatch(/\w+\./)
      }
      expect(verifyChain(reading.bench.context.db)).toMatchObject({ intact: true })
    },
  )
})
