/**
 * Everything that `npm test` runs: lint, types, unit and API tests, then the browser tests against a built
 * server. Counts come from each runner's own report; the last line is the sum, alone.
 */
import { spawnSync } from 'node:child_process'
import { mkdirSync, readFileSync, rmSync } from 'node:fs'
import { requireChromium } from './e2e/chromium'

interface Count {
  passed: number
  failed: number
}

const results = 'tests/results'

function run(command: string, args: string[]): boolean {
  console.log(`\n> ${command} ${args.join(' ')}`)
  const { status, error } = spawnSync(command, args, { stdio: 'inherit' })
  if (error) console.error(error.message)
  return status === 0
}

/** A check that has no tests of its own counts as one. */
function check(command: string, args: string[]): Count {
  return run(command, args) ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 }
}

/** Vitest's JSON report says what passed; a runner that fails without naming a failed test counts as one. */
function vitest(name: string, config: string): Count {
  const report = `${results}/${name}.json`
  const ok = run('node_modules/.bin/vitest', [
    'run',
    '--config',
    config,
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ])
  try {
    const { numPassedTests, numFailedTests } = JSON.parse(readFileSync(report, 'utf8'))
    return { passed: numPassedTests, failed: ok ? 0 : Math.max(1, numFailedTests) }
  } catch {
    return { passed: 0, failed: 1 }
  }
}

function browserTests(): Count {
  try {
    requireChromium()
  } catch (error) {
    console.error(error instanceof Error ? error.message : error)
    return { passed: 0, failed: 1 }
  }
  return vitest('e2e', 'tests/e2e/vitest.config.ts')
}

rmSync(results, { recursive: true, force: true })
mkdirSync(results, { recursive: true })

const counts = [
  check('node_modules/.bin/biome', ['check', '.']),
  check('node_modules/.bin/tsc', ['--noEmit']),
  vitest('unit', 'vite.config.ts'),
  browserTests(),
]
const passed = counts.reduce((sum, count) => sum + count.passed, 0)
const failed = counts.reduce((sum, count) => sum + count.failed, 0)
console.log(`\n${passed} passed, ${failed} failed`)
process.exitCode = failed === 0 ? 0 : 1
