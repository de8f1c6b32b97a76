import { readFileSync } from 'node:fs'
import { emptyMarks } from '@shared/schemas/marks'
import type { MeasureFile } from '@shared/schemas/measure-file'
import { formatWithUncertainty } from '@shared/units/height'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchChromium } from './chromium'
import { type RunningServer, startLapwing } from './lapwing-server'
import { pdfText } from './pdf-text'
import { call, overflowPx, seriousFaults, signIn, windowSizes } from './shop-hand'

const fixtures = 'tests/fixtures/practice'
const file: MeasureFile = JSON.parse(readFileSync(`${fixtures}/few-bands-1.traced.json`, 'utf8'))

let server: RunningServer
let browser: Browser
/** Four people, each with a browser of their own. */
let inspector: Page
let reviewer: Page
let qa: Page
let customer: Page
let readingId = ''
let figure = { value: '', u: '' }
let checkAddress = ''
let certificateId = ''

const serial = '0042'

beforeAll(async () => {
  server = await startLapwing()
  browser = await launchChromium()
  inspector = await personAt('maren@quillmere.example', 'straw bands at noon')
  reviewer = await personAt('tobias@quillmere.example', 'second pair of eyes')
  qa = await personAt('ines@quillmere.example', 'signed and sealed')
  customer = await newPage()
})

afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

async function newPage(): Promise<Page> {
  const context = await browser.newContext({ viewport: windowSizes[0] })
  const page = await context.newPage()
  page.setDefaultTimeout(20_000)
  return page
}

async function personAt(email: string, password: string): Promise<Page> {
  const page = await newPage()
  await signIn(page, server.url, email, password)
  return page
}

/** What the inspector did at the table; the story of the bench does it by hand. */
async function measure(page: Page): Promise<string> {
  if (file.outline.kind !== 'circle') throw new Error('the fixture is a disc')
  const { diameterMm, ...outline } = file.outline
  const { json: customers } = await call(page, 'GET', '/customers')
  const part = await call(page, 'POST', '/parts', {
    customerId: customers.rows[0].id,
    number: 'CT-30',
    name: 'Story disc',
  })
  const face = await call(page, 'POST', `/parts/${part.json.id}/faces`, {
    name: 'lapped face',
    size: { shape: 'disc', diameterMm },
    tolerance: { kind: 'plain', max: { valueUm: 0.3, typed: '0.3 um' } },
    reference: 'minimumZone',
    rule: { kind: 'iso14253_2017', guardFactor: 0.825 },
    edgeBandMm: file.edgeExclusionMm,
    support: 'free',
  })
  const piece = await call(page, 'POST', '/pieces', { partId: part.json.id, serial })
  const { json: shelf } = await call(page, 'GET', '/equipment')
  const sodium = shelf.rows.find((row: { name: string }) => /sodium/i.test(row.name))
  const reading = await call(page, 'POST', '/readings', {
    pieceId: piece.json.id,
    faceId: face.json.id,
    setUp: {
      lightSourceId: sodium.id,
      referenceFlatId: null,
      cameraSetUpId: null,
      thermometerId: null,
      viewingAngleDeg: 0,
      viewingAngleUDeg: null,
      mirrored: false,
    },
    conditions: {
      airTemperatureC: 20.1,
      partTemperatureC: 20.2,
      soakMinutes: 60,
      temperatureHalfWidthUm: null,
      meanGapUm: null,
      supportHalfWidthUm: null,
      note: '',
    },
  })
  const { id } = reading.json
  await page.goto(`${server.url}/readings/${id}`)
  await page
    .getByLabel('Choose files')
    .first()
    .setInputFiles({
      name: 'few-bands-1.jpg',
      mimeType: 'image/jpeg',
      buffer: readFileSync(`${fixtures}/few-bands-1.jpg`),
    })
  await page.getByText('kept,').first().waitFor()
  const marks = {
    ...emptyMarks(file.edgeExclusionMm),
    outline,
    pressArrow: file.pressTest,
    traces: file.traces?.map((trace, i) => ({ id: `band-${i}`, ...trace })),
  }
  await call(page, 'PUT', `/readings/${id}/marks`, { basedOnVersion: 0, marks })
  await call(page, 'POST', `/readings/${id}/compute`)
  return id
}

