import { createHash, createHmac } from 'node:crypto'
import { env } from '@/lib/env'

/** What a secret link opens. The kind is part of the token, so one kind never opens another. */
export type LinkKind = 'grant' | 'invitation' | 'reset' | 'sign-in'

/**
 * The secret of a link: 256 bits made from a random id with a key that the database does not hold. Only its hash is
 * stored; a mail waiting in the outbox or a PDF being made finds the secret again from the id, at the moment it is needed.
 */
export function linkToken(kind: LinkKind, id: string): string {
  return createHmac('sha256', env().LINK_SECRET).update(`${kind}:${id}`).digest('base64url')
}

export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('base64url')
}
