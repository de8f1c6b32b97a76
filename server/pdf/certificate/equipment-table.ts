import type { CertificateSnapshot, CertifiedEquipment } from '@shared/schemas/certificates'
import type { EquipmentDetails } from '@shared/schemas/equipment'
import { formatNumber } from '@shared/units/height'
import { inks } from './inks'
import { pageWidth } from './paths'
import type { Sheet } from './sheet'
import { dayWords, plainNumber, words } from './words'

const columns = [
  { x: 0, width: 112 },
  { x: 120, width: 144 },
  { x: 272, width: 180 },
  { x: 460, width: 84 },
] as const

/** What it was measured with, each with its figure, calibration and last valid day; gives the lower end. */
export function drawEquipment(sheet: Sheet, top: number, { equipment }: CertificateSnapshot): number {
  sheet.text(0, top, words('head.equipment'), sheet.style(9.8, 'semibold'))
  if (equipment.length === 0) {
    const style = sheet.style(9.2)
    const y = top + 6.5 * sheet.density.text + style.size
    sheet.text(0, y, words('equipment.none'), style)
    return y
  }
  const label = sheet.style(8.2, 'regular', inks.muted)
  const body = sheet.style(9.2)
  let y = top + 5.5 * sheet.density.text + label.size
  ;(['equipment', 'figure', 'calibration', 'validTo'] as const).forEach((name, i) => {
    sheet.text(columns[i].x, y, words(`equipment.heads.${name}`), label)
  })
  for (const item of equipment) {
    const line = y + sheet.gap(5.5)
    sheet.line(0, line, pageWidth, line, { colour: inks.hairline, width: 0.6 })
    const baseline = line + sheet.gap(2) + body.size
    const ends = cellsOf(item).map((text, i) =>
      sheet.paragraph({ x: columns[i].x, y: baseline, width: columns[i].width }, text, body, 1.2),
    )
    y = Math.max(...ends)
  }
  return y
}

function cellsOf({ name, details, calibration }: CertifiedEquipment): string[] {
  return [
    details.kind === 'referenceFlat'
      ? words('equipment.flat', { name, diameter: plainNumber(details.diameterMm) })
      : name,
    figureOf(details),
    calibration
      ? words('equipment.calibration', {
          number: calibration.certificateNumber,
          laboratory: calibration.laboratory,
          context: calibration.certificateNumber === '' ? 'unnumbered' : '',
        })
      : words('equipment.uncalibrated', { context: details.kind }),
    calibration?.dueOn ? dayWords(calibration.dueOn) : words('equipment.noLimit'),
  ]
}

function figureOf(details: EquipmentDetails): string {
  switch (details.kind) {
    case 'referenceFlat':
      return flatFigure(details)
    case 'lightSource':
      return words('equipment.wavelength', {
        context: details.relativeU === null ? 'alone' : '',
        nm: plainNumber(details.wavelengthNm, 6),
        percent: plainNumber(100 * (details.relativeU ?? 0), 2),
      })
    case 'cameraSetUp':
      return words('equipment.camera', {
        context: details.viewingAngleUDeg === null ? 'alone' : '',
        angle: plainNumber(details.viewingAngleDeg),
        u: plainNumber(details.viewingAngleUDeg ?? 0, 2),
      })
    case 'thermometer':
      return details.uC === null
        ? words('notStated')
        : words('equipment.thermometer', { u: plainNumber(details.uC, 2) })
  }
}

function flatFigure({ formUm, expandedUUm }: Extract<EquipmentDetails, { kind: 'referenceFlat' }>): string {
  if (formUm === null) return words('equipment.formNotStated')
  if (expandedUUm === null) return words('equipment.form', { form: formatNumber(formUm, 3) })
  return words('equipment.formWithU', { form: formatNumber(formUm, 3), u: formatNumber(expandedUUm, 3) })
}
