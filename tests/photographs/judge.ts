/*
 * npm run check:photos -- DIR [--against recorded.json] [--record file]
 * Measures every NAME.traced.json of the folder, as the measuring command does, and holds it against
 * truth.json. Fails on any target missed; with --against only on what got worse than the recorded figures.
 */
import { readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { parseArgs } from 'node:util'
import { measureFile } from '../../server/cli/measure/measure-file'
import { checkAgainst, checkTargets } from './judging/checks'
import { type JudgedFile, judgeLine, type Truth } from './judging/judged-file'
import { checkReport, fileTable } from './judging/report'
import { summarize } from './judging/summary'

const ending = '.traced.json'

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: { against: { type: 'string' }, record: { type: 'string' } },
})
const [folder] = positionals
const judged = folder === undefined ? [] : await judgeFolder(folder)
if (judged.length === 0) {
  console.error('Give a folder that holds truth.json and NAME.traced.json files.')
  console.log('0 passed, 1 failed')
  process.exit(1)
}

const summary = summarize(judged)
console.log(`${fileTable(judged)}\n`)
if (values.record) writeFileSync(values.record, `${JSON.stringify(recordable(summary), null, 2)}\n`)
const checks = values.against
  ? checkAgainst(summary, JSON.parse(readFileSync(values.against, 'utf8')))
  : checkTargets(summary)
console.log(checkReport(checks))
process.exitCode = checks.every(({ passed }) => passed) ? 0 : 1

async function judgeFolder(from: string): Promise<JudgedFile[]> {
  const truths: Record<string, Truth> = JSON.parse(readFileSync(join(from, 'truth.json'), 'utf8'))
  const files: JudgedFile[] = []
  for (const fileName of readdirSync(from).sort()) {
    const name = fileName.slice(0, -ending.length)
    const truth = fileName.endsWith(ending) ? truths[name] : undefined
    if (truth) files.push(judgeLine(name, await measureFile(join(from, fileName)), truth))
  }
  return files
}

/** Figures rounded to what they mean, so that recording the same again changes nothing. */
function recordable(figures: object) {
  return Object.fromEntries(Object.entries(figures).map(([key, value]) => [key, Number(value.toFixed(5))]))
}
