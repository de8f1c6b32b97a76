import { copiesOf } from '../geometry/shape'
import type { Marks, Outline } from '../schemas/marks'
import type { MeasureFile, MeasureOutline } from '../schemas/measure-file'
import type { FaceSizes } from '../schemas/parts'
import type { FaceSize, SetUp, TracedReading } from './types'

/** What a reading's figures are computed from, as the database and the tracing table hold it. */
export interface MarkedPhoto {
  marks: Marks
  /** The drawing's sizes. An annulus's bore is a leave-out that the inspector marks. */
  size: FaceSizes
  /** The photograph's size after EXIF orientation. */
  photo: { widthPx: number; heightPx: number } | null
  setUp: SetUp
  mirrored: boolean
}

/** The engine's input from the marks on a photograph; null while no outline is marked. */
export function toReadingInput({ marks, size, photo, setUp, mirrored }: MarkedPhoto): TracedReading | null {
  if (!marks.outline) return null
  return {
    outline: marks.outline,
    size: faceSizeOf(size),
    exclusions: marks.leaveOuts.flatMap(copiesOf),
    edgeBandMm: marks.edgeBandMm,
    pressArrow: marks.pressArrow,
    traces: marks.traces,
    photo: photo && { widthPx: photo.widthPx, heightPx: photo.heightPx },
    mirrored,
    setUp,
  }
}

/** The engine's input from a file of the measuring command; traces are named `trace-1`, `trace-2` and so on. */
export function fromMeasureFile(
  file: MeasureFile,
  photo: { widthPx: number; heightPx: number } | null,
): TracedReading {
  const { outline, size } = splitOutline(file.outline)
  return {
    outline,
    size,
    exclusions: file.exclusions,
    edgeBandMm: file.edgeExclusionMm,
    pressArrow: file.pressTest ?? null,
    traces: (file.traces ?? []).map((trace, i) => ({ id: `trace-${i + 1}`, ...trace })),
    photo,
    mirrored: file.mirrored,
    setUp: setUpOf(file),
  }
}

function faceSizeOf(size: FaceSizes): FaceSize {
  switch (size.shape) {
    case 'disc':
    case 'annulus':
      return { kind: 'round', diameterMm: size.diameterMm }
    case 'block':
      return { kind: 'block', widthMm: size.widthMm, heightMm: size.heightMm }
    case 'free':
      return { kind: 'free', longestSideMm: size.longestSideMm }
  }
}

function splitOutline(given: MeasureOutline): { outline: Outline; size: FaceSize } {
  if (given.kind === 'polygon') {
    const { widthMm, heightMm, ...outline } = given
    return { outline, size: { kind: 'block', widthMm, heightMm } }
  }
  const { diameterMm, ...outline } = given
  return { outline, size: { kind: 'round', diameterMm } }
}

function setUpOf(file: MeasureFile): SetUp {
  return {
    wavelengthNm: file.lightSource.wavelengthNm,
    wavelengthRelativeU: file.lightSource.relativeUncertainty ?? null,
    viewingAngleDeg: file.viewingAngleDeg,
    viewingAngleUDeg: file.viewingAngleUncertaintyDeg ?? null,
    edgePlacementUMm: file.edgePlacementUncertaintyMm ?? null,
    referenceFlatFormUm: file.referenceFlatFormUm ?? null,
    temperatureHalfWidthUm: file.temperatureHalfWidthUm ?? null,
    repeats: file.repeats ?? null,
    nearCamera: file.nearCamera ?? null,
    supportHalfWidthUm: file.supportHalfWidthUm ?? null,
  }
}
