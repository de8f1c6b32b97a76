import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { rmSync } from 'node:fs'
import type { Certificate } from '@shared/schemas/certificates'
import { eq } from 'drizzle-orm'
import { describe, expect, it } from 'vitest'
import { verifyChain } from '../../server/db/events'
import { newId } from '../../server/db/ids'
import { certificatePdfs, certificates } from '../../server/db/schema/certificates'
import { pieces } from '../../server/db/schema/parts'
import { readingPhotos, readings } from '../../server/db/schema/readings'
import { agreeMeasured, type CertificateBench, issue, sendMeasured, startWithQa } from './certified'
import { testPassword } from './support'

const year = 2026

describe('a certificate', () => {
  it('is issued of an agreed reading under the next number, with its page and the reading’s state', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench)
    const certificate = await issue(bench.qa, reading.id, { received: 'sound' })
    expect(certificate).toMatchObject({
      number: `FC-${year}-0001`,
      state: 'issued',
      serial: reading.serial,
      verdict: 'conforms',
      flatnessUm: reading.result?.flatnessUm,
      issuedBy: { name: bench.qa.me.name },
      replaces: null,
      replacedBy: null,
    })
    const shown = await bench.qa.agent.get(`/api/readings/${reading.id}`).expect(200)
    expect(shown.body.state).toBe('certified')
    const pdf = await bench.qa.agent.get(`/api/certificates/${certificate.id}/pdf`).expect(200)
    expect(pdf.headers['content-type']).toBe('application/pdf')
    expect(createHash('sha256').update(pdf.body).digest('hex')).toBe(certificate.pdfSha256)
    expect(pdf.body.subarray(0, 5).toString()).toBe('%PDF-')
    const page = await bench.qa.agent.get(`/api/certificates/${certificate.id}/page`).expect(200)
    const texts = page.body.items.map((item: { text?: string }) => item.text ?? '').join(' ')
    for (const said of [
      certificate.number,
      reading.serial,
      bench.qa.me.name,
      bench.reviewer.me.name,
      'sound',
    ]) {
      expect(texts).toContain(said)
    }
  })

  it('needs the QA person’s password again, and counts wrong ones like sign-ins', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench)
    const path = `/api/readings/${reading.id}/certificate`
    const wrong = await bench.qa.agent.post(path).send({ password: 'not the one' })
    expect([wrong.status, wrong.body.error.fields.password]).toEqual([400, expect.stringMatching(/password/)])
    for (let i = 0; i < 4; i++) await bench.qa.agent.post(path).send({ password: 'nor that' })
    const shut = await bench.qa.agent.post(path).send({ password: testPassword })
    expect([shut.status, shut.body.error.code]).toEqual([429, 'tooManyAttempts'])
    expect(bench.context.db.select().from(certificates).all()).toEqual([])
  })

  it('is of an agreed reading only', async () => {
    const bench = await startWithQa()
    const sent = await sendMeasured(bench)
    const answer = await bench.qa.agent
      .post(`/api/readings/${sent.id}/certificate`)
      .send({ password: testPassword })
    expect([answer.status, answer.body.error.code]).toEqual([409, 'notAgreed'])
  })

  it('is issued by neither who took the reading nor who agreed to it, save in a one-person shop', async () => {
    const bench = await startWithQa()
    const all = await bench.signInAs('inspector', 'reviewer', 'qa')
    const taken = await sendMeasured(bench, 1, all)
    await bench.reviewer.agent.post(`/api/readings/${taken.id}/agree`).expect(200)
    const other = await sendMeasured(bench)
    await all.agent.post(`/api/readings/${other.id}/agree`).expect(200)
    const tries = [taken, other].map(({ id }) =>
      all.agent.post(`/api/readings/${id}/certificate`).send({ password: testPassword }),
    )
    const refused = await Promise.all(tries)
    expect(refused.map(({ status, body }) => [status, body.error.code])).toEqual([
      [409, 'ownReading'],
      [409, 'agreedAlone'],
    ])

    const administrator = await bench.signInAs('admin')
    await administrator.agent.patch('/api/settings').send({ onePersonShop: true }).expect(200)
    const { id } = await issue(all, taken.id)
    const page = await all.agent.get(`/api/certificates/${id}/page`).expect(200)
    const said = page.body.items.map((item: { text?: string }) => item.text ?? '').join(' ')
    expect(said).toMatch(/fewer than three people/)
  })

  it('waits while another reading of the face that counts says otherwise', async () => {
    const bench = await startWithQa()
    const bad = await agreeMeasured(bench, 3)
    const good = await agreeMeasured(bench, 1)
    const refused = await bench.qa.agent
      .post(`/api/readings/${good.id}/certificate`)
      .send({ password: testPassword })
    expect([refused.status, refused.body.error.code]).toEqual([409, 'readingsDisagree'])
    await bench.reviewer.agent.post(`/api/readings/${bad.id}/set-aside`).send({ cause: 'Wet.' }).expect(200)
    await issue(bench.qa, good.id)
  })

  it('is of the readings since the last turn on the lap', async () => {
    const bench = await startWithQa()
    const before = await agreeMeasured(bench, 3)
    const after = await agreeMeasured(bench, 1, { lappedSince: true })
    await issue(bench.qa, after.id)
    const late = await bench.qa.agent
      .post(`/api/readings/${before.id}/certificate`)
      .send({ password: testPassword })
    expect([late.status, late.body.error.code]).toEqual([409, 'countsNoMore'])
  })

  it('prints the same page, byte for byte, whenever it is printed', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench)
    const { id, pdfSha256 } = await issue(bench.qa, reading.id)
    const { printCertificate } = await import('../../server/use-cases/certificates/print-certificate')
    const stored = bench.context.db.select().from(certificates).where(eq(certificates.id, id)).get()
    if (!stored) throw new Error('no certificate')
    const again = await printCertificate(bench.context, stored.snapshot)
    expect(createHash('sha256').update(again).digest('hex')).toBe(pdfSha256)
  })
})

