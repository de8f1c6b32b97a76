import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { AppError, errorCodes } from './errors'
import { hasSentence } from './i18n'

/** Keys such as 'people.password.short' that a schema gives as its message. */
function keysInSchemas(): string[] {
  const folder = 'shared/schemas'
  const source = readdirSync(folder).map((file) => readFileSync(`${folder}/${file}`, 'utf8'))
  return source.flatMap((text) => [...text.matchAll(/'([a-z]\w*(?:\.\w+)+)'/g)].map(([, key]) => key))
}

describe('every refusal', () => {
  it.each(errorCodes)('%s has a sentence for the person', (code) => {
    const { error } = new AppError(code, { say: { key: code, params: { minutes: 3, number: 2 } } }).toBody()
    expect(error.message).toMatch(/^[A-Z].+\.$/)
    expect(error.message).not.toContain('{{')
  })

  it('of a schema has one too', () => {
    const keys = keysInSchemas()
    expect(keys.length).toBeGreaterThan(10)
    expect(keys.filter((key) => !hasSentence(key))).toEqual([])
  })
})
