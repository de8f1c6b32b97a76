import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { DecisionRule } from '@shared/schemas/parts'
import { figureWords, limitNumber, typedElsewise } from './figure-words'
import { inks } from './inks'
import { drawOtherFigures } from './other-figures'
import type { Sheet } from './sheet'
import { drawToleranceRule } from './tolerance-rule'
import { drawVerdictSign, verdictInk } from './verdict-sign'
import { plainNumber, words } from './words'

const width = 344

/** The figure, its rule and its verdict on the left, all other figures on the right; gives the lower end. */
export function drawResult(sheet: Sheet, top: number, snapshot: CertificateSnapshot): number {
  const leftY = drawFigure(sheet, top, snapshot)
  return Math.max(leftY, drawOtherFigures(sheet, top, snapshot))
}

function drawFigure(sheet: Sheet, top: number, snapshot: CertificateSnapshot): number {
  const { face } = snapshot
  sheet.text(0, top, words(`head.flatness.${face.reference}`), sheet.style(9.8, 'semibold'))
  const figureY = top + 34 + sheet.gap(8)
  drawLargeFigure(sheet, figureY, snapshot)
  const rulesY = drawToleranceRule(sheet, figureY + 21 + sheet.gap(16), snapshot)
  return drawVerdict(sheet, rulesY + sheet.gap(16), snapshot)
}

function drawLargeFigure(sheet: Sheet, y: number, snapshot: CertificateSnapshot): void {
  const { value, u } = figureWords(snapshot)
  const large = { size: 42, weight: 'light', colour: inks.ink } as const
  const beside = { size: 17.5, weight: 'regular', colour: inks.ink } as const
  const unit = { size: 17.5, weight: 'light', colour: inks.muted } as const
  const uX = sheet.widthOf(value, large) + 6
  sheet.text(0, y, value, large)
  sheet.text(uX, y, u, beside)
  sheet.text(uX + sheet.widthOf(u, beside) + 5.5, y, 'µm', unit)
}

/** In words first, then by which tolerance and rule. */
function drawVerdict(sheet: Sheet, y: number, snapshot: CertificateSnapshot): number {
  const { verdict } = snapshot
  const rest = sheet.style(11)
  const lead = { ...rest, weight: 'semibold', colour: verdictInk(verdict) } as const
  const isShown = verdict !== 'noTolerance' && verdict !== 'noVerdict'
  if (isShown) drawVerdictSign(sheet, 5, y - rest.size * 0.33, 3.8, verdict)
  const x = isShown ? 16 : 0
  const spans = [
    { text: words(`verdict.${verdict}.lead`), style: lead },
    { text: words(`verdict.${verdict}.rest`, verdictParams(snapshot)), style: rest },
  ]
  return sheet.paragraph({ x, y, width: width - x }, spans, rest, 1.2)
}

function verdictParams({ face, figure }: CertificateSnapshot): Record<string, string> {
  return {
    tolerance: toleranceWords(face.tolerance),
    guard: guardWords(face.rule),
    percent: plainNumber(100 * figure.supportedShare, 2),
  }
}

function toleranceWords(tolerance: CertificateSnapshot['face']['tolerance']): string {
  switch (tolerance.kind) {
    case 'none':
      return ''
    case 'plain': {
      const typed = typedElsewise(tolerance.max.typed)
      const words_ = words('tolerance.plain', { max: limitNumber(tolerance.max.valueUm) })
      return typed ? words('tolerance.asTyped', { tolerance: words_, typed }) : words_
    }
    case 'signed':
      return words('tolerance.signed', {
        least: limitNumber(tolerance.least.valueUm, true),
        most: limitNumber(tolerance.most.valueUm, true),
      })
  }
}

/** "guard band U", "guard band 0.825 U" or "simple acceptance". */
function guardWords({ guardFactor }: DecisionRule): string {
  if (guardFactor === 0) return words('guard.none')
  return guardFactor === 1 ? words('guard.whole') : words('guard.share', { factor: plainNumber(guardFactor) })
}
