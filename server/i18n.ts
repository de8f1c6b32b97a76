import budget from '@shared/locales/en/budget.json'
import certificate from '@shared/locales/en/certificate.json'
import csv from '@shared/locales/en/csv.json'
import errors from '@shared/locales/en/errors.json'
import form from '@shared/locales/en/form.json'
import { createInstance } from 'i18next'

const i18n = createInstance()
i18n.init({
  lng: 'en',
  fallbackLng: 'en',
  defaultNS: 'errors',
  nsSeparator: false,
  initAsync: false,
  // Sentences go out as JSON, and the browser's own rendering escapes them.
  interpolation: { escapeValue: false },
  resources: { en: { errors, certificate, csv, form, budget } },
})

export type SentenceParams = Readonly<Record<string, string | number>>

/** The sentence for a key of `shared/locales/…/errors.json`. */
export function sentence(key: string, params: SentenceParams = {}): string {
  return i18n.t(key, params)
}

/** The words for a key of another locale file. */
export function words(
  file: 'certificate' | 'csv' | 'form' | 'budget',
  key: string,
  params: SentenceParams = {},
): string {
  return i18n.t(key, { ns: file, ...params })
}

export function hasSentence(key: string): boolean {
  return i18n.exists(key)
}
