import type { FaceSizes, NewFace } from '@shared/schemas/parts'
import type { Face, KidneyPort } from '../../tests/photographs/scene'
import { demoParts } from './demo-parts'

const port: Omit<KidneyPort, 'middleDeg'> = { radiusMm: 14, widthMm: 4, spanDeg: 52 }

/** What is cut into the faces or marked on them, besides the sizes that the drawing has. */
const details: Record<string, Partial<Face>> = {
  'VP-43': { kidneyPorts: [0, 90, 180, 270].map((middleDeg) => ({ ...port, middleDeg })) },
  'LD-60': {
    datumMarksMm: [
      [19, 0],
      [-6, 16],
    ],
  },
  'VC-60': { slots: { count: 6, innerRadiusMm: 9, outerRadiusMm: 22, widthMm: 2, firstDeg: 15 } },
}

/** The face of a demo part as it is drawn. */
export function demoFace(partNumber: string): Face {
  const part = demoParts.find(({ number }) => number === partNumber)
  if (!part) throw new Error(`There is no demo part ${partNumber}.`)
  return {
    ...outlineOf(part.face),
    edgeBandMm: part.face.edgeBandMm,
    slots: null,
    kidneyPorts: [],
    datumMarksMm: [],
    ...details[partNumber],
  }
}

function outlineOf({ size }: NewFace): Pick<Face, 'shape' | 'sizeMm' | 'boreMm'> {
  switch (size.shape) {
    case 'disc':
      return { shape: 'disc', sizeMm: [size.diameterMm, size.diameterMm], boreMm: 0 }
    case 'annulus':
      return { shape: 'annulus', sizeMm: [size.diameterMm, size.diameterMm], boreMm: size.boreMm }
    case 'block':
      return { shape: 'block', sizeMm: [size.widthMm, size.heightMm], boreMm: 0 }
    case 'free':
      throw new Error('A free outline has no drawn face.')
    default:
      throw new Error(`No face is drawn as ${size satisfies never as FaceSizes}.`)
  }
}
