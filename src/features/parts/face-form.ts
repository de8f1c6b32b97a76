import {
  type DecisionRule,
  type Face,
  newFaceSchema,
  type Tolerance,
  type TypedHeight,
} from '@shared/schemas/parts'
import { candidateResolver } from '@/lib/candidate-resolver'

/** A face as its form has it: every field of every shape side by side, empty ones null. */
export interface FaceForm {
  name: string
  shape: Face['size']['shape']
  diameterMm: number | null
  boreMm: number | null
  widthMm: number | null
  heightMm: number | null
  longestSideMm: number | null
  toleranceKind: Tolerance['kind']
  max: TypedHeight | null
  least: TypedHeight | null
  most: TypedHeight | null
  reference: Face['reference']
  ruleKind: DecisionRule['kind']
  guardFactor: number | null
  edgeBandMm: number | null
  support: Face['support']
}

/** Guard factors that the named rules fix. */
export const fixedGuardFactors: Record<Exclude<DecisionRule['kind'], 'own'>, number> = {
  simpleAcceptance: 0,
  iso14253_2017: 0.825,
  iso14253_older: 1,
}

const blank: FaceForm = {
  name: '',
  shape: 'disc',
  diameterMm: null,
  boreMm: null,
  widthMm: null,
  heightMm: null,
  longestSideMm: null,
  toleranceKind: 'plain',
  max: null,
  least: null,
  most: null,
  reference: 'minimumZone',
  ruleKind: 'iso14253_2017',
  guardFactor: 1,
  edgeBandMm: 0,
  support: 'free',
}

export function toFaceForm(face: Face | undefined): FaceForm {
  if (!face) return blank
  const { shape, ...sizes } = face.size
  const { kind, ...limits } = face.tolerance
  return {
    ...blank,
    ...sizes,
    ...limits,
    shape,
    toleranceKind: kind,
    name: face.name,
    reference: face.reference,
    ruleKind: face.rule.kind,
    guardFactor: face.rule.guardFactor,
    edgeBandMm: face.edgeBandMm,
    support: face.support,
  }
}

/** A face that is changed keeps its template. */
export function faceResolver(face: Face | undefined) {
  return candidateResolver(newFaceSchema, (form: FaceForm) => candidateOf(form, face), fieldOf)
}

function candidateOf(form: FaceForm, face: Face | undefined): unknown {
  const { name, reference, support, edgeBandMm } = form
  return {
    name,
    reference,
    support,
    edgeBandMm,
    size: sizeOf(form),
    tolerance: toleranceOf(form),
    rule: {
      kind: form.ruleKind,
      guardFactor: form.ruleKind === 'own' ? form.guardFactor : fixedGuardFactors[form.ruleKind],
    },
    template: face?.template ?? null,
  }
}

function sizeOf({ shape, diameterMm, boreMm, widthMm, heightMm, longestSideMm }: FaceForm): unknown {
  switch (shape) {
    case 'disc':
      return { shape, diameterMm }
    case 'annulus':
      return { shape, diameterMm, boreMm }
    case 'block':
      return { shape, widthMm, heightMm }
    case 'free':
      return { shape, longestSideMm }
  }
}

function toleranceOf({ toleranceKind: kind, max, least, most }: FaceForm): unknown {
  switch (kind) {
    case 'none':
      return { kind }
    case 'plain':
      return { kind, max }
    case 'signed':
      return { kind, least, most }
  }
}

/** `size.boreMm` is the field of its last name; what stands against a whole stands at its telling field. */
function fieldOf(path: string, form: FaceForm): keyof FaceForm {
  if (path === 'size') return 'boreMm'
  if (path === 'tolerance') return form.toleranceKind === 'signed' ? 'most' : 'max'
  if (path.startsWith('tolerance.')) return path.split('.')[1] as 'max' | 'least' | 'most'
  const last = path.split('.').at(-1) ?? ''
  return last in blank ? (last as keyof FaceForm) : 'name'
}
