import type { ReadingList } from '@shared/schemas/readings'
import { describe, expect, it } from 'vitest'
import { agreeMeasured, issue, sendMeasured, startWithQa } from './certified'
import { takeMeasuredReading } from './readings-support'

const totalOf = async (bench: Awaited<ReturnType<typeof startWithQa>>, query: string) => {
  const { body } = await bench.qa.agent.get(`/api/readings?${query}`).expect(200)
  return [body.total, body.rows.length]
}

describe('the archive of readings', () => {
  it('is narrowed by state, verdict, customer, day and words, and says how many there are', async () => {
    const bench = await startWithQa()
    const certified = await agreeMeasured(bench, 1)
    await issue(bench.qa, certified.id)
    await sendMeasured(bench, 3, bench.inspector, { lappedSince: true })
    await takeMeasuredReading(bench, 3)
    const { body: customers } = await bench.qa.agent.get('/api/customers').expect(200)
    const customer = customers.rows[0].id
    expect(await totalOf(bench, '')).toEqual([3, 3])
    expect(await totalOf(bench, 'limit=2')).toEqual([3, 2])
    expect(await totalOf(bench, 'state=certified')).toEqual([1, 1])
    expect(await totalOf(bench, 'verdict=conforms')).toEqual([1, 1])
    // A draft has no verdict yet, whatever its figure.
    expect(await totalOf(bench, 'verdict=doesNotConform')).toEqual([1, 1])
    expect(await totalOf(bench, `customerId=${customer}`)).toEqual([3, 3])
    expect(await totalOf(bench, 'customerId=nobody')).toEqual([0, 0])
    expect(await totalOf(bench, 'from=2026-11-02&to=2026-11-02')).toEqual([3, 3])
    expect(await totalOf(bench, 'from=2026-11-03')).toEqual([0, 0])
    expect(await totalOf(bench, 'to=2026-11-01')).toEqual([0, 0])
    expect(await totalOf(bench, `search=${certified.serial}&state=certified`)).toEqual([1, 1])
    const wrong = await bench.qa.agent.get('/api/readings?from=yesterday')
    expect([wrong.status, wrong.body.error.fields.from]).toEqual([
      400,
      expect.stringMatching(/year-month-day/),
    ])
  })

  it('runs from the oldest on where that is asked, page after page', async () => {
    const bench = await startWithQa()
    const ids: string[] = []
    for (let i = 0; i < 3; i++) ids.push((await takeMeasuredReading(bench, 1)).id)
    const seen: string[] = []
    let next: string | null = null
    do {
      const before: string = next ? `&before=${encodeURIComponent(next)}` : ''
      const { body }: { body: ReadingList } = await bench.qa.agent
        .get(`/api/readings?order=oldest&limit=1${before}`)
        .expect(200)
      seen.push(...body.rows.map(({ id }) => id))
      next = body.next
    } while (next)
    expect(seen).toEqual(ids)
  })
})

describe('a table as CSV', () => {
  it('holds what the list shows; what could be run as a formula is made harmless', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench, 1)
    await bench.inspector.agent
      .patch(`/api/parts/${bench.partId}`)
      .send({ name: '=HYPERLINK("x")' })
      .expect(200)
    await issue(bench.qa, reading.id)
    const readings = await bench.qa.agent.get('/api/readings.csv?state=certified').expect(200)
    expect(readings.headers['content-type']).toMatch(/text\/csv/)
    expect(readings.headers['content-disposition']).toMatch(/readings\.csv/)
    const [head, row, rest] = readings.text.split('\r\n')
    expect(head).toContain('Part,Name,Serial,Face,Customer,Reading,State')
    expect(row).toContain(`"'=HYPERLINK(""x"")",${reading.serial}`)
    expect(row).toContain('certified')
    expect(rest).toBe('')
    const certificates = await bench.qa.agent.get('/api/certificates.csv').expect(200)
    expect(certificates.text).toContain('FC-2026-0001')
    const pieces = await bench.qa.agent.get(`/api/pieces.csv?search=${reading.serial}`).expect(200)
    expect(pieces.text).toContain(`${reading.serial},`)
    expect(pieces.text).toContain('certified')
    const none = await bench.qa.agent.get('/api/certificates.csv?state=withdrawn').expect(200)
    expect(none.text).not.toContain('FC-2026-0001')
  })
})

describe('the list of certificates', () => {
  it('finds by number, serial, part and customer, and counts', async () => {
    const bench = await startWithQa()
    const reading = await agreeMeasured(bench, 1)
    const { number } = await issue(bench.qa, reading.id)
    for (const word of [number, reading.serial, reading.partNumber, reading.customerName.split(' ')[0]]) {
      const { body } = await bench.qa.agent.get(`/api/certificates?search=${word}`).expect(200)
      expect([word, body.total, body.rows[0]?.number]).toEqual([word, 1, number])
    }
    const found = await bench.qa.agent.get(`/api/search?q=${number}`).expect(200)
    expect(found.body.certificates).toMatchObject([{ number, state: 'issued' }])
    const { body } = await bench.qa.agent.get('/api/certificates?search=nothing').expect(200)
    expect([body.total, body.rows, body.next]).toEqual([0, [], null])
  })
})
