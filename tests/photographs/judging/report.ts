import type { Check } from './checks'
import type { JudgedFile } from './judged-file'

const nameWidth = 22

/** One line a file. */
export function fileTable(files: readonly JudgedFile[]): string {
  const head = `${'file'.padEnd(nameWidth)}    error        U  within  sign   warnings`
  return [head, ...files.map(fileLine)].join('\n')
}

function fileLine(file: JudgedFile): string {
  const name = file.name.padEnd(nameWidth)
  if (file.refusal !== null) return `${name}  refused  ${file.refusal}`
  const columns = [
    bands(file.errorBands),
    bands(file.expandedUncertaintyBands),
    (file.covered ? 'yes' : 'NO').padEnd(6),
    file.signRight === null ? '-    ' : file.signRight ? 'right' : 'WRONG',
    file.warnings.join(' '),
  ]
  return `${name} ${columns.join('  ')}`.trimEnd()
}

function bands(value: number | null): string {
  return (value === null ? '-' : value.toFixed(4)).padStart(8)
}

/** One line a check, then the sum alone. */
export function checkReport(checks: readonly Check[]): string {
  const passed = checks.filter((check) => check.passed).length
  const lines = checks.map(({ says, passed: held }) => `${held ? 'met   ' : 'MISSED'}  ${says}`)
  return [...lines, '', `${passed} passed, ${checks.length - passed} failed`].join('\n')
}
