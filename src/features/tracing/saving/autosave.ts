import type { Marks } from '@shared/schemas/marks'
import type { SavedMarks, SaveMarks } from '@shared/schemas/readings'

export interface StaleSave {
  currentVersion: number
  savedAt: string | null
  savedBy: string | null
}

export type SaveState =
  | { kind: 'saved'; savedAt: string | null }
  | { kind: 'saving' }
  /** The network is away; it is tried again. The copy in this browser holds what isn't saved. */
  | { kind: 'offline' }
  /** Somebody saved meanwhile: nothing is sent until a person has chosen. */
  | { kind: 'stale'; stale: StaleSave }
  /** The server will not have it, and says why. */
  | { kind: 'refused'; message: string }

/** What became of one try. */
export type SaveAnswer =
  | { kind: 'saved'; saved: SavedMarks }
  | { kind: 'unreachable' }
  | { kind: 'stale'; stale: StaleSave }
  | { kind: 'refused'; message: string }

/** Holds unsaved marks beside the server until they are acknowledged. */
export interface CopyHere {
  keep: (unsaved: SaveMarks) => void
  forget: () => void
}

export interface AutosaveParts {
  version: number
  send: (save: SaveMarks) => Promise<SaveAnswer>
  copyHere: CopyHere
  onState: (state: SaveState) => void
}

export interface Autosave {
  /** The marks as they are now; sent after a short pause, the latest only. */
  changed: (marks: Marks) => void
  /** Sends what is waiting at once; true when all is saved. */
  flush: () => Promise<boolean>
  /** After a stale save: from now on based on this version. `marks` are saved over it, null if theirs are taken. */
  resolve: (version: number, savedAt: string | null, marks: Marks | null) => void
  version: () => number
  stop: () => void
}

const pauseMs = 600
const firstRetryMs = 1_000
const longestRetryMs = 30_000

/** One save in flight at a time, the latest marks win, and nothing is forgotten before the server has it. */
export function startAutosave({ send, copyHere, onState, ...start }: AutosaveParts): Autosave {
  let { version } = start
  let waiting: Marks | null = null
  let inFlight: Promise<void> | null = null
  let timer: ReturnType<typeof setTimeout> | null = null
  let retryMs = firstRetryMs
  let halted = false

  const schedule = (ms: number) => {
    if (timer) clearTimeout(timer)
    timer = setTimeout(() => void begin(), ms)
  }

  const begin = (): Promise<void> => {
    if (timer) clearTimeout(timer)
    timer = null
    if (inFlight) return inFlight
    if (waiting === null || halted) return Promise.resolve()
    const marks = waiting
    onState({ kind: 'saving' })
    inFlight = send({ basedOnVersion: version, marks })
      .then((answer) => {
        inFlight = null
        settle(answer, marks)
      })
      .catch((error: unknown) => {
        inFlight = null
        settle({ kind: 'refused', message: error instanceof Error ? error.message : String(error) }, marks)
      })
    return inFlight
  }

  const settle = (answer: SaveAnswer, marks: Marks) => {
    switch (answer.kind) {
      case 'saved':
        version = answer.saved.marksVersion
        retryMs = firstRetryMs
        if (waiting === marks) {
          waiting = null
          copyHere.forget()
          onState({ kind: 'saved', savedAt: answer.saved.savedAt })
        } else {
          if (waiting) copyHere.keep({ basedOnVersion: version, marks: waiting })
          schedule(0)
        }
        return
      case 'unreachable':
        onState({ kind: 'offline' })
        schedule(retryMs)
        retryMs = Math.min(longestRetryMs, retryMs * 2)
        return
      case 'stale':
        halted = true
        onState({ kind: 'stale', stale: answer.stale })
        return
      case 'refused':
        onState({ kind: 'refused', message: answer.message })
        return
    }
  }

  return {
    changed: (marks) => {
      waiting = marks
      copyHere.keep({ basedOnVersion: version, marks })
      if (!halted && !inFlight) schedule(pauseMs)
    },
    flush: async () => {
      for (let tries = 0; tries < 3 && waiting !== null && !halted; tries += 1) await begin()
      return waiting === null
    },
    resolve: (current, savedAt, marks) => {
      halted = false
      version = current
      waiting = marks
      if (marks) {
        copyHere.keep({ basedOnVersion: version, marks })
        schedule(0)
      } else {
        copyHere.forget()
        onState({ kind: 'saved', savedAt })
      }
    },
    version: () => version,
    stop: () => {
      if (timer) clearTimeout(timer)
      timer = null
    },
  }
}
