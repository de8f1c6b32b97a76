import { riskOfAcceptance } from '@shared/metrology'
import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { words as wordsOf } from '../../i18n'
import { plainNumber, words } from './words'

/** What U is, what isn't in it, and by which rule it was judged, in one paragraph. */
export function uncertaintyWords(snapshot: CertificateSnapshot): string {
  const { figure, face } = snapshot
  return [
    words('uncertainty.expanded'),
    notStated(figure.notStated),
    ...(face.tolerance.kind === 'none' ? [words('uncertainty.noRule')] : ruleWords(snapshot)),
    ...(figure.signKnown ? [] : [words('uncertainty.signUnknown')]),
  ].join(' ')
}

function notStated(sources: readonly string[]): string {
  if (sources.length === 0) return words('uncertainty.allStated')
  const names = sources.map((source) => inSentence(wordsOf('budget', source)))
  return words('uncertainty.notStated', { sources: names.join(', '), count: sources.length })
}

function inSentence(name: string): string {
  return `${name[0].toLowerCase()}${name.slice(1)}`
}

function ruleWords({ face }: CertificateSnapshot): string[] {
  const { kind, guardFactor } = face.rule
  const limits = face.tolerance.kind === 'signed' ? 'signed' : 'plain'
  const w = guardFactor === 1 ? 'U' : `${plainNumber(guardFactor)} U`
  return [
    words(`uncertainty.rule.${kind}`),
    words(`uncertainty.limits.${limits}.${guardFactor === 0 ? 'simple' : 'guarded'}`, { w }),
    words('uncertainty.risk', { percent: riskPercent(guardFactor) }),
  ]
}

/** Rounded up to a tenth, since it is said to be the most. */
function riskPercent(guardFactor: number): string {
  const percent = Math.ceil(1000 * riskOfAcceptance(guardFactor) - 1e-6) / 10
  return plainNumber(Math.max(0.1, percent))
}
