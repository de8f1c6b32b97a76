import type { Actor } from '../auth/actor'
import type { AppContext } from '../context'
import { addRemark } from '../use-cases/reviews/add-remark'
import { agreeReading } from '../use-cases/reviews/agree-reading'
import { answerRemark } from '../use-cases/reviews/answer-remark'
import { closeRemark } from '../use-cases/reviews/close-remark'
import { sendBackReading } from '../use-cases/reviews/send-back-reading'
import { setAsideReading } from '../use-cases/reviews/set-aside-reading'

export interface DemoRemark {
  text: string
  place: { x: number; y: number }
}

/** What the second person made of a reading that was sent. */
export type DemoReview =
  | { kind: 'agreed'; remark?: DemoRemark & { answer: string } }
  | { kind: 'sentBack'; reason: string; remark: DemoRemark }
  | { kind: 'setAside'; cause: string }

/** The review as the reviewer goes through it; a remark before an agreement is answered by the taker and closed. */
export function reviewDemoReading(
  context: AppContext,
  { reviewer, taker }: { reviewer: Actor; taker: Actor },
  id: string,
  review: DemoReview,
): void {
  switch (review.kind) {
    case 'agreed':
      if (review.remark) settleRemark(context, { reviewer, taker }, id, review.remark)
      agreeReading(context, reviewer, id)
      return
    case 'sentBack':
      addRemark(context, reviewer, id, review.remark)
      sendBackReading(context, reviewer, id, review.reason)
      return
    case 'setAside':
      setAsideReading(context, reviewer, id, review.cause)
      return
    default:
      throw new Error(`No review ends so: ${review satisfies never}.`)
  }
}

function settleRemark(
  context: AppContext,
  { reviewer, taker }: { reviewer: Actor; taker: Actor },
  id: string,
  { text, place, answer }: DemoRemark & { answer: string },
): void {
  const [remark] = addRemark(context, reviewer, id, { text, place })
  answerRemark(context, taker, remark.id, answer)
  closeRemark(context, reviewer, remark.id)
}
