import type { TFunction } from 'i18next'

type Params = Readonly<Record<string, string | number>>

/** Params of a sentence: a height in µm becomes `height` in the shop's unit, lengths lose their false decimals. */
export function sentenceParams(
  params: Params,
  height: (um: number) => string,
): Record<string, string | number> {
  const entries = Object.entries(params).map(([name, value]): [string, string | number] => {
    if (name === 'heightUm' && typeof value === 'number') return ['height', height(value)]
    if (name.endsWith('Mm') && typeof value === 'number') return [name, Number(value.toPrecision(2))]
    return [name, value]
  })
  return Object.fromEntries(entries)
}

/** Form in words: one sentence. */
export function statementWords(
  t: TFunction,
  statement: { code: string; params: Params },
  height: (um: number) => string,
): string {
  return t(`form:${statement.code}`, sentenceParams(statement.params, height))
}

/** A finding's sentence. */
export function findingWords(t: TFunction, finding: { code: string; params: Params }): string {
  return t(`findings:${finding.code}`, { ...finding.params })
}
