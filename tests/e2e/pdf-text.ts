import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { requireProgram } from '../debian-program'

const places = ['/usr/bin/pdftotext', '/usr/local/bin/pdftotext']

/** The text of a PDF in reading order, as poppler's pdftotext gives it. */
export function pdfText(pdf: Buffer): string {
  const program = requireProgram(
    () => places.find((path) => existsSync(path)),
    'poppler-utils',
    'The tests of certificates need pdftotext. Install it (Debian: apt-get install poppler-utils).',
  )
  const { status, stdout, stderr } = spawnSync(program, ['-layout', '-', '-'], { input: pdf })
  if (status !== 0) throw new Error(`pdftotext ended with ${status}: ${stderr}`)
  return stdout.toString()
}
