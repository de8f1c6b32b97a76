import { words as wordsOf } from '../../i18n'

type Params = Readonly<Record<string, string | number>>

/** A sentence of the certificate's page. */
export function words(key: string, params: Params = {}): string {
  return wordsOf('certificate', `page.${key}`, params)
}

const days = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  timeZone: 'UTC',
})

/** "30 November 2026" of an ISO date or time, as it was in UTC: the same wherever the page is printed. */
export function dayWords(iso: string): string {
  return days.format(new Date(iso))
}

/** "30 November 2026, 10:14 UTC" of an ISO time. */
export function timeWords(iso: string): string {
  return words('time', { day: dayWords(iso), time: new Date(iso).toISOString().slice(11, 16) })
}

/** A number without false decimals: three significant digits, never in powers of ten. */
export function plainNumber(value: number, digits = 3): string {
  if (value === 0) return '0'
  const decimals = Math.min(12, Math.max(0, digits - 1 - Math.floor(Math.log10(Math.abs(value)))))
  return String(Number(value.toFixed(decimals))).includes('e')
    ? value.toFixed(decimals)
    : String(Number(value.toFixed(decimals))).replace('-', '\u2212')
}

/** A typed text of several lines on one. */
export function onOneLine(text: string): string {
  return text
    .split(/\s*\n\s*/)
    .filter((line) => line !== '')
    .join(', ')
}
