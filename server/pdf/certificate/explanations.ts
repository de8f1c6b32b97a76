import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { howWords } from './how-words'
import type { Sheet } from './sheet'
import { uncertaintyWords } from './uncertainty-words'
import { words } from './words'

/** "How" beside "Uncertainty and rule"; gives the lower end. */
export function drawExplanations(sheet: Sheet, top: number, snapshot: CertificateSnapshot): number {
  const columns = [
    { x: 0, width: 262, head: words('head.how'), text: howWords(snapshot) },
    { x: 284, width: 260, head: words('head.uncertainty'), text: uncertaintyWords(snapshot) },
  ]
  const body = sheet.style(8.9)
  const ends = columns.map(({ x, width, head, text }) => {
    sheet.text(x, top, head, sheet.style(9.8, 'semibold'))
    return sheet.paragraph({ x, y: top + 4.5 * sheet.density.text + body.size, width }, text, body, 1.27)
  })
  return Math.max(...ends)
}