describe('a reading that others can stand on', () => {
  it('is taken and sent for review by the inspector', async () => {
    readingId = await measure(inspector)
    await inspector.reload()
    await inspector.getByRole('button', { name: 'Send for review' }).click()
    await inspector.getByText('Sent for review.').first().waitFor()
  })

  it('waits at the review desk; the reviewer pins a remark and sends it back with a reason', async () => {
    await reviewer.goto(`${server.url}/review`)
    await reviewer.getByRole('link', { name: `CT-30 · ${serial}` }).click()
    await reviewer.waitForURL(`**/review/${readingId}`)
    await reviewer.getByText('To look at').waitFor()
    const photo = reviewer
      .locator('svg')
      .filter({ has: reviewer.locator('title') })
      .first()
    await photo.click({ position: { x: 300, y: 200 } })
    await reviewer.getByLabel(/New remark on the marked place/).fill('Is this band the one that it says?')
    await reviewer.getByRole('button', { name: 'Add the remark' }).click()
    await reviewer.getByRole('button', { name: 'Remark 1' }).first().waitFor()
    expect(await reviewer.getByRole('button', { name: 'Agree' }).isDisabled()).toBe(true)
    expect(await seriousFaults(reviewer)).toEqual([])
    await reviewer.getByRole('button', { name: 'Send back' }).click()
    await reviewer.getByLabel('Reason').fill('Look at the band of the remark again.')
    await reviewer.getByRole('dialog').getByRole('button', { name: 'Send back' }).click()
    await reviewer.getByText('Sent back.').first().waitFor()
  })

  it('comes back to the inspector, who answers, mends it and sends it again', async () => {
    await inspector.goto(server.url)
    await inspector
      .getByText(/Look at the band of the remark again/)
      .first()
      .waitFor()
    await inspector.goto(`${server.url}/readings/${readingId}`)
    await inspector.getByRole('link', { name: 'Review desk' }).click()
    await inspector.getByRole('button', { name: 'Answer' }).click()
    await inspector.getByLabel('Answer to remark 1').fill('It is; one click of it was off and is gone.')
    await inspector.getByRole('button', { name: 'Answer' }).click()
    await inspector.getByText('one click of it was off').waitFor()
    await inspector.goto(`${server.url}/readings/${readingId}`)
    await inspector.getByRole('button', { name: 'Open it again' }).click()
    await inspector.getByText('Open again, as a draft.').first().waitFor()
    const { json: reading } = await call(inspector, 'GET', `/readings/${readingId}`)
    const [first, ...others] = reading.marks.traces
    const mended = [{ ...first, points: first.points.slice(1) }, ...others]
    await call(inspector, 'PUT', `/readings/${readingId}/marks`, {
      basedOnVersion: reading.marksVersion,
      marks: { ...reading.marks, traces: mended },
    })
    await inspector.reload()
    await inspector.getByText(/have changed since this figure/).waitFor()
    await inspector.getByRole('button', { name: 'Compute it again' }).click()
    await inspector.getByText(/have changed since this figure/).waitFor({ state: 'detached' })
    await inspector.getByRole('button', { name: 'Send for review' }).click()
    await inspector.getByText('Sent for review.').first().waitFor()
  })

  it('is agreed to once the remark is closed', async () => {
    await reviewer.goto(`${server.url}/review/${readingId}`)
    await reviewer.getByText('one click of it was off').waitFor()
    await reviewer.getByRole('button', { name: 'Close remark 1' }).click()
    await reviewer.getByText(/closed by Tobias/).waitFor()
    await reviewer.getByRole('button', { name: 'Agree' }).click()
    await reviewer.getByText(/Agreed by Tobias/).waitFor()
  })

  it('is certified by QA, with the password once more', async () => {
    await qa.goto(`${server.url}/readings/${readingId}`)
    await qa.getByRole('button', { name: 'Issue the certificate' }).click()
    await qa.getByLabel('How the piece was received').fill('1 December, sound')
    await qa.getByLabel('Your password once more').fill('not the one')
    await qa.getByRole('button', { name: 'Issue', exact: true }).click()
    await qa
      .getByText(/not.*password|password.*not/i)
      .first()
      .waitFor()
    await qa.getByLabel('Your password once more').fill('signed and sealed')
    await qa.getByRole('button', { name: 'Issue', exact: true }).click()
    await qa.waitForURL('**/certificates/*')
    certificateId = qa.url().split('/').at(-1) ?? ''
    const { json } = await call(qa, 'GET', `/readings/${readingId}`)
    expect(json.state).toBe('certified')
    // As every page prints it: U is rounded up.
    figure = formatWithUncertainty(json.result.flatnessUm, json.result.expandedUncertaintyUm, 'um')
  })

  it('has a PDF whose text holds figure, U and rule', async () => {
    const answer = await qa.request.get(`${server.url}/api/certificates/${certificateId}/pdf`)
    const text = pdfText(await answer.body())
    const { json: certificate } = await call(qa, 'GET', `/certificates/${certificateId}`)
    expect(text.replace(/\s+/g, ' ')).toContain(`${figure.value} ${figure.u.replace(/± ?/, '± ')}`)
    for (const said of [
      certificate.number,
      serial,
      'ISO 14253-1:2017',
      '1 December, sound',
      'Ines Calloway',
    ]) {
      expect(text).toContain(said)
    }
    checkAddress = `${server.url}/check/${certificate.checkCode}`
    // The print view is drawn from the same description, so it says the same.
    const printed = await qa
      .getByRole('img', { name: /certificate/i })
      .first()
      .textContent()
    expect(printed?.replace(/\s+/g, ' ')).toContain(figure.value)
  })

  it('is told genuine to a customer without an account, and withdrawn after its withdrawal', async () => {
    await customer.goto(checkAddress)
    await customer.getByText('This certificate is genuine and stands.').waitFor()
    expect(await customer.getByText(serial, { exact: true }).count()).toBe(1)
    expect(await seriousFaults(customer)).toEqual([])
    await qa.getByRole('button', { name: 'Withdraw' }).click()
    await qa.getByLabel('Reason').fill('The wrong order stood on it.')
    await qa.getByLabel('Your password once more').fill('signed and sealed')
    await qa.getByRole('dialog').getByRole('button', { name: 'Withdraw' }).click()
    await qa
      .getByText(/is withdrawn/)
      .first()
      .waitFor()
    await customer.reload()
    await customer.getByText(/This certificate was withdrawn/).waitFor()
  })

  it('is found by its serial, among the certificates and everywhere else', async () => {
    await qa.goto(`${server.url}/certificates?search=${serial}`)
    await qa.getByText('1 certificate', { exact: true }).waitFor()
    await qa.getByText('withdrawn').first().waitFor()
    await qa.goto(`${server.url}/readings?search=${serial}&state=certified&verdict=conforms`)
    await qa.getByText('1 reading', { exact: true }).waitFor()
    const csv = await qa.request.get(`${server.url}/api/readings.csv?search=${serial}`)
    expect(await csv.text()).toMatch(new RegExp(`CT-30,Story disc,${serial},.*certified,${figure.value}`))
  })

  it('has no page with a serious fault of access, or wider than its window, at either size', async () => {
    const pages: [Page, string][] = [
      [reviewer, '/review'],
      [reviewer, `/review/${readingId}`],
      [qa, '/certificates'],
      [qa, `/certificates/${certificateId}`],
      [customer, '/check'],
    ]
    for (const [page, path] of pages) {
      for (const size of windowSizes) {
        await page.setViewportSize(size)
        await page.goto(`${server.url}${path}`)
        await page.getByRole('main').waitFor()
        await page.waitForLoadState('networkidle')
        expect(await seriousFaults(page), path).toEqual([])
        expect(await overflowPx(page), path).toBeLessThanOrEqual(0)
      }
    }
  })
})
