export type ParsedLength =
  | { ok: true; valueMm: number; typed: string }
  | { ok: false; reason: 'empty' | 'notANumber' | 'unitUnknown' }

const mmPer: Record<string, number> = {
  '': 1,
  mm: 1,
  cm: 10,
  m: 1000,
  in: 25.4,
  inch: 25.4,
  inches: 25.4,
  '"': 25.4,
}

/** Reads a length of a drawing, mm unless another unit is named: "40", "40 mm", "1.575 in", "1,575\"". */
export function parseLength(text: string): ParsedLength {
  const typed = text.trim()
  if (typed === '') return { ok: false, reason: 'empty' }
  const match = /^(\d+(?:[.,]\d+)?|[.,]\d+)\s*(.*)$/u.exec(typed)
  if (!match) return { ok: false, reason: 'notANumber' }
  const unit = match[2]!.trim().toLowerCase()
  if (!Object.hasOwn(mmPer, unit)) return { ok: false, reason: 'unitUnknown' }
  return { ok: true, valueMm: Number(match[1]!.replace(',', '.')) * mmPer[unit]!, typed }
}
