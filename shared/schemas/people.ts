import { z } from 'zod'
import { roleSchema } from '../access/permissions'

export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .pipe(z.email('people.email.invalid'))
  .pipe(z.string().max(200))
/** Length decides (no rules of composition); 200 bounds the work of hashing. */
export const passwordSchema = z.string().min(12, 'people.password.short').max(200, 'people.password.long')

export const signInSchema = z.object({
  email: emailSchema,
  password: z.string().min(1, 'people.password.missing').max(200),
})
export type SignIn = z.infer<typeof signInSchema>

export const newPersonSchema = z.object({
  name: z.string().trim().min(1, 'people.name.missing').max(100),
  email: emailSchema,
  password: passwordSchema,
  roles: z.array(roleSchema).min(1, 'people.roles.missing'),
})
export type NewPerson = z.infer<typeof newPersonSchema>

export const personChangeSchema = z.object({
  name: z.string().trim().min(1, 'people.name.missing').max(100).optional(),
  roles: z.array(roleSchema).min(1, 'people.roles.missing').optional(),
  active: z.boolean().optional(),
  password: passwordSchema.optional(),
})
export type PersonChange = z.infer<typeof personChangeSchema>

export const ownPasswordChangeSchema = z.object({ current: z.string().min(1).max(200), next: passwordSchema })
export type OwnPasswordChange = z.infer<typeof ownPasswordChangeSchema>

export const personSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  roles: z.array(roleSchema),
  active: z.boolean(),
  createdAt: z.string(),
})
export type Person = z.infer<typeof personSchema>

/** Who is signed in. */
export const meSchema = personSchema.extend({
  shop: z.object({ name: z.string() }),
  /** The shop signs in over a plain network: every page warns. */
  plainNetwork: z.boolean(),
})
export type Me = z.infer<typeof meSchema>
