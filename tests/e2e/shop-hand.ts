import { AxeBuilder } from '@axe-core/playwright'
import type { Page } from 'playwright-core'

export async function signIn(on: Page, url: string, email: string, password: string): Promise<void> {
  await on.goto(url)
  await on.getByLabel('E-mail').fill(email)
  await on.getByLabel('Password').fill(password)
  await on.keyboard.press('Enter')
  await on.getByRole('link', { name: /Lapwing/ }).waitFor()
}

export interface Answer {
  status: number
  // biome-ignore lint/suspicious/noExplicitAny: whatever the server sends, asked field by field
  json: any
}

/** Sends JSON as the page itself would, with its cookie and origin. */
export async function call(on: Page, method: string, path: string, body?: unknown): Promise<Answer> {
  return on.evaluate(
    async ({ method, path, body }) => {
      const response = await fetch(`/api${path}`, {
        method,
        headers: { 'content-type': 'application/json' },
        body: body === undefined ? undefined : JSON.stringify(body),
      })
      return { status: response.status, json: await response.json().catch(() => null) }
    },
    { method, path, body },
  )
}

/** Faults of access that axe calls serious or critical. */
export async function seriousFaults(on: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page: on }).analyze()
  return violations.filter((v) => v.impact === 'serious' || v.impact === 'critical').map((v) => v.id)
}

/** How far a page is wider than its window, px. */
export async function overflowPx(on: Page): Promise<number> {
  return on.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)
}

export const windowSizes = [
  { width: 1280, height: 800 },
  { width: 820, height: 1180 },
]
