import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'

/**
 * A program that the tests need, installed as Debian's package where that is possible.
 *
 * @throws Error with a sentence that says what to do
 */
export function requireProgram(
  find: () => string | undefined,
  debianPackage: string,
  advice: string,
): string {
  const found = find()
  if (found) return found
  if (process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    console.log(`Installing ${debianPackage} for the tests …`)
    const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
    spawnSync('apt-get', ['update'], { stdio: 'ignore', env })
    spawnSync('apt-get', ['install', '-y', '--no-install-recommends', debianPackage], {
      stdio: 'inherit',
      env,
    })
    const installed = find()
    if (installed) return installed
  }
  throw new Error(advice)
}
