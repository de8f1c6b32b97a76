import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { drawCheckSquares } from './check-squares'
import { inks } from './inks'
import { pageWidth } from './paths'
import type { Sheet } from './sheet'
import { dayWords, timeWords, words } from './words'

const squares = 58
const signerColumns = [0, 155, 310] as const
const signerWidth = 140

/** Signers, the code to scan and the foot lines, from a top edge down; gives the lower end. */
export function drawFoot(sheet: Sheet, top: number, snapshot: CertificateSnapshot): number {
  sheet.line(0, top, pageWidth, top, { colour: inks.graduation, width: 0.8 })
  const signersY = drawSigners(sheet, top + 30 + sheet.gap(13), snapshot)
  drawCheckSquares(sheet, { x: pageWidth - squares, y: top + 12, size: squares }, snapshot.checkUrl)
  return drawFootLines(sheet, Math.max(signersY, top + 12 + squares) + 14, snapshot)
}

function drawSigners(
  sheet: Sheet,
  y: number,
  { measured, agreed, issued, onePersonShop }: CertificateSnapshot,
): number {
  const name = sheet.style(9.2, 'semibold')
  const role = sheet.style(8.9, 'regular', inks.muted)
  const signers = [
    { ...measured, role: words('signer.measured', { when: dayWords(measured.at) }) },
    { ...agreed, role: words('signer.agreed', { when: dayWords(agreed.at) }) },
    { ...issued, role: words('signer.issued', { when: timeWords(issued.at) }) },
  ]
  const ends = signers.map((signer, i) => {
    const x = signerColumns[i]
    sheet.line(x, y, x + signerWidth, y, { colour: inks.ink, width: 1 })
    const nameY = sheet.paragraph({ x, y: y + 3 + name.size, width: signerWidth }, signer.name, name, 1.15)
    return sheet.paragraph(
      { x, y: nameY + 12 * sheet.density.text, width: signerWidth },
      signer.role,
      role,
      1.15,
    )
  })
  const end = Math.max(...ends)
  if (!onePersonShop) return end
  const box = { x: 0, y: end + 13 * sheet.density.text, width: signerColumns[2] + signerWidth }
  return sheet.paragraph(box, words('onePersonShop'), sheet.style(8.9))
}

/** On one line where both fit beside one another, else one under the other. */
function drawFootLines(sheet: Sheet, y: number, { checkUrl, checkCode }: CertificateSnapshot): number {
  const style = sheet.style(8.2, 'regular', inks.muted)
  const strong = { ...style, weight: 'semibold', colour: inks.ink } as const
  const scope = words('foot.scope')
  const check = words('foot.check', { address: checkAddress(checkUrl, checkCode) })
  const codeWidth = sheet.widthOf(checkCode, strong) + 3
  const isWide = sheet.widthOf(scope, style) + sheet.widthOf(check, style) + codeWidth + 14 > pageWidth
  const checkStyle = sheet.fitted(check, style, pageWidth - codeWidth)
  sheet.text(0, y, scope, style)
  const checkY = isWide ? y + 11 : y
  sheet.text(pageWidth - codeWidth, checkY, check, checkStyle, 'end')
  sheet.text(pageWidth, checkY, checkCode, strong, 'end')
  return checkY
}

/** Where the code may be typed: without protocol and code. */
function checkAddress(checkUrl: string, checkCode: string): string {
  return checkUrl.replace(/^https?:\/\//, '').replace(`/${checkCode}`, '')
}
