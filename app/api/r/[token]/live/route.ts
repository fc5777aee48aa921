import { linkActor } from '@/lib/server/auth/link-actor'
import { clientAddress } from '@/lib/server/http/client-address'
import { errorResponse } from '@/lib/server/http/error-response'
import { takeFromLinkLimit } from '@/lib/server/http/link-limit'
import { eventStream } from '@/lib/server/live/event-stream'

export const dynamic = 'force-dynamic'

/** Says when something of this one show or hire changed; carries no data and no other topic. */
export async function GET(request: Request, context: { params: Promise<{ token: string }> }): Promise<Response> {
  try {
    const { token } = await context.params
    const address = clientAddress(request.headers)
    await takeFromLinkLimit(address)
    const actor = await linkActor(token, 'reply', address)
    const own = `advance:${actor.showId ?? actor.hireId ?? ''}`
    return await eventStream({
      partyId: actor.partyId,
      signal: request.signal,
      wants: (topic) => topic === own,
      stillAllowed: async () => (await linkActor(token, 'reply', address)).grantId === actor.grantId,
    })
  } catch (error) {
    return errorResponse(error)
  }
}