describe('what was issued', () => {
  it('can’t be changed or removed in the database, nor can the reading under it', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench)
    const { id } = await issue(bench.qa, reading.id)
    const { db } = bench.context
    expect(() => db.update(certificates).set({ number: 'X' }).where(eq(certificates.id, id)).run()).toThrow()
    expect(() => db.delete(certificates).run()).toThrow()
    expect(() =>
      db
        .update(certificatePdfs)
        .set({ pdf: Buffer.of(1) })
        .run(),
    ).toThrow()
    expect(() =>
      db.update(readings).set({ state: 'draft' }).where(eq(readings.id, reading.id)).run(),
    ).toThrow()
    const put = await bench.inspector.agent
      .put(`/api/readings/${reading.id}/marks`)
      .send({ basedOnVersion: 1, marks: reading.marks })
    expect([put.status, put.body.error.code]).toEqual([409, 'notEditable'])
  })
})

describe('a photograph whose file is gone from the disk', () => {
  it('leaves the PDF as it was issued, and the print view says what is missing', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench)
    const { id } = await issue(bench.qa, reading.id)
    rmSync(bench.context.storage.pathOf(reading.photos[0].sha256))
    await bench.qa.agent.get(`/api/certificates/${id}/pdf`).expect(200)
    const page = await bench.qa.agent.get(`/api/certificates/${id}/page`)
    expect([page.status, page.body.error.code]).toEqual([500, 'photographMissing'])
    const other = await agreeMeasured(bench)
    rmSync(bench.context.storage.pathOf(other.photos[0].sha256), { force: true })
    const refused = await bench.qa.agent
      .post(`/api/readings/${other.id}/certificate`)
      .send({ password: testPassword, replacesId: id })
    expect([refused.status, refused.body.error.code]).toEqual([500, 'photographMissing'])
    expect(bench.context.db.select().from(certificates).all()).toHaveLength(1)
  })
})

describe('a withdrawal', () => {
  it('asks for password and reason, and is final', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench)
    const { id } = await issue(bench.qa, reading.id)
    const path = `/api/certificates/${id}/withdraw`
    const silent = await bench.qa.agent.post(path).send({ password: testPassword, reason: ' ' })
    const wrong = await bench.qa.agent.post(path).send({ password: 'no', reason: 'a scratch' })
    expect(silent.body.error.fields.reason).toMatch(/why/)
    expect(wrong.body.error.fields.password).toMatch(/password/)
    const done = await bench.qa.agent
      .post(path)
      .send({ password: testPassword, reason: 'a scratch' })
      .expect(200)
    expect(done.body).toMatchObject({ state: 'withdrawn', withdrawalReason: 'a scratch' })
    const twice = await bench.qa.agent.post(path).send({ password: testPassword, reason: 'again' })
    expect([twice.status, twice.body.error.code]).toEqual([409, 'certificateEnded'])
    // The reading stays certified, and a new certificate of it may be issued.
    expect((await issue(bench.qa, reading.id)).number).toBe(`FC-${year}-0002`)
  })
})

describe('a certified reading that turns out wrong', () => {
  it('is corrected by a new one that names it, whatever that one says', async () => {
    const bench = await startWithQa()
    const wrong = await agreeMeasured(bench, 1)
    const first = await issue(bench.qa, wrong.id)
    const right = await agreeMeasured(bench, 3, { correctsId: wrong.id })
    const second = await issue(bench.qa, right.id, { replacesId: first.id })
    expect([second.verdict, second.replaces?.number]).toEqual(['doesNotConform', first.number])
  })
})

describe('a replacement', () => {
  it('ends the old one in the same step, and each names the other', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench)
    const first = await issue(bench.qa, reading.id)
    const twice = await bench.qa.agent
      .post(`/api/readings/${reading.id}/certificate`)
      .send({ password: testPassword })
    expect([twice.status, twice.body.error.code]).toEqual([409, 'alreadyCertified'])
    const second = await issue(bench.qa, reading.id, { replacesId: first.id })
    expect(second.replaces).toEqual({ id: first.id, number: first.number })
    const old = await bench.qa.agent.get(`/api/certificates/${first.id}`).expect(200)
    expect(old.body).toMatchObject({ state: 'replaced', replacedBy: { number: second.number } })
    const another = await agreeMeasured(bench)
    const beside = await bench.qa.agent
      .post(`/api/readings/${another.id}/certificate`)
      .send({ password: testPassword })
    expect([beside.status, beside.body.error.code]).toEqual([409, 'alreadyCertified'])
    const third = await bench.qa.agent
      .post(`/api/readings/${reading.id}/certificate`)
      .send({ password: testPassword, replacesId: first.id })
    expect([third.status, third.body.error.code]).toEqual([409, 'certificateEnded'])
  })
})

