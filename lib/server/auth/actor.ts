import type { Role } from '@/lib/contracts/common'
import { roleWords } from '@/lib/contracts/common'
import type { Permission } from '@/lib/contracts/permissions'
import { rolesMay, rolesWith } from '@/lib/contracts/permissions'
import { AppError } from '@/lib/errors'

/** Who acts. Every use case takes one, and its scope is the actor's party: nobody can name another. */
export type MemberActor = {
  readonly kind: 'person'
  readonly personId: string
  readonly name: string
  readonly partyId: string
  /** Own roles and lent ones that are in force. */
  readonly roles: readonly Role[]
  readonly sessionId: string
  readonly address: string
}

export type LinkActor = {
  readonly kind: 'link'
  readonly purpose: 'reply' | 'bench'
  readonly grantId: string
  readonly tokenId: string
  readonly partyId: string
  readonly showId: string | null
  readonly hireId: string | null
  readonly recipientName: string
  readonly address: string
}

export type JobActor = { readonly kind: 'job'; readonly job: string; readonly partyId: string; readonly address: '' }

export type Actor = MemberActor | LinkActor | JobActor

/** The first line of a use case for signed-in people: refuses with a sentence that says who may. */
export function assertCan(actor: Actor, permission: Permission): asserts actor is MemberActor {
  if (actor.kind === 'person' && rolesMay(actor.roles, permission)) return
  const who = rolesWith(permission).map((role) => roleWords[role]).join(' or ')
  throw new AppError('forbidden', `This needs the role ${who}. Nothing was changed.`)
}

/** The first line of a use case for links. */
export function assertLink(actor: Actor, purpose: LinkActor['purpose']): asserts actor is LinkActor {
  if (actor.kind === 'link' && actor.purpose === purpose) return
  throw new AppError('forbidden', 'This link was made for something else. Nothing was changed.')
}
