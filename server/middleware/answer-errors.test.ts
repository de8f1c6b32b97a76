import express from 'express'
import supertest from 'supertest'
import { describe, expect, it } from 'vitest'
import { AppError } from '../errors'
import { createLogger } from '../logger'
import { answerErrors } from './answer-errors'

/** What a caller is told when a route throws this. */
function answerTo(thrown: unknown) {
  const app = express()
  app.get('/', () => {
    throw thrown
  })
  app.use(answerErrors(createLogger({ logLevel: 'silent' })))
  return supertest(app).get('/')
}

describe('whatever is thrown', () => {
  it('is told as its sentence, by field, when it is a refusal', async () => {
    const say = { key: 'part.number.takenWithRevision', params: { number: 'VC-60', revision: 'B' } }
    const { status, body } = await answerTo(new AppError('alreadyThere', { say, fields: { number: say } }))
    expect(status).toBe(409)
    expect(body.error).toEqual({
      code: 'alreadyThere',
      message: 'There is already a part VC-60 revision B.',
      fields: { number: 'There is already a part VC-60 revision B.' },
    })
  })

  it('tells nothing of the inside when it is a fault', async () => {
    const { status, body, text } = await answerTo(new Error('SELECT password_hash FROM people failed'))
    expect(status).toBe(500)
    expect(body.error.code).toBe('internal')
    expect(text).not.toMatch(/SELECT|people|\.ts/)
  })

  it('hands on what the caller needs to go on, and when to try again', async () => {
    const stale = await answerTo(new AppError('staleMarks', { details: { currentVersion: 4 } }))
    expect(stale.body.error.details).toEqual({ currentVersion: 4 })
    const waiting = await answerTo(new AppError('busy', { retryAfterS: 30 }))
    expect(waiting.headers['retry-after']).toBe('30')
  })
})
