import { describe, expect, it } from 'vitest'
import { writeCsv } from './write-csv'

const bom = '\uFEFF'

describe('a table as CSV', () => {
  it('begins with a byte order mark and ends every line as RFC 4180 says', () => {
    expect(writeCsv(['a', 'b'], [[1, null]])).toBe(`${bom}a,b\r\n1,\r\n`)
  })

  it('quotes what holds a comma, a quote or a line break', () => {
    expect(writeCsv(['a'], [['x, "y"\nz']])).toBe(`${bom}a\r\n"x, ""y""\nz"\r\n`)
  })

  // OWASP, "CSV Injection": cells that begin with one of = + - @, tab or carriage return (from memory).
  it.each(['=1+1', '+1', '-1', '@SUM(A1)', '\t=1'])('makes %j harmless', (cell) => {
    expect(writeCsv(['a'], [[cell]])).toContain(`'${cell}`)
  })

  it('leaves numbers as they are, below nothing too', () => {
    expect(writeCsv(['a'], [[-0.25]])).toBe(`${bom}a\r\n-0.25\r\n`)
  })
})
