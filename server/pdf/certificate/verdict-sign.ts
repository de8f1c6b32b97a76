import type { Verdict } from '@shared/schemas/results'
import { inks } from './inks'
import { circlePath, linePath } from './paths'
import type { Sheet } from './sheet'

const colours: Record<Verdict, string> = {
  conforms: inks.bottle,
  doesNotConform: inks.chestnut,
  neitherProven: inks.ink,
  noTolerance: inks.ink,
  noVerdict: inks.ink,
}

export function verdictInk(verdict: Verdict): string {
  return colours[verdict]
}

/** Filled round, open round or diamond: each verdict has a shape that survives grey print, none has none. */
export function drawVerdictSign(sheet: Sheet, x: number, y: number, radius: number, verdict: Verdict): void {
  switch (verdict) {
    case 'conforms':
      sheet.path(circlePath(x, y, radius), { fill: inks.bottle })
      break
    case 'neitherProven':
      sheet.path(circlePath(x, y, radius - 0.3), {
        fill: inks.paper,
        stroke: { colour: inks.ink, width: 1.3 },
      })
      break
    case 'doesNotConform': {
      const r = radius * 1.2
      sheet.path(
        linePath(
          [
            [x, y - r],
            [x + r, y],
            [x, y + r],
            [x - r, y],
          ],
          true,
        ),
        {
          fill: inks.chestnut,
        },
      )
      break
    }
    case 'noTolerance':
    case 'noVerdict':
      break
  }
}
