import { createInstance, type Resource, type ResourceLanguage } from 'i18next'
import { initReactI18next } from 'react-i18next'

const files = import.meta.glob<ResourceLanguage>('/shared/locales/en/*.json', {
  eager: true,
  import: 'default',
})

function namespaceOf(path: string): string {
  return path.slice(path.lastIndexOf('/') + 1, -'.json'.length)
}

const english: Resource[string] = Object.fromEntries(
  Object.entries(files).map(([path, sentences]) => [namespaceOf(path), sentences]),
)

/** All sentences for people. Namespaces are the locale files' names. */
export const i18n = createInstance()

i18n.use(initReactI18next).init({
  lng: 'en',
  fallbackLng: 'en',
  defaultNS: 'common',
  ns: Object.keys(english),
  resources: { en: english },
  initAsync: false,
  // React escapes what it renders.
  interpolation: { escapeValue: false },
  returnNull: false,
})
