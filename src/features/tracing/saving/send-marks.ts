import { type SaveMarks, savedMarksSchema } from '@shared/schemas/readings'
import { z } from 'zod'
import { api } from '@/lib/api-client'
import { ApiFailure } from '@/lib/api-failure'
import type { SaveAnswer } from './autosave'

const staleDetailsSchema = z.object({
  currentVersion: z.number().int(),
  savedAt: z.string().nullable().catch(null),
  savedBy: z.string().nullable().catch(null),
})

/** One try at saving, told apart by what is to be done next. */
export async function sendMarks(readingId: string, save: SaveMarks): Promise<SaveAnswer> {
  try {
    const saved = await api('PUT', `/readings/${readingId}/marks`, savedMarksSchema, { body: save })
    return { kind: 'saved', saved }
  } catch (error) {
    if (!(error instanceof ApiFailure)) throw error
    const stale = error.code === 'staleMarks' ? staleDetailsSchema.safeParse(error.details) : null
    if (stale?.success) return { kind: 'stale', stale: stale.data }
    if (isPassing(error)) return { kind: 'unreachable' }
    return { kind: 'refused', message: error.message }
  }
}

/** The network away, or a server that is starting or overloaded: later it may well do. */
function isPassing({ status }: ApiFailure): boolean {
  return status === 0 || status === 429 || status >= 502
}
