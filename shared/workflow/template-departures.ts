import { copiesOf, shapeArea } from '../geometry/shape'
import type { Marks } from '../schemas/marks'
import type { Face, FaceTemplate } from '../schemas/parts'
import type { Departure } from '../schemas/reviews'

/** Shares of the face by which leave-outs may differ: placing them by hand is no departure. */
const LEAVE_OUT_SHARE = 0.02
const EDGE_BAND_MM = 1e-6

/**
 * In what a reading's marks differ from the face as it is kept: its edge band in mm, and the share of the face that
 * its template leaves out. A face without a template says nothing of leave-outs, nor do marks without an outline.
 */
export function departuresFromFace(face: Pick<Face, 'edgeBandMm' | 'template'>, marks: Marks): Departure[] {
  const departures: Departure[] = []
  if (Math.abs(face.edgeBandMm - marks.edgeBandMm) > EDGE_BAND_MM) departures.push('edgeBand')
  const expected = face.template && shareLeftOut(face.template)
  const marked = shareLeftOut(marks)
  if (expected !== null && marked !== null && Math.abs(expected - marked) > LEAVE_OUT_SHARE) {
    departures.push('leaveOuts')
  }
  return departures
}

/** Area of the leave-outs over that of the outline; overlaps count twice. Null without an outline. */
export function shareLeftOut({
  outline,
  leaveOuts,
}: Pick<Marks, 'outline' | 'leaveOuts'> | FaceTemplate): number | null {
  if (!outline) return null
  const whole = shapeArea(outline)
  if (!(whole > 0)) return null
  return leaveOuts.flatMap(copiesOf).reduce((sum, shape) => sum + shapeArea(shape), 0) / whole
}
