import { describe, expect, it } from 'vitest'
import {
  cancelGesture,
  canRedo,
  canUndo,
  change,
  closeGesture,
  during,
  redo,
  settledOf,
  startHistory,
  undo,
} from './marks-history'

const drag = (from: ReturnType<typeof startHistory<string>>, ...frames: string[]) =>
  frames.reduce((history, frame) => during(history, frame), from)

describe('history of marks', () => {
  it('makes one step of a whole gesture, however many frames it had', () => {
    const after = closeGesture(drag(startHistory('a'), 'b', 'c', 'd'))
    expect(after.present).toBe('d')
    expect(undo(after).present).toBe('a')
  })

  it('goes back to where the gesture began when it is cancelled, and leaves no step', () => {
    const after = cancelGesture(drag(startHistory('a'), 'b', 'c'))
    expect(after.present).toBe('a')
    expect(canUndo(after)).toBe(false)
  })

  it('keeps what can be redone when a gesture is cancelled', () => {
    const undone = undo(change(startHistory('a'), 'b'))
    const after = cancelGesture(drag(undone, 'x'))
    expect(canRedo(after)).toBe(true)
    expect(redo(after).present).toBe('b')
  })

  it('forgets what could be redone once something else is done', () => {
    const after = change(undo(change(startHistory('a'), 'b')), 'c')
    expect(canRedo(after)).toBe(false)
    expect(undo(after).present).toBe('a')
  })

  it('makes no step of a gesture that ends where it began', () => {
    expect(canUndo(closeGesture(drag(startHistory('a'), 'b', 'a')))).toBe(false)
  })

  it('undoes and redoes down to the first and up to the last step, and stays there', () => {
    const done = change(change(startHistory('a'), 'b'), 'c')
    const first = undo(undo(undo(done)))
    expect(first.present).toBe('a')
    expect(redo(redo(redo(first))).present).toBe('c')
  })

  it('gives what is settled while a gesture is open', () => {
    expect(settledOf(drag(startHistory('a'), 'b'))).toBe('a')
  })
})
