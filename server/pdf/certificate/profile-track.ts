import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { Point } from './paths'

/** Where the profile runs over the face. */
export interface ProfileTrack {
  kind: 'round' | 'straight'
  placesMm: readonly Point[]
  /** Of the circle; 0 for a straight one. */
  diameterMm: number
  /** Of a straight one: where it starts and ends, mm from the middle. */
  fromMm: number
  toMm: number
}

const roundPlaces = 361
const straightPlaces = 321

/** Round a ring on its middle radius, clockwise from twelve; else straight through the middle, left to right. */
export function profileTrack({ face, figure }: CertificateSnapshot): ProfileTrack {
  if (face.size.shape === 'annulus') return roundTrack((face.size.diameterMm + face.size.boreMm) / 2)
  const { x0Mm, columns, stepMm } = figure.map
  return straightTrack(x0Mm, x0Mm + (columns - 1) * stepMm)
}

function roundTrack(diameterMm: number): ProfileTrack {
  const radius = diameterMm / 2
  const placesMm = Array.from({ length: roundPlaces }, (_, i): Point => {
    const angle = (2 * Math.PI * i) / (roundPlaces - 1)
    return [radius * Math.sin(angle), -radius * Math.cos(angle)]
  })
  return { kind: 'round', placesMm, diameterMm, fromMm: 0, toMm: 0 }
}

function straightTrack(fromMm: number, toMm: number): ProfileTrack {
  const placesMm = Array.from({ length: straightPlaces }, (_, i): Point => {
    return [fromMm + ((toMm - fromMm) * i) / (straightPlaces - 1), 0]
  })
  return { kind: 'straight', placesMm, diameterMm: 0, fromMm, toMm }
}
