import { z } from 'zod'

export const roleSchema = z.enum(['inspector', 'reviewer', 'qa', 'admin'])
export type Role = z.infer<typeof roleSchema>

/** What a person may do. Routes ask for one of these; screens hide what isn't allowed. */
export const permissions = [
  'shop:read',
  'reading:create',
  'reading:edit-own',
  'reading:send-own',
  'photo:upload',
  'reading:review',
  'remark:answer',
  'reading:set-aside',
  'piece:dispose',
  'part:edit',
  'piece:create',
  'certificate:issue',
  'equipment:edit',
  'person:read',
  'person:manage',
  'settings:edit',
  'event:read',
] as const
export type Permission = (typeof permissions)[number]

const everyone: readonly Permission[] = ['shop:read']

const granted: Record<Role, readonly Permission[]> = {
  inspector: [
    ...everyone,
    'reading:create',
    'reading:edit-own',
    'reading:send-own',
    'photo:upload',
    'remark:answer',
    'reading:set-aside',
    'part:edit',
    'piece:create',
  ],
  reviewer: [
    ...everyone,
    'reading:review',
    'remark:answer',
    'reading:set-aside',
    'piece:dispose',
    'part:edit',
    'piece:create',
    'event:read',
    'person:read',
  ],
  qa: [
    ...everyone,
    'certificate:issue',
    'piece:dispose',
    'equipment:edit',
    'part:edit',
    'event:read',
    'person:read',
  ],
  admin: [
    ...everyone,
    'part:edit',
    'piece:create',
    'equipment:edit',
    'person:read',
    'person:manage',
    'settings:edit',
    'event:read',
  ],
}

/** Every permission that the roles give together; none for no role. */
export function permissionsOf(roles: readonly Role[]): ReadonlySet<Permission> {
  return new Set(roles.flatMap((role) => granted[role]))
}

/** Whether the roles together give the permission. */
export function may(roles: readonly Role[], permission: Permission): boolean {
  return roles.some((role) => granted[role].includes(permission))
}
