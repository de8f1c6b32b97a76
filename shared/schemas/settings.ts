import { z } from 'zod'

export const displayUnitSchema = z.enum(['um', 'nm', 'uin', 'tenths', 'bands'])
export type DisplayUnit = z.infer<typeof displayUnitSchema>

export const settingsSchema = z.object({
  shopName: z.string().trim().min(1, 'settings.shopName.missing').max(100),
  shopAddress: z.string().max(300),
  shopEmail: z.string().max(200),
  displayUnit: displayUnitSchema,
  /** Sign-in without TLS allowed (a tablet on the shop's own network); every page then warns. */
  allowPlainNetwork: z.boolean(),
  onePersonShop: z.boolean(),
  /** Certificates are numbered prefix-year-count. */
  certificatePrefix: z
    .string()
    .trim()
    .regex(/^[A-Za-z0-9]{1,8}$/, 'settings.certificatePrefix.form'),
  /** The shop's own procedure for flatness, as certificates name it. */
  procedure: z.string().trim().max(120),
  /** Where customers reach this Lapwing, for the code on certificates; empty is where it was issued. */
  publicAddress: z
    .string()
    .trim()
    .max(200)
    .regex(/^(https?:\/\/[^\s/]+)?$/, 'settings.publicAddress.form'),
  /** Least share of the measured area that traces must support before a verdict is given, 0 to 1. */
  leastSupportedShare: z.number().min(0.5).max(1),
})
export type Settings = z.infer<typeof settingsSchema>
export const settingsChangeSchema = settingsSchema.partial()
