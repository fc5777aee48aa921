import { linkActor } from '@/lib/server/auth/link-actor'
import { showOfLink } from '@/lib/server/bench/assert-at-bench'
import { benchTopics } from '@/lib/server/bench/read-bench'
import { clientAddress } from '@/lib/server/http/client-address'
import { errorResponse } from '@/lib/server/http/error-response'
import { takeFromLinkLimit } from '@/lib/server/http/link-limit'
import { eventStream } from '@/lib/server/live/event-stream'

export const dynamic = 'force-dynamic'

/** What changes on this one bench, as topics; carries no data. A withdrawn or expired link stops hearing. */
export async function GET(request: Request, context: { params: Promise<{ token: string }> }): Promise<Response> {
  try {
    const { token } = await context.params
    const address = clientAddress(request.headers)
    await takeFromLinkLimit(address)
    const actor = await linkActor(token, 'bench', address)
    const topics = new Set<string>(await benchTopics(actor, { showId: showOfLink(actor) }))
    return await eventStream({
      partyId: actor.partyId,
      signal: request.signal,
      wants: (topic) => topics.has(topic),
      stillAllowed: async () => (await linkActor(token, 'bench', address)).grantId === actor.grantId,
    })
  } catch (error) {
    return errorResponse(error)
  }
}
