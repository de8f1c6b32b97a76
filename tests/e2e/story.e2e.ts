import { readFileSync } from 'node:fs'
import type { MeasureFile } from '@shared/schemas/measure-file'
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchChromium } from './chromium'
import { type RunningServer, startLapwing } from './lapwing-server'
import { type Answer, call, overflowPx, seriousFaults, signIn, windowSizes } from './shop-hand'
import { TableHand } from './table-hand'

const fixtures = 'tests/fixtures/practice'
const file: MeasureFile = JSON.parse(readFileSync(`${fixtures}/few-bands-1.traced.json`, 'utf8'))
if (file.outline.kind !== 'circle' || !file.traces || !file.pressTest)
  throw new Error('the fixture is a traced disc')
const { outline, traces, pressTest } = file
const truth = JSON.parse(readFileSync(`${fixtures}/truth.json`, 'utf8'))['few-bands-1']

let server: RunningServer
let browser: Browser
let context: BrowserContext
let page: Page

beforeAll(async () => {
  server = await startLapwing()
  browser = await launchChromium()
  context = await browser.newContext({ viewport: { width: 1280, height: 800 } })
  page = await context.newPage()
  page.setDefaultTimeout(20_000)
})

afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

describe('an evening at the bench', () => {
  let tableUrl: string

  it('a wrong password is answered with a sentence, the right one opens the shop', async () => {
    await page.goto(server.url)
    await page.getByLabel('E-mail').fill('maren@quillmere.example')
    await page.getByLabel('Password').fill('not the password')
    await page.keyboard.press('Enter')
    expect(await page.getByRole('alert').textContent()).toMatch(/password/i)
    await signIn(page, server.url, 'maren@quillmere.example', 'straw bands at noon')
    expect(await seriousFaults(page)).toEqual([])
  })

  it('the inspector starts a reading of a new piece and photographs it; a broken file is told, the good one stays', async () => {
    const { json: customers } = await call(page, 'GET', '/customers')
    const part = await call(page, 'POST', '/parts', {
      customerId: customers.rows[0].id,
      number: 'TR-30',
      revision: 'A',
      name: 'Trial disc',
      material: '',
    })
    await call(page, 'POST', `/parts/${part.json.id}/faces`, {
      name: 'lapped face',
      size: { shape: 'disc', diameterMm: outline.diameterMm },
      tolerance: { kind: 'plain', max: { valueUm: 0.3, typed: '0.3 um' } },
      reference: 'minimumZone',
      rule: { kind: 'iso14253_older', guardFactor: 1 },
      edgeBandMm: file.edgeExclusionMm,
      support: 'free',
    })
    await page.goto(`${server.url}/readings/new`)
    await page.getByRole('button', { name: 'Add a piece' }).click()
    await page.getByRole('combobox', { name: 'Part' }).click()
    await page.getByRole('option', { name: 'TR-30' }).click()
    await page.getByLabel('Serial number').fill('0001')
    await page.getByRole('button', { name: 'Add the piece' }).click()
    await page
      .getByText(/TR-30.* · 0001/)
      .first()
      .waitFor()
    await page.getByRole('combobox', { name: 'Light source' }).click()
    await page
      .getByRole('option', { name: /sodium/i })
      .first()
      .click()
    await page.getByRole('button', { name: 'Go on to the photographs' }).click()
    await page.waitForURL('**reading=*')
    await page
      .getByLabel('Choose files')
      .first()
      .setInputFiles([
        {
          name: 'few-bands-1.jpg',
          mimeType: 'image/jpeg',
          buffer: readFileSync(`${fixtures}/few-bands-1.jpg`),
        },
        { name: 'broken.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('this is no picture') },
      ])
    await page.getByText('kept,').first().waitFor()
    await page
      .getByText(/not a picture|can read/)
      .first()
      .waitFor()
    await page.getByRole('button', { name: 'To the tracing table' }).click()
    await page.waitForURL('**/table')
    tableUrl = page.url()
  })

  it('marks face, press arrow and bands by mouse, and sees the figure within its U of the drawn truth', async () => {
    const hand = new TableHand(page)
    await hand.ready()
    const { cx, cy, r } = outline
    await hand.take('Face')
    for (const angle of [0.3, 2.4, 4.5])
      await hand.click([cx + r * Math.cos(angle), cy + r * Math.sin(angle)])
    await page.keyboard.press('Enter')
    await hand.take('Press arrow')
    const { x, y, dx, dy } = pressTest
    await hand.drag([x, y], [x + 120 * dx, y + 120 * dy])
    await hand.take('Band')
    for (const trace of traces) {
      // Every second click of a patient hand is plenty.
      for (const [i, place] of trace.points.entries()) if (i % 2 === 0) await hand.click(place)
      await page.keyboard.press('Enter')
    }
    await hand.take('Number')
    const middles = traces.map((t) => t.points[t.points.length >> 1]!)
    const [first, last] = [middles[0]!, middles[middles.length - 1]!]
    const beyond = (a: readonly number[], b: readonly number[]): [number, number] => [
      a[0]! + 0.15 * (a[0]! - b[0]!),
      a[1]! + 0.15 * (a[1]! - b[1]!),
    ]
    await hand.drag(beyond(first, last), beyond(last, first))
    const readingId = tableUrl.split('/').at(-2)!
    // What was marked last is saved a moment later.
    let computed: Answer = { status: 0, json: null }
    const refusals = async () => {
      computed = await call(page, 'POST', `/readings/${readingId}/compute`)
      return computed.json.findings.filter((f: { severity: string }) => f.severity === 'refusal')
    }
    await expect.poll(refusals, { timeout: 20_000, interval: 500 }).toEqual([])
    const { minimumZoneUm, expandedUncertaintyUm } = computed.json
    // The screen's pixels are coarser than the photograph's, so the hand is a little shakier than at full size.
    expect(Math.abs(minimumZoneUm - truth.minimumZoneUm)).toBeLessThan(expandedUncertaintyUm)
    const shown = await page.getByText(minimumZoneUm.toFixed(3)).first().textContent()
    expect(shown).toContain(minimumZoneUm.toFixed(3))
    // A draft shows no verdict.
    expect(await page.getByText(/^Conforms/).count()).toBe(0)
    expect(await seriousFaults(page)).toEqual([])
  })

  it('undo takes back one mark and redo brings it again', async () => {
    const bands = () => page.locator('[data-step="bands"]').textContent()
    const before = await bands()
    await page.getByRole('application').focus()
    await page.keyboard.press('Control+z')
    await page.keyboard.press('Control+z')
    await expect.poll(bands).not.toBe(before)
    await page.keyboard.press('Control+Shift+z')
    await page.keyboard.press('Control+Shift+z')
    await expect.poll(bands).toBe(before)
    await page.getByText(/Saved \d/).waitFor()
  })

  it('a reload brings everything back', async () => {
    await page.reload()
    await new TableHand(page).ready()
    await page.locator('[data-step="bands"]', { hasText: `on ${traces.length} bands` }).waitFor()
  })

  it('a second person sees the reading and is refused what is not theirs', async () => {
    const other = await (await browser.newContext()).newPage()
    await signIn(other, server.url, 'edda@quillmere.example', 'clean dry and soaked')
    const readingId = tableUrl.split('/').at(-2)!
    const { json: reading } = await call(other, 'GET', `/readings/${readingId}`)
    expect(reading.mayEdit).toBe(false)
    const answer = await call(other, 'PUT', `/readings/${readingId}/marks`, {
      basedOnVersion: reading.marksVersion,
      marks: reading.marks,
    })
    expect(answer.status).toBe(403)
    expect(answer.json.error.message).toMatch(/\w+/)
    await other.context().close()
  })

  it('sent for review, it can be changed no more', async () => {
    await page.goto(tableUrl)
    await new TableHand(page).ready()
    await page.getByRole('button', { name: 'Send for review' }).click()
    await page.getByText('Sent for review.').first().waitFor()
    const readingId = tableUrl.split('/').at(-2)!
    const { json } = await call(page, 'GET', `/readings/${readingId}`)
    expect(json.state).toBe('sentForReview')
    expect(json.result.verdict).not.toBe('noVerdict')
    expect(
      (
        await call(page, 'PUT', `/readings/${readingId}/marks`, {
          basedOnVersion: json.marksVersion,
          marks: json.marks,
        })
      ).status,
    ).toBe(409)
  })

  it.each(['/', '/readings', '/pieces', '/parts', '/equipment'])(
    '%s has no serious fault of access at either size',
    async (path) => {
      for (const viewport of windowSizes) {
        await page.setViewportSize(viewport)
        await page.goto(`${server.url}${path}`)
        await page.getByRole('main').waitFor()
        await page.waitForLoadState('networkidle')
        expect(await seriousFaults(page)).toEqual([])
        expect(await overflowPx(page)).toBeLessThanOrEqual(0)
      }
    },
  )
})
