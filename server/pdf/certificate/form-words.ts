import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { formatNumber } from '@shared/units/height'
import { words as wordsOf } from '../../i18n'
import { figureWords } from './figure-words'
import { inks } from './inks'
import { pageWidth } from './paths'
import type { Sheet } from './sheet'
import { plainNumber, words } from './words'

const x = 446

/** The form in sentences; gives the lower end. */
export function drawFormWords(sheet: Sheet, top: number, snapshot: CertificateSnapshot): number {
  sheet.text(x, top, words('head.words'), sheet.style(9.8, 'semibold'))
  const style = sheet.style(10.4)
  const box = { x, y: top + 16 * sheet.density.text, width: pageWidth - x }
  const y = sheet.paragraph(box, formWords(snapshot), style, 1.36)
  const small = sheet.style(8.2, 'regular', inks.muted)
  return sheet.paragraph(
    { ...box, y: y + 7 * sheet.density.text + small.size },
    words('asPhotographed'),
    small,
  )
}

function formWords(snapshot: CertificateSnapshot): string {
  const { decimals } = figureWords(snapshot)
  return snapshot.figure.statements
    .map(({ code, params }) => words('statement', { text: wordsOf('form', code, shown(params, decimals)) }))
    .join(' ')
}

type Params = Readonly<Record<string, string | number>>

function shown(params: Params, decimals: number): Params {
  const entries = Object.entries(params).map(([name, value]): [string, string | number] => {
    if (typeof value !== 'number') return [name, value]
    if (name === 'heightUm') return ['height', words('height', { number: formatNumber(value, decimals) })]
    return name.endsWith('Mm') ? [name, plainNumber(value, 2)] : [name, value]
  })
  return Object.fromEntries(entries)
}
