import { existsSync } from 'node:fs'
import { type Browser, chromium } from 'playwright-core'
import { requireProgram } from '../debian-program'

const places = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome']

function findChromium(): string | undefined {
  return [process.env.CHROMIUM_PATH, ...places].find((path) => path && existsSync(path))
}

/**
 * Path of a Chromium on this machine; installs Debian's where that is possible.
 *
 * @throws Error with a sentence that says what to do
 */
export function requireChromium(): string {
  return requireProgram(
    findChromium,
    'chromium',
    'The browser tests need Chromium. Install it (Debian: apt-get install chromium) or name one in CHROMIUM_PATH.',
  )
}

/** A headless browser that makes no connections of its own. */
export function launchChromium(): Promise<Browser> {
  return chromium.launch({
    executablePath: requireChromium(),
    headless: true,
    args: [
      // A sandbox can't be set up as root.
      ...(process.getuid?.() === 0 ? ['--no-sandbox'] : []),
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  })
}
