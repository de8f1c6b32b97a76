import { describe, expect, it } from 'vitest'
import { addPerson } from '../../server/use-cases/people/add-person'
import { startTestApp, testPassword } from './support'

const minute = 60_000
const email = 'edda@quillmere.example'

async function startWithEdda() {
  // Behind a proxy the test can say from where each request comes.
  const test = startTestApp({ LAPWING_TLS: 'proxy' })
  const person = await addPerson(test.context, null, {
    name: 'Edda Thorne',
    email,
    password: testPassword,
    roles: ['inspector'],
  })
  const signIn = (from: string, password: string, account = email) =>
    test
      .agent()
      .post('/api/session')
      .set({ 'X-Forwarded-For': from, 'X-Forwarded-Proto': 'https' })
      .send({ email: account, password })
  const fail = async (times: number, from: (nth: number) => string, account?: (nth: number) => string) => {
    for (let nth = 0; nth < times; nth++) await signIn(from(nth), 'a wrong guess', account?.(nth))
  }
  return { ...test, person, signIn, fail }
}

describe('signing in that fails too often', () => {
  it('has to wait after five times from one address, and says how long', async () => {
    const { signIn, fail, advance } = await startWithEdda()
    await fail(5, () => '203.0.113.5')
    const refused = await signIn('203.0.113.5', testPassword)
    expect(refused.status).toBe(429)
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(14 * 60)
    expect(refused.body.error.message).toContain('Try again in 15 min')
    advance(15 * minute)
    expect((await signIn('203.0.113.5', testPassword)).status).toBe(200)
  })

  it('starts counting anew with a success', async () => {
    const { signIn, fail } = await startWithEdda()
    await fail(4, () => '203.0.113.5')
    expect((await signIn('203.0.113.5', testPassword)).status).toBe(200)
    await fail(4, () => '203.0.113.5')
    expect((await signIn('203.0.113.5', testPassword)).status).toBe(200)
  })

  it('counts guesses that are sent side by side', async () => {
    const { signIn } = await startWithEdda()
    const answers = await Promise.all(
      Array.from({ length: 12 }, () => signIn('203.0.113.5', 'a wrong guess')),
    )
    expect(answers.filter(({ status }) => status === 401)).toHaveLength(5)
    expect(answers.filter(({ status }) => status === 429)).toHaveLength(7)
  })

  it('stops many addresses that guess at one account, but not the person at an address they know', async () => {
    const { signIn, fail } = await startWithEdda()
    expect((await signIn('198.51.100.7', testPassword)).status).toBe(200)
    await fail(20, (nth) => `203.0.113.${nth}`)
    expect((await signIn('203.0.113.99', testPassword)).status).toBe(429)
    expect((await signIn('198.51.100.7', testPassword)).status).toBe(200)
  })

  it('stops one address that guesses at many accounts, but not the people who work behind it', async () => {
    const { signIn, fail } = await startWithEdda()
    expect((await signIn('198.51.100.7', testPassword)).status).toBe(200)
    await fail(
      50,
      () => '198.51.100.7',
      (nth) => `person${nth}@quillmere.example`,
    )
    expect((await signIn('198.51.100.7', testPassword, 'new@quillmere.example')).status).toBe(429)
    expect((await signIn('198.51.100.7', testPassword)).status).toBe(200)
  })

  it('takes a network of IPv6 for one address', async () => {
    const { signIn, fail } = await startWithEdda()
    await fail(5, (nth) => `2001:db8:1:2::${nth}`)
    expect((await signIn('2001:db8:1:2:ffff::1', testPassword)).status).toBe(429)
    expect((await signIn('2001:db8:1:3::1', testPassword)).status).toBe(200)
  })

  it('is forgotten when the administrator gives a new password', async () => {
    const { signIn, fail, signInAs, person } = await startWithEdda()
    const { agent: admin } = await signInAs('admin')
    await fail(5, () => '203.0.113.5')
    const password = 'lay it down, do not slide'
    await admin.patch(`/api/people/${person.id}`).send({ password }).expect(200)
    expect((await signIn('203.0.113.5', password)).status).toBe(200)
  })
})
