import { z } from 'zod'

export const readingStateSchema = z.enum([
  'draft',
  'sentForReview',
  'sentBack',
  'agreed',
  'certified',
  'setAside',
])
export type ReadingState = z.infer<typeof readingStateSchema>

const legalMoves: Record<ReadingState, readonly ReadingState[]> = {
  draft: ['sentForReview', 'setAside'],
  sentForReview: ['sentBack', 'agreed', 'setAside'],
  sentBack: ['draft', 'setAside'],
  agreed: ['certified', 'setAside'],
  certified: [],
  setAside: [],
}

/** Whether a reading may go from one state to the other. */
export function mayMove(from: ReadingState, to: ReadingState): boolean {
  return legalMoves[from].includes(to)
}

/** Marks, set-up and photographs may be changed in these states only. */
export function isEditable(state: ReadingState): boolean {
  return state === 'draft' || state === 'sentBack'
}
