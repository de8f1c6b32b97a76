/**
 * Undo and redo over plain data. While a gesture is open, `present` follows the hand and `snapshot` keeps what
 * was there before it; closing the gesture makes one step of it, cancelling goes back to the snapshot.
 */
export interface History<T> {
  past: readonly T[]
  present: T
  future: readonly T[]
  snapshot: T | null
}

/** Steps that are kept; older ones are forgotten. */
const longest = 500

export function startHistory<T>(present: T): History<T> {
  return { past: [], present, future: [], snapshot: null }
}

/** What the hand makes of it now; opens a gesture if none is open. */
export function during<T>(history: History<T>, next: T): History<T> {
  if (Object.is(next, history.present)) return history
  return { ...history, present: next, snapshot: history.snapshot ?? history.present }
}

/** Ends the gesture; one step, or none where nothing changed. */
export function closeGesture<T>(history: History<T>): History<T> {
  const { snapshot, present } = history
  if (snapshot === null) return history
  if (Object.is(snapshot, present)) return { ...history, snapshot: null }
  return { past: [...history.past, snapshot].slice(-longest), present, future: [], snapshot: null }
}

export function cancelGesture<T>(history: History<T>): History<T> {
  if (history.snapshot === null) return history
  return { ...history, present: history.snapshot, snapshot: null }
}

/** One change that is a step of its own. */
export function change<T>(history: History<T>, next: T): History<T> {
  return closeGesture(during(closeGesture(history), next))
}

export function canUndo<T>(history: History<T>): boolean {
  return history.past.length > 0
}

export function canRedo<T>(history: History<T>): boolean {
  return history.future.length > 0
}

export function undo<T>(history: History<T>): History<T> {
  const settled = cancelGesture(history)
  const last = settled.past.at(-1)
  if (last === undefined) return settled
  return {
    past: settled.past.slice(0, -1),
    present: last,
    future: [settled.present, ...settled.future],
    snapshot: null,
  }
}

export function redo<T>(history: History<T>): History<T> {
  const settled = cancelGesture(history)
  const [next, ...future] = settled.future
  if (next === undefined) return settled
  return { past: [...settled.past, settled.present], present: next, future, snapshot: null }
}

/** What is kept for good: without the gesture that is still open. */
export function settledOf<T>(history: History<T>): T {
  return history.snapshot ?? history.present
}
