import type { z } from 'zod'
import { AppError, type AppErrorOptions } from '../errors'
import { hasSentence } from '../i18n'

/** What came in, as the schema describes it; a refusal names every field at fault. */
export function parseInput<Schema extends z.ZodType>(schema: Schema, input: unknown): z.infer<Schema> {
  const parsed = schema.safeParse(input ?? {})
  if (parsed.success) return parsed.data
  throw new AppError('invalidInput', { fields: fieldsOf(parsed.error.issues) })
}

function fieldsOf(issues: readonly z.core.$ZodIssue[]): AppErrorOptions['fields'] {
  const fields: Record<string, { key: string }> = {}
  for (const issue of issues) {
    const path = issue.path.map(String).join('.')
    // The first complaint about a field is the one to mend first.
    fields[path] ??= { key: keyOf(issue) }
  }
  return fields
}

function keyOf(issue: z.core.$ZodIssue): string {
  if (hasSentence(issue.message)) return issue.message
  switch (issue.code) {
    case 'invalid_type':
      return issue.input === undefined ? 'field.missing' : 'field.invalid'
    case 'too_small':
      return issue.origin === 'string' ? 'field.tooShort' : 'field.tooSmall'
    case 'too_big':
      return issue.origin === 'string' ? 'field.tooLong' : 'field.tooBig'
    default:
      return 'field.invalid'
  }
}

/**
 * The fields of a change that were really sent. A schema's defaults are for new things: here they would
 * overwrite what nobody mentioned.
 */
export function parseChange<Shape extends z.ZodRawShape>(
  schema: z.ZodObject<Shape>,
  input: unknown,
): Partial<z.infer<z.ZodObject<Shape>>> {
  const parsed: Record<string, unknown> = parseInput(schema.partial(), input)
  const sent = Object.keys(Object(input))
  const kept = Object.entries(parsed).filter(([key, value]) => sent.includes(key) && value !== undefined)
  return Object.fromEntries(kept) as Partial<z.infer<z.ZodObject<Shape>>>
}
