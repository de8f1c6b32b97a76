import { graduations, type RuleScale, ruleScale, stepDecimals } from '@shared/look/rule-scale'
import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { Verdict } from '@shared/schemas/results'
import { formatNumber } from '@shared/units/height'
import { limitNumber } from './figure-words'
import { inks } from './inks'
import { hatchPath, linePath, rectPath } from './paths'
import type { Sheet } from './sheet'
import { drawVerdictSign, verdictInk } from './verdict-sign'

/** The screen's full rule, four fifths as large. */
const width = 318
const bar = 4
const whiskerAbove = 15
const cap = 7.2
const head = 3.7
const major = 5.6
const minor = 3.2
const labelBelow = 18.5
/** Figures nearer than this to a gate's own would run into it. */
const labelClear = 22

interface Rule {
  sheet: Sheet
  scale: RuleScale
  /** Of the base line. */
  y: number
  resultUm: number
  uUm: number
  guardUm: number
  verdict: Verdict
}

/** Zone, guard bands, gates, graduations and the result; gives the baseline of its figures. */
export function drawToleranceRule(sheet: Sheet, y: number, snapshot: CertificateSnapshot): number {
  const { face, figure, guardBandUm, verdict } = snapshot
  const resultUm = comparedUm(snapshot)
  const rule: Rule = {
    sheet,
    scale: ruleScale(face.tolerance, resultUm, width),
    y,
    resultUm,
    uUm: figure.expandedUncertaintyUm,
    guardUm: guardBandUm ?? 0,
    verdict,
  }
  drawBar(rule)
  drawGraduations(rule)
  drawGates(rule)
  drawResult(rule)
  return y + labelBelow
}

/** The flatness; for a signed tolerance with the sign of the sagitta, plus where none is known. */
function comparedUm({ face, figure, flatnessUm }: CertificateSnapshot): number {
  const { sagittaUm } = figure.terms
  const isHollow = face.tolerance.kind === 'signed' && sagittaUm !== null && sagittaUm < 0
  return isHollow ? -flatnessUm : flatnessUm
}

type Stretch = readonly [from: number, to: number]

function stretch({ scale }: Rule, fromUm: number, toUm: number): Stretch {
  const within = (x: number) => Math.min(width, Math.max(0, x))
  return [within(scale.toX(fromUm)), within(scale.toX(toUm))]
}

function drawBar(rule: Rule): void {
  const { sheet, scale, guardUm, y } = rule
  const zone = zoneOf(rule)
  if (zone) fillBar(rule, zone, inks.zone)
  if (guardUm > 0) {
    for (const gateUm of scale.gatesUm) {
      const [from, to] = stretch(rule, gateUm - guardUm, gateUm + guardUm)
      const box = [from, y - bar, to - from, bar] as const
      sheet.path(hatchPath(...box, 2.4), {
        stroke: { colour: inks.ink, width: 0.8 },
        clip: rectPath(...box),
      })
    }
  }
  const beyond = beyondOf(rule)
  if (!beyond) return
  fillBar(rule, beyond, inks.chestnut)
  if (isOffScale(rule)) drawBreak(rule, (beyond[0] + beyond[1]) / 2)
}

function zoneOf(rule: Rule): Stretch | null {
  const [first, second] = rule.scale.gatesUm
  const { guardUm } = rule
  if (first === undefined) return null
  if (second === undefined) return first > guardUm ? stretch(rule, 0, first - guardUm) : null
  return first + guardUm < second - guardUm ? stretch(rule, first + guardUm, second - guardUm) : null
}

/** From the limit that is passed to the result. */
function beyondOf(rule: Rule): Stretch | null {
  const { resultUm, verdict } = rule
  const low = rule.scale.gatesUm[0]
  const high = rule.scale.gatesUm.at(-1)
  if (verdict !== 'doesNotConform' || low === undefined || high === undefined) return null
  if (resultUm > high) return stretch(rule, high, resultUm)
  return resultUm < low ? stretch(rule, resultUm, low) : null
}

