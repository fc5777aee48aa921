import { z } from 'zod'

/** Ids are uuids, made by the server or by the client that wants to repeat a request safely. */
export const idSchema = z.uuid('must be an id')

export const nameSchema = z.string().trim().min(1, 'give a name').max(120, 'at most 120 characters')

export const remarkSchema = z.string().trim().max(2000, 'at most 2000 characters')

export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'at most 254 characters')
  .pipe(z.email('write an e-mail address such as crew@example.example'))

/** A calendar date as the wall shows it, YYYY-MM-DD. */
export const dateSchema = z.iso
  .date('write a date as YYYY-MM-DD')
  .refine((date) => date >= '2000-01-01' && date < '2200-01-01', 'a date from 2000 to 2199')

/** A wall-clock time without a zone, HH:MM. */
export const wallTimeSchema = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'write a time as HH:MM')

/** Whether the runtime knows a zone by this name; old and new names of a place both count (Asia/Calcutta, Asia/Kolkata). */
function isZone(name: string): boolean {
  if (name !== 'UTC' && !/^[A-Z][A-Za-z_]+\/[A-Za-z_+\-/0-9]+$/.test(name)) return false
  try {
    new Intl.DateTimeFormat('en', { timeZone: name })
    return true
  } catch {
    return false
  }
}

/** An IANA time zone name. */
export const zoneSchema = z.string().refine(isZone, 'choose a time zone from the list, such as Europe/Oslo')

/** An ISO 4217 currency code. */
export const currencySchema = z
  .string()
  .trim()
  .toUpperCase()
  .regex(/^[A-Z]{3}$/, 'write a currency such as EUR')

/** The version of the row that the writer saw; a stale one is refused, never overwritten. */
export const versionSchema = z.number().int().min(1).max(2_147_483_647)

export const roles = ['owner', 'drum-tech', 'tour-manager', 'viewer'] as const
export const roleSchema = z.enum(roles, 'choose a role')
export type Role = z.infer<typeof roleSchema>

export const roleWords: Record<Role, string> = {
  owner: 'owner',
  'drum-tech': 'drum tech',
  'tour-manager': 'tour manager',
  viewer: 'production viewer',
}

/** Taking away a row needs the version that was seen, as changing it does. */
export const removeSchema = z.object({ version: versionSchema })
