import { apiErrorSchema } from '@shared/schemas/errors'
import type { z } from 'zod'
import { ApiFailure } from './api-failure'
import { i18n } from './i18n'

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'

interface Options {
  body?: unknown
  signal?: AbortSignal
}

/** Asks for something below /api and parses the answer by its schema; throws ApiFailure with a sentence. */
export async function api<S extends z.ZodType>(
  method: Method,
  path: string,
  schema: S,
  options: Options = {},
): Promise<z.output<S>> {
  const response = await send(method, path, options)
  return schema.parse(await response.json())
}

/** The same for answers without content. */
export async function apiNothing(method: Method, path: string, options: Options = {}): Promise<void> {
  await send(method, path, options)
}

async function send(method: Method, path: string, { body, signal }: Options): Promise<Response> {
  const response = await fetch(`/api${path}`, {
    method,
    signal,
    headers: body === undefined ? undefined : { 'content-type': 'application/json' },
    body: body === undefined ? undefined : JSON.stringify(body),
  }).catch((cause: unknown) => {
    if (signal?.aborted) throw cause
    throw new ApiFailure({ code: 'unreachable', status: 0, message: i18n.t('common:unreachable') })
  })
  if (!response.ok) throw failureOf(response.status, await response.text())
  return response
}

/** Also for answers that didn't come by fetch, such as uploads. */
export function failureOf(status: number, text: string): ApiFailure {
  const parsed = apiErrorSchema.safeParse(parseJson(text))
  if (parsed.success) return new ApiFailure({ ...parsed.data.error, status })
  return new ApiFailure({ code: 'unclear', status, message: i18n.t('common:unclear', { status }) })
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return null
  }
}

/** `?a=1&b=2` of what is given; nothing for values that are empty. */
export function queryString(values: Readonly<Record<string, string | number | undefined | null>>): string {
  const pairs = Object.entries(values).filter(
    ([, value]) => value !== undefined && value !== null && value !== '',
  )
  if (pairs.length === 0) return ''
  return `?${new URLSearchParams(pairs.map(([key, value]) => [key, String(value)]))}`
}
