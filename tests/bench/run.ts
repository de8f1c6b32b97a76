/*
 * npm run bench: how long what people wait for takes on this machine, beside what is aimed at.
 * Figures only: a busy machine is no failure.
 */
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { benchCertificate } from './certificate'
import { measurementLine } from './measurement'
import { benchPreview } from './preview'
import { benchReadingList } from './reading-list'
import { benchTracedFit } from './traced-fit'

const folder = mkdtempSync(join(tmpdir(), 'lapwing-bench-'))
try {
  console.log(measurementLine(await benchTracedFit()))
  console.log(measurementLine(await benchPreview(join(folder, 'photos'))))
  console.log(measurementLine(await benchCertificate()))
  for (const line of await benchReadingList(join(folder, 'shop'))) console.log(measurementLine(line))
} finally {
  rmSync(folder, { recursive: true })
}
