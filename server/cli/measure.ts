/*
 * npm run --silent measure -- FILE.json…
 * One JSON object a line on standard output, in the order given; nothing else goes there.
 */
import { isRefused, measureFile } from './measure/measure-file'

const files = process.argv.slice(2)
if (files.length === 0) {
  process.stderr.write('Give one or more files: npm run --silent measure -- FILE.json…\n')
  process.exitCode = 1
}

for (const file of files) {
  const line = await measureFile(file)
  process.stdout.write(`${JSON.stringify(line)}\n`)
  if (isRefused(line)) process.exitCode = 1
}
