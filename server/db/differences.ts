import { canonicalJson } from './events'

/** What a change makes different, for the trail: field by field, from and to. null when nothing does. */
export function differences<Row extends object>(
  before: Row,
  change: Partial<Row>,
): Record<string, { from: unknown; to: unknown }> | null {
  const changed: Record<string, { from: unknown; to: unknown }> = {}
  for (const key of Object.keys(change) as (keyof Row & string)[]) {
    const from = before[key] ?? null
    const to = change[key] ?? null
    if (canonicalJson(from) !== canonicalJson(to)) changed[key] = { from, to }
  }
  return Object.keys(changed).length > 0 ? changed : null
}
