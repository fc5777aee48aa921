import type { Actor, LinkActor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan, assertLink } from '@/lib/server/auth/actor'
import { notThere } from '@/lib/server/refusals'

/** The first line of a use case of the bench: a bench link at its own show, or a member whose roles allow it. */
export function assertAtBench(
  actor: Actor,
  showId: string,
  permission: 'party:read' | 'bench:log',
): asserts actor is LinkActor | MemberActor {
  if (actor.kind !== 'link') return assertCan(actor, permission)
  assertLink(actor, 'bench')
  if (actor.showId !== showId) throw notThere('show')
}

/** The one show that a bench link opens. */
export function showOfLink(actor: LinkActor): string {
  assertLink(actor, 'bench')
  if (actor.showId === null) throw notThere('show')
  return actor.showId
}
