import findings from '@shared/locales/en/findings.json'
import type { Finding } from '@shared/metrology'
import { createInstance } from 'i18next'
import type { z } from 'zod'
import { hasSentence, sentence } from '../../i18n'

const i18n = createInstance()
i18n.init({
  lng: 'en',
  fallbackLng: 'en',
  ns: ['findings'],
  defaultNS: 'findings',
  nsSeparator: false,
  initAsync: false,
  interpolation: { escapeValue: false },
  resources: { en: { findings } },
})

/** What a finding says to a person. */
export function findingSentence({ code, params }: Finding): string {
  return i18n.t(code, params)
}

/** All complaints of the schema in one sentence each, with the key that they are about. */
export function issuesSentence(issues: readonly z.core.$ZodIssue[]): string {
  return issues.map((issue) => `${pathOf(issue)}: ${complaintOf(issue)}`).join(' ')
}

function pathOf(issue: z.core.$ZodIssue): string {
  const path = issue.path.reduce<string>(
    (text, key) => (typeof key === 'number' ? `${text}[${key}]` : `${text}.${String(key)}`),
    '',
  )
  return path.replace(/^\./, '') || 'file'
}

function complaintOf(issue: z.core.$ZodIssue): string {
  if (hasSentence(issue.message)) return sentence(issue.message)
  if (issue.code === 'invalid_type' && issue.input === undefined) return sentence('field.missing')
  return `${issue.message}.`
}
