import { describe, expect, it } from 'vitest'
import { readEnv } from './env'

describe('the environment', () => {
  it('needs nothing said', () => {
    expect(readEnv({})).toMatchObject({
      nodeEnv: 'production',
      port: 3000,
      host: undefined,
      tls: 'off',
      demo: true,
    })
    expect(readEnv({ PORT: '', LAPWING_DEMO: '' })).toMatchObject({ port: 3000, demo: true })
  })

  it('keeps the database in the folder of the data', () => {
    const { dataDir, databaseFile } = readEnv({ LAPWING_DATA: '/srv/lapwing' })
    expect(dataDir).toBe('/srv/lapwing')
    expect(databaseFile).toBe('/srv/lapwing/lapwing.sqlite')
  })

  it.each([
    ['PORT', 'abc', 'PORT must be a whole number from 0 to 65535; it is "abc".'],
    ['PORT', '70000', 'PORT must be a whole number from 0 to 65535; it is "70000".'],
    ['NODE_ENV', 'prod', 'NODE_ENV must be production, development or test; it is "prod".'],
    ['LAPWING_TLS', 'yes', 'LAPWING_TLS must be off, direct or proxy; it is "yes".'],
    ['LAPWING_DEMO', '1', 'LAPWING_DEMO must be on or off; it is "1".'],
    ['LAPWING_LOG', 'loud', 'LAPWING_LOG must be silent, error, warn, info or debug; it is "loud".'],
    ['LAPWING_THREADS', '0', 'LAPWING_THREADS must be a whole number from 1 to 64; it is "0".'],
  ])('names %s when it is wrong', (name, value, sentence) => {
    expect(() => readEnv({ [name]: value })).toThrow(sentence)
  })

  it('asks for certificate and key when it is to speak TLS itself', () => {
    expect(() => readEnv({ LAPWING_TLS: 'direct' })).toThrow(
      'LAPWING_TLS_CERT must name a file when LAPWING_TLS is direct.\n' +
        'LAPWING_TLS_KEY must name a file when LAPWING_TLS is direct.',
    )
  })
})
