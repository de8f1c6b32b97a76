import type { Marks } from '@shared/schemas/marks'
import { type Circumstances, type MarksRead, readMarks } from './read-marks'

export interface ReadRequest {
  number: number
  marks: Marks
  circumstances: Circumstances
}

export interface ReadAnswer {
  number: number
  read: MarksRead | null
}

declare const self: DedicatedWorkerGlobalScope

self.addEventListener('message', ({ data }: MessageEvent<ReadRequest>) => {
  const answer: ReadAnswer = { number: data.number, read: tryToRead(data) }
  self.postMessage(answer)
})

/** Marks half way through a gesture may be anything; the next ones are read all the same. */
function tryToRead({ marks, circumstances }: ReadRequest): MarksRead | null {
  try {
    return readMarks(marks, circumstances)
  } catch (error) {
    console.error(error)
    return null
  }
}
