import { z } from 'zod'
import { emailSchema, idSchema, nameSchema, roleSchema } from './common'

/** Long enough that a guess of a word list fails at our rate limits; any characters. */
export const newPasswordSchema = z.string().min(10, 'at least 10 characters').max(200, 'at most 200 characters')

export const signInSchema = z.object({
  email: emailSchema,
  password: z.string().min(1, 'type your password').max(200, 'at most 200 characters'),
})

export const signInLinkSchema = z.object({ email: emailSchema })

/** A path of this site to go to after signing in; it must never lead elsewhere, nor act by being opened. */
export const nextPathSchema = z
  .string()
  .max(500, 'at most 500 characters')
  .refine((path) => sitePath(path) === path, 'must be a page of this site')

export const signUpSchema = z.object({ name: nameSchema, email: emailSchema, next: nextPathSchema.optional() })
export type SignUp = z.infer<typeof signUpSchema>

/** The secret part of a mailed link. */
export const linkTokenSchema = z.string().regex(/^[\w-]{43}$/, 'is not a whole link; open it from the mail again')

export const askResetSchema = z.object({ email: emailSchema })
export const redeemResetSchema = z.object({ token: linkTokenSchema, password: newPasswordSchema })

export const changePasswordSchema = z.object({
  /** Null while no password was ever chosen. */
  current: z.string().min(1, 'type the password you have now').max(200, 'at most 200 characters').nullable(),
  password: newPasswordSchema,
})

/** How an open link to reset or to join stands. */
export type LinkStanding = 'open' | 'used' | 'withdrawn' | 'expired' | 'unknown'

export const acceptInvitationSchema = z.object({
  token: linkTokenSchema,
  /** Given by a person who is new here, left out by one who is signed in. */
  newcomer: z.object({ name: nameSchema, password: newPasswordSchema }).optional(),
})
export const acceptedInvitationSchema = z.object({ partyId: idSchema, email: z.string(), roles: z.array(roleSchema) })

export const doneSchema = z.object({ done: z.literal(true) })

export const deviceSchema = z.object({
  id: idSchema,
  words: z.string(),
  current: z.boolean(),
  since: z.iso.datetime(),
  lastSeen: z.iso.datetime(),
})
export const devicesSchema = z.object({ devices: z.array(deviceSchema) })
export type Device = z.infer<typeof deviceSchema>

export const switchPartySchema = z.object({ partyId: idSchema })

/**
 * The path, query and fragment of `value` when it names a page of this site, else undefined. `value` may be a path or a
 * whole address of `origin`.
 */
export function sitePath(value: unknown, origin = 'http://site.invalid'): string | undefined {
  if (typeof value !== 'string' || value.length > 500) return undefined
  const isPath = value.startsWith('/')
  if (!isPath && !value.startsWith(`${origin}/`)) return undefined
  if (!URL.canParse(value, origin)) return undefined
  const url = new URL(value, origin)
  if (url.origin !== origin || url.pathname.startsWith('//') || /^\/(api|sign-in)(\/|$)/.test(url.pathname))
    return undefined
  return `${url.pathname}${url.search}${url.hash}`
}
