import { currentActor } from '@/lib/server/auth/current-actor'
import { sessionIsLive } from '@/lib/server/auth/session-is-live'
import { errorResponse } from '@/lib/server/http/error-response'
import { eventStream } from '@/lib/server/live/event-stream'

export const dynamic = 'force-dynamic'

/** What changes in the party in hand, as topics; carries no data. */
export async function GET(request: Request): Promise<Response> {
  try {
    const actor = await currentActor()
    return await eventStream({
      partyId: actor.partyId,
      signal: request.signal,
      wants: () => true,
      stillAllowed: () => sessionIsLive(actor),
    })
  } catch (error) {
    return errorResponse(error)
  }
}
