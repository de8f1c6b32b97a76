import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { FaceSizes } from '@shared/schemas/parts'
import { inks } from './inks'
import type { Sheet } from './sheet'
import { dayWords, onOneLine, plainNumber, words } from './words'

const columns = [
  { x: 0, width: 148 },
  { x: 158, width: 134 },
  { x: 302, width: 130 },
  { x: 442, width: 102 },
] as const

/** What was measured, when and for whom: two rows of four; gives the lower end. */
export function drawItemGrid(sheet: Sheet, top: number, snapshot: CertificateSnapshot): number {
  let y = top
  for (const row of rowsOf(snapshot)) {
    const label = sheet.style(8.2, 'regular', inks.muted)
    const value = sheet.style(9.2)
    const lineGap = value.size * 1.24
    const ends = row.map(([name, text], i) => {
      const { x, width } = columns[i]
      sheet.text(x, y, words(`item.${name}`), label)
      return sheet.paragraph({ x, y: y + lineGap, width }, text, value, 1.2)
    })
    y = Math.max(...ends) + sheet.gap(17.5)
  }
  return y - sheet.gap(17.5)
}

function rowsOf(snapshot: CertificateSnapshot): [string, string][][] {
  const { issuedTo, part, piece, face, received, readingNumber } = snapshot
  const notStated = words('notStated')
  return [
    [
      ['issuedTo', joined([issuedTo.name, onOneLine(issuedTo.address)])],
      ['item', joined([[part.name, part.number, part.revision].filter(Boolean).join(' '), part.material])],
      [
        'serial',
        piece.lotNumber ? words('item.inLot', { serial: piece.serial, lot: piece.lotNumber }) : piece.serial,
      ],
      ['order', piece.order || notStated],
    ],
    [
      ['face', joined([face.name, sizeWords(face.size)])],
      ['received', received || notStated],
      ['measured', words('item.reading', { day: dayWords(snapshot.measured.at), number: readingNumber })],
      ['issued', dayWords(snapshot.issued.at)],
    ],
  ]
}

function sizeWords(size: FaceSizes): string {
  switch (size.shape) {
    case 'disc':
      return words('size.disc', { diameter: plainNumber(size.diameterMm, 5) })
    case 'annulus':
      return words('size.annulus', {
        diameter: plainNumber(size.diameterMm, 5),
        bore: plainNumber(size.boreMm, 5),
      })
    case 'block':
      return words('size.block', {
        width: plainNumber(size.widthMm, 5),
        height: plainNumber(size.heightMm, 5),
      })
    case 'free':
      return words('size.free', { longest: plainNumber(size.longestSideMm, 5) })
  }
}

function joined(parts: readonly string[]): string {
  return parts.filter((part) => part !== '').join(', ')
}
