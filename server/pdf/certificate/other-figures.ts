import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { formatNumber, roundParts } from '@shared/units/height'
import { figureWords } from './figure-words'
import { inks } from './inks'
import { pageWidth } from './paths'
import type { Sheet } from './sheet'
import { words } from './words'

const x = 352

/** Figures beside the one that counts, in a column of their own; gives the lower end. */
export function drawOtherFigures(sheet: Sheet, top: number, snapshot: CertificateSnapshot): number {
  sheet.text(x, top, words('head.otherFigures'), sheet.style(9.8, 'semibold'))
  const style = sheet.style(9.2)
  const rowHeight = 7 * sheet.density.text + sheet.gap(9.4)
  let y = top + 9.5 * sheet.density.text
  for (const [name, value] of rowsOf(snapshot)) {
    sheet.line(x, y, pageWidth, y, { colour: inks.hairline, width: 0.6 })
    const baseline = y + rowHeight - sheet.gap(5)
    const valueWidth = sheet.widthOf(value, style)
    sheet.text(x, baseline, name, sheet.fitted(name, style, pageWidth - x - valueWidth - 6))
    sheet.text(pageWidth, baseline, value, style, 'end')
    y += rowHeight
  }
  return y - sheet.gap(5)
}

function rowsOf(snapshot: CertificateSnapshot): [string, string][] {
  const { figure, face, flatnessUm } = snapshot
  const { decimals } = figureWords(snapshot)
  const { peakUm, valleyUm, rmsUm, minimumZoneUm } = figure.flatness
  // Highest and lowest add up to the least squares flatness in print too.
  const parts = roundParts(peakUm, valleyUm, decimals)
  const other: [string, string] =
    face.reference === 'minimumZone'
      ? [words('figure.leastSquares'), formatNumber(parts.sum, decimals)]
      : [words('figure.minimumZone'), formatNumber(minimumZoneUm, decimals)]
  return [
    other,
    [words('figure.peak'), formatNumber(parts.first, decimals, true)],
    [words('figure.valley'), formatNumber(-parts.second, decimals, true)],
    [words('figure.rms'), formatNumber(rmsUm, decimals)],
    [
      words('figure.bands', { band: formatNumber(figure.bandUm, 4) }),
      formatNumber(flatnessUm / figure.bandUm, 2),
    ],
    ...sagittaRow(snapshot, decimals),
  ]
}

/** What decides the sign of a signed tolerance's figure. */
function sagittaRow({ face, figure }: CertificateSnapshot, decimals: number): [string, string][] {
  const { sagittaUm, sagittaUUm } = figure.terms
  if (face.tolerance.kind !== 'signed') return []
  if (sagittaUm === null) return [[words('figure.sagitta'), words('figure.signUnknown')]]
  const value = formatNumber(sagittaUm, decimals, true)
  return [[words('figure.sagitta'), `${value} ± ${formatNumber(sagittaUUm, decimals)}`]]
}
