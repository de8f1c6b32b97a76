import type { ApiError } from '@shared/schemas/errors'
import { type SentenceParams, sentence } from './i18n'

/** Every way to refuse, with its HTTP status. The sentence stands in the locale files under the same key. */
const statusOf = {
  invalidInput: 400,
  notSignedIn: 401,
  badCredentials: 401,
  notAllowed: 403,
  notYours: 403,
  crossOrigin: 403,
  plainNetwork: 403,
  notFound: 404,
  alreadyThere: 409,
  staleMarks: 409,
  notEditable: 409,
  illegalMove: 409,
  figureMissing: 409,
  ownReading: 409,
  remarksOpen: 409,
  remarkClosed: 409,
  nothingToDispose: 409,
  agreedAlone: 409,
  readingsDisagree: 409,
  alreadyCertified: 409,
  notAgreed: 409,
  countsNoMore: 409,
  certificateEnded: 409,
  photographMissing: 500,
  lastAdministrator: 409,
  ownDeactivation: 409,
  tooLarge: 413,
  tooManyPixels: 413,
  wrongFileType: 415,
  brokenFile: 422,
  tooManyAttempts: 429,
  internal: 500,
  busy: 503,
} as const satisfies Record<string, number>
export type ErrorCode = keyof typeof statusOf
export const errorCodes = Object.keys(statusOf) as ErrorCode[]

interface Sentence {
  key: string
  params?: SentenceParams
}

export interface AppErrorOptions {
  /** Sentence to say; the code's own when not given. */
  say?: Sentence
  /** Sentences by the field at fault. */
  fields?: Readonly<Record<string, Sentence>>
  details?: Record<string, unknown>
  /** For the log only. */
  log?: string
  /** Sent as Retry-After. */
  retryAfterS?: number
}

/** A refusal that a person is told about. Anything else that is thrown is a fault, answered as `internal`. */
export class AppError extends Error {
  readonly code: ErrorCode
  readonly options: AppErrorOptions

  constructor(code: ErrorCode, options: AppErrorOptions = {}) {
    super(options.log ?? options.say?.key ?? code)
    this.name = 'AppError'
    this.code = code
    this.options = options
  }

  get status(): number {
    return statusOf[this.code]
  }

  toBody(): ApiError {
    const { say, fields, details } = this.options
    return {
      error: {
        code: this.code,
        message: sentence(say?.key ?? this.code, say?.params),
        fields: fields && mapValues(fields, (field) => sentence(field.key, field.params)),
        details,
      },
    }
  }
}

/** A clash of unique names: the sentence is the answer's and the field's. */
export function alreadyThere(field: string, say: Sentence): AppError {
  return new AppError('alreadyThere', { say, fields: { [field]: say } })
}

/** A thing that was asked for by its id and isn't there. `thing` is a key under `notFoundThing`. */
export function notFound(thing: string): AppError {
  return new AppError('notFound', { say: { key: `notFoundThing.${thing}` } })
}

/** A field that no schema could judge, because it takes the database to know. */
export function invalidField(field: string, say: Sentence): AppError {
  return new AppError('invalidInput', { say, fields: { [field]: say } })
}

function mapValues<T, U>(record: Readonly<Record<string, T>>, map: (value: T) => U): Record<string, U> {
  return Object.fromEntries(Object.entries(record).map(([key, value]) => [key, map(value)]))
}
