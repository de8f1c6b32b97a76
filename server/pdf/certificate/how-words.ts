import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { formatNumber } from '@shared/units/height'
import { onOneLine, plainNumber, words } from './words'

/** How it was measured, in one paragraph. */
export function howWords(snapshot: CertificateSnapshot): string {
  return [
    photographed(snapshot),
    edge(snapshot),
    temperature(snapshot),
    support(snapshot),
    words('how.twelve'),
    ...departure(snapshot),
    engine(snapshot),
  ].join(' ')
}

function photographed({ viewingAngleDeg, wavelengthNm, marks }: CertificateSnapshot): string {
  return words('how.photographed', {
    view:
      viewingAngleDeg === 0
        ? words('how.squareOn')
        : words('how.atAngle', { angle: plainNumber(viewingAngleDeg) }),
    nm: plainNumber(wavelengthNm, 6),
    count: marks.traces.length,
  })
}

function edge({ marks, figure }: CertificateSnapshot): string {
  const params = { edge: plainNumber(marks.edgeBandMm), area: plainNumber(figure.areaMm2) }
  return words(marks.edgeBandMm > 0 ? 'how.edgeBand' : 'how.noEdgeBand', params)
}

function temperature({ conditions }: CertificateSnapshot): string {
  const { airTemperatureC, partTemperatureC, soakMinutes } = conditions
  const degrees = (c: number) => formatNumber(c, 1)
  const told = [
    ...(soakMinutes === null ? [] : [words('how.soak', { time: soakWords(soakMinutes) })]),
    ...(airTemperatureC === null ? [] : [words('how.air', { c: degrees(airTemperatureC) })]),
    ...(partTemperatureC === null ? [] : [words('how.part', { c: degrees(partTemperatureC) })]),
  ]
  if (told.length === 0) return words('how.temperatureNotStated')
  const list = told.join(', ')
  return `${list[0].toUpperCase()}${list.slice(1)}.`
}

function soakWords(minutes: number): string {
  if (minutes < 120) return words('how.minutes', { number: plainNumber(minutes) })
  return words('how.hours', { number: plainNumber(minutes / 60) })
}

function support({ face, figure }: CertificateSnapshot): string {
  // Rounded down: never more is said to be supported than is.
  const percent = Math.floor(100 * figure.supportedShare + 1e-9)
  return words(`how.support.${face.support}`, { percent })
}

function departure({ departureReason }: CertificateSnapshot): string[] {
  return departureReason ? [words('how.departure', { reason: sentenceOf(departureReason) })] : []
}

function engine({ procedure, engineVersion }: CertificateSnapshot): string {
  return procedure
    ? words('how.procedure', { procedure, version: engineVersion })
    : words('how.engine', { version: engineVersion })
}

function sentenceOf(text: string): string {
  return onOneLine(text.trim()).replace(/\.$/, '')
}
