import type { FieldErrors, FieldValues, Resolver } from 'react-hook-form'
import type { z } from 'zod'

/**
 * For forms whose fields aren't shaped like what they send: `toCandidate` puts the fields together, the schema
 * judges the whole, and `fieldOf` names the field that answers for a path of the schema.
 */
export function candidateResolver<Form extends FieldValues, S extends z.ZodType>(
  schema: S,
  toCandidate: (form: Form) => unknown,
  fieldOf: (path: string, form: Form) => keyof Form & string,
): Resolver<Form, unknown, z.output<S>> {
  return (form) => {
    const parsed = schema.safeParse(toCandidate(form))
    if (parsed.success) return { values: parsed.data, errors: {} }
    const errors: Record<string, { type: string; message: string }> = {}
    for (const issue of parsed.error.issues) {
      const name = fieldOf(issue.path.map(String).join('.'), form)
      errors[name] ??= { type: issue.code, message: issue.message }
    }
    return { values: {}, errors: errors as FieldErrors<Form> }
  }
}