describe('the check page', () => {
  it('says to anybody with the code whether the certificate stands, however it is typed', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench)
    const certificate = await issue(bench.qa, reading.id)
    const nobody = bench.agent()
    const typed = certificate.checkCode.toLowerCase().replaceAll('-', ' ')
    const genuine = await nobody.get(`/api/check/${encodeURIComponent(typed)}`).expect(200)
    expect(genuine.body).toMatchObject({
      state: 'issued',
      number: certificate.number,
      serial: reading.serial,
      flatnessUm: certificate.flatnessUm,
      pdfSha256: certificate.pdfSha256,
    })
    await bench.qa.agent
      .post(`/api/certificates/${certificate.id}/withdraw`)
      .send({ password: testPassword, reason: 'a scratch' })
      .expect(200)
    const withdrawn = await nobody.get(`/api/check/${certificate.checkCode}`).expect(200)
    expect(withdrawn.body.state).toBe('withdrawn')
    // Why is between the shop and its customer.
    expect(JSON.stringify(withdrawn.body)).not.toContain('scratch')
  })

  it('knows nothing of a code that was never given out, and lets nobody try many', async () => {
    const bench = await startWithQa()
    const nobody = bench.agent()
    const first = await nobody.get('/api/check/7KQ4-MR2X-0000-0000')
    expect([first.status, first.body.error.message]).toEqual([404, expect.stringMatching(/letter by letter/)])
    const tries = []
    for (let i = 0; i < 60; i++) tries.push((await nobody.get('/api/check/none')).status)
    expect(tries.at(-1)).toBe(429)
  })
})

describe('fifty certificates at once', () => {
  it('get fifty numbers without a gap or a double', { timeout: 240_000 }, async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench)
    const ids = copiesOf(bench, reading.id, 50)
    const answers = await Promise.all(ids.map((id) => issue(bench.qa, id)))
    const numbers = answers.map(({ number }: Certificate) => number).sort()
    expect(numbers).toEqual(
      Array.from({ length: 50 }, (_, i) => `FC-${year}-${String(i + 1).padStart(4, '0')}`),
    )
    expect(bench.context.db.select().from(certificatePdfs).all()).toHaveLength(50)
    expect(verifyChain(bench.context.db)).toMatchObject({ intact: true })
  })
})

describe('a server that is killed while it issues a certificate', () => {
  it.each(['certificates', 'certificate_pdfs', 'events'])(
    'leaves nothing half when it dies over its row in %s, and the number is given to the next',
    { timeout: 120_000 },
    async (table) => {
      const bench = await startWithQa()
      const reading = await agreeMeasured(bench)
      const { db, env } = bench.context
      const before = verifyChain(db)
      const script = ['tests/api/killed-issue.ts', env.dataDir, reading.id, bench.qa.me.id, table]
      const { signal, stderr } = spawnSync(process.execPath, ['--import', 'tsx', ...script], {
        encoding: 'utf8',
      })
      expect(signal ?? stderr).toBe('SIGKILL')
      expect(db.$client.pragma('integrity_check', { simple: true })).toBe('ok')
      expect(db.select().from(certificates).all()).toEqual([])
      expect(db.select().from(certificatePdfs).all()).toEqual([])
      expect(verifyChain(db)).toEqual(before)
      const shown = await bench.qa.agent.get(`/api/readings/${reading.id}`).expect(200)
      expect(shown.body.state).toBe('agreed')
      expect((await issue(bench.qa, reading.id)).number).toBe(`FC-${year}-0001`)
    },
  )
})

/** Agreed readings of more pieces, with the same figure. */
function copiesOf({ context: { db } }: CertificateBench, readingId: string, count: number): string[] {
  const original = db.select().from(readings).where(eq(readings.id, readingId)).get()
  const photo = db.select().from(readingPhotos).where(eq(readingPhotos.readingId, readingId)).get()
  if (!original || !photo) throw new Error('nothing to copy')
  const piece = db.select().from(pieces).where(eq(pieces.id, original.pieceId)).get()
  if (!piece) throw new Error('nothing to copy')
  return Array.from({ length: count }, (_, i) => {
    const id = newId()
    const pieceId = newId()
    db.insert(pieces)
      .values({ ...piece, id: pieceId, serial: `copy ${i}` })
      .run()
    db.insert(readings)
      .values({ ...original, id, pieceId })
      .run()
    db.insert(readingPhotos)
      .values({ ...photo, id: newId(), readingId: id })
      .run()
    return id
  })
}