function isOffScale({ scale, resultUm }: Rule): boolean {
  return resultUm > scale.mostUm || resultUm < scale.leastUm
}

function fillBar({ sheet, y }: Rule, [from, to]: Stretch, fill: string): void {
  if (to > from) sheet.path(rectPath(from, y - bar, to - from, bar), { fill })
}

/** Two slants that say: the bar is longer than is drawn. */
function drawBreak({ sheet, y }: Rule, x: number): void {
  const top = y - bar - 2.4
  const foot = y + 2.4
  sheet.path(
    linePath(
      [
        [x - 2, foot],
        [x + 0.5, top],
        [x + 4.5, top],
        [x + 2, foot],
      ],
      true,
    ),
    { fill: inks.paper },
  )
  const stroke = { colour: inks.chestnut, width: 1 }
  sheet.line(x - 2, foot, x + 0.5, top, stroke)
  sheet.line(x + 2, foot, x + 4.5, top, stroke)
}

function drawGraduations({ sheet, scale, y }: Rule): void {
  const stroke = { colour: inks.graduation, width: 0.7 }
  const marks = graduations(scale.leastUm, scale.mostUm, width)
  sheet.line(0, y, width, y, stroke)
  for (const mark of marks) {
    const x = scale.toX(mark.value)
    sheet.line(x, y, x, y + (mark.major ? major : minor), stroke)
  }
  const labelled = marks.filter((mark) => mark.major)
  const step = labelled.length > 1 ? labelled[1].value - labelled[0].value : 1
  const style = sheet.style(8.2, 'regular', inks.muted)
  for (const { value } of labelled) {
    const x = scale.toX(value)
    if (scale.gatesUm.some((gateUm) => Math.abs(scale.toX(gateUm) - x) < labelClear)) continue
    const text = Math.abs(value) < step / 2 ? '0' : formatNumber(value, stepDecimals(step))
    const anchor = x < 6 ? 'start' : x > width - 6 ? 'end' : 'middle'
    sheet.text(x, y + labelBelow, text, style, anchor)
  }
}

function drawGates({ sheet, scale, y }: Rule): void {
  const style = sheet.style(9.2, 'semibold')
  for (const gateUm of scale.gatesUm) {
    const x = scale.toX(gateUm)
    sheet.line(x, y - bar - 6, x, y + 9, { colour: inks.ink, width: 1.3 })
    sheet.text(x, y + labelBelow, limitNumber(gateUm), style, 'middle')
  }
}

/** Stem, whisker and head at the result; off the scale a chevron at the end, and the diamond before it. */
function drawResult(rule: Rule): void {
  const { sheet, scale, y, verdict } = rule
  const x = scale.toX(rule.resultUm)
  const top = y - whiskerAbove
  const colour = verdictInk(verdict)
  if (isOffScale(rule)) {
    const tip = x > width ? width - 1 : 1
    const back = x > width ? -head * 1.3 : head * 1.3
    sheet.path(
      linePath([
        [tip + back, top - head * 0.9],
        [tip, top],
        [tip + back, top + head * 0.9],
      ]),
      {
        stroke: { colour, width: 1.3 },
      },
    )
    drawVerdictSign(sheet, tip + back * 2.6, top, head, verdict)
    return
  }
  sheet.line(x, y, x, top, { colour, width: 1.8 })
  drawWhisker(rule, top, colour)
  drawVerdictSign(sheet, x, top, head, verdict)
}

function drawWhisker(rule: Rule, y: number, colour: string): void {
  const { sheet, scale, resultUm, uUm } = rule
  const stroke = { colour, width: 1.1 }
  const [from, to] = stretch(rule, resultUm - uUm, resultUm + uUm)
  sheet.line(from, y, to, y, stroke)
  // A whisker that runs off the scale has no cap there.
  if (resultUm - uUm >= scale.leastUm) sheet.line(from, y - cap / 2, from, y + cap / 2, stroke)
  if (resultUm + uUm <= scale.mostUm) sheet.line(to, y - cap / 2, to, y + cap / 2, stroke)
}
