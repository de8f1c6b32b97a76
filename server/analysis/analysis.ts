import { existsSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import type { TracedReading } from '@shared/metrology'
import { Piscina } from 'piscina'
import { AppError } from '../errors'
import type { ComputedOutcome } from './compute-outcome'

export type { ComputedOutcome }

/** Computes figures in threads, so that the server answers meanwhile. */
export interface Analysis {
  readTraces(reading: TracedReading): Promise<ComputedOutcome>
  /** Lets go of the threads; work that is under way is given up. */
  close(): Promise<void>
}

const longestMs = 60_000
const idleMs = 30_000
const mostWaiting = 200

/** Threads start with the first figure, and end when there was none for a while. */
export function createAnalysis({ threads }: { threads: number }): Analysis {
  let pool: Piscina<TracedReading, ComputedOutcome> | undefined
  const started = () => {
    pool ??= new Piscina({
      ...workerFile(),
      minThreads: 0,
      maxThreads: threads,
      idleTimeout: idleMs,
      maxQueue: mostWaiting,
    })
    return pool
  }
  return {
    readTraces: (reading) => runIn(started(), reading),
    close: async () => {
      await pool?.destroy()
      pool = undefined
    },
  }
}

async function runIn(
  pool: Piscina<TracedReading, ComputedOutcome>,
  reading: TracedReading,
): Promise<ComputedOutcome> {
  try {
    return await pool.run(reading, { signal: AbortSignal.timeout(longestMs) })
  } catch (error) {
    if (isOverload(error)) throw new AppError('busy', { log: error.message, retryAfterS: 60 })
    throw error
  }
}

function isOverload(error: unknown): error is Error {
  if (!(error instanceof Error)) return false
  return error.name === 'AbortError' || error.message === 'Task queue is at limit'
}

/** Beside the bundle the worker is a file of its own; from source it needs what runs TypeScript. */
function workerFile(): { filename: string; execArgv?: string[] } {
  const built = fileURLToPath(new URL('./analysis/worker.js', import.meta.url))
  if (existsSync(built)) return { filename: built }
  const source = fileURLToPath(new URL('./worker.ts', import.meta.url))
  return { filename: source, execArgv: ['--import', 'tsx'] }
}
