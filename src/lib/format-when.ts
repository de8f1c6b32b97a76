const locale = 'en-GB'
const dayMs = 24 * 3_600_000

const time = new Intl.DateTimeFormat(locale, { hour: '2-digit', minute: '2-digit' })
const weekday = new Intl.DateTimeFormat(locale, { weekday: 'short' })
const dayMonth = new Intl.DateTimeFormat(locale, { day: 'numeric', month: 'short' })
const dayMonthYear = new Intl.DateTimeFormat(locale, { day: 'numeric', month: 'short', year: 'numeric' })
const longDay = new Intl.DateTimeFormat(locale, { day: 'numeric', month: 'long', year: 'numeric' })
const longWeekday = new Intl.DateTimeFormat(locale, { weekday: 'long' })
const moment = new Intl.DateTimeFormat(locale, {
  weekday: 'short',
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  hour: '2-digit',
  minute: '2-digit',
})

/** Short for columns: the time today, the weekday within a week, else the day. */
export function formatSince(iso: string, now = new Date()): string {
  const at = new Date(iso)
  if (at.toDateString() === now.toDateString()) return time.format(at)
  const age = now.getTime() - at.getTime()
  if (age >= 0 && age < 6 * dayMs) return weekday.format(at)
  return at.getFullYear() === now.getFullYear() ? dayMonth.format(at) : dayMonthYear.format(at)
}

/** "Tue, 1 Dec 2026, 08:40". */
export function formatMoment(iso: string): string {
  return moment.format(new Date(iso))
}

/** "14 December 2026"; also for calendar days without a time. */
export function formatDay(iso: string): string {
  return longDay.format(new Date(iso.length === 10 ? `${iso}T12:00:00` : iso))
}

export function formatWeekday(at: Date): string {
  return longWeekday.format(at)
}
