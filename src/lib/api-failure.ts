/** What the server said when it couldn't do what was asked. `message` is a sentence for the person. */
export class ApiFailure extends Error {
  readonly code: string
  readonly status: number
  readonly fields: Readonly<Record<string, string>>
  readonly details: Readonly<Record<string, unknown>>

  constructor(failure: {
    code: string
    message: string
    status: number
    fields?: Record<string, string>
    details?: Record<string, unknown>
  }) {
    super(failure.message)
    this.name = 'ApiFailure'
    this.code = failure.code
    this.status = failure.status
    this.fields = failure.fields ?? {}
    this.details = failure.details ?? {}
  }
}

export function isApiFailure(error: unknown, code?: string): error is ApiFailure {
  return error instanceof ApiFailure && (code === undefined || error.code === code)
}
