import { type PartFrame, partFrame } from '@shared/geometry/part-frame'
import { toReadingInput } from '@shared/metrology'
import { emptyMarks, type Marks } from '@shared/schemas/marks'
import type { Circumstances } from './result/read-marks'

/** Photo pixels to the part's mm by the outline; null while there is none, or none that can be the face. */
export function partFrameOf(outline: Marks['outline'], circumstances: Circumstances): PartFrame | null {
  const input = circumstances && toReadingInput({ ...circumstances, marks: { ...emptyMarks(), outline } })
  if (!input) return null
  const { viewingAngleDeg } = input.setUp
  const frame = partFrame(input.outline, input.size, {
    viewingAngleDeg,
    photo: input.photo,
    mirrored: input.mirrored,
  })
  return 'problem' in frame ? null : frame
}
