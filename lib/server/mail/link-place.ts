import type { LinkKind } from '@/lib/server/auth/link-token'
import { linkToken } from '@/lib/server/auth/link-token'

/** A place in a mail's body where a secret goes at the moment of sending, so that the outbox holds none. */
export function linkPlace(kind: LinkKind, id: string): string {
  return `{{link ${kind} ${id}}}`
}

export function fillLinkPlaces(body: string): string {
  return body.replace(/\{\{link (grant|invitation|reset|sign-in) ([0-9a-f-]{36})\}\}/g, (_, kind: string, id: string) =>
    linkToken(kind as LinkKind, id),
  )
}
