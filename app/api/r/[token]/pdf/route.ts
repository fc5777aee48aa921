import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { readReplyPdf } from '@/lib/server/answers/read-reply-pdf'
import { linkActor } from '@/lib/server/auth/link-actor'
import { clientAddress } from '@/lib/server/http/client-address'
import type { RouteContext } from '@/lib/server/http/define-route'
import { errorResponse } from '@/lib/server/http/error-response'
import { takeFromLinkLimit } from '@/lib/server/http/link-limit'
import { parseInput } from '@/lib/server/http/parse-input'

const query = z.object({ pack: idSchema })

/** The PDF that was mailed, for whoever holds the link. */
export async function GET(request: Request, context: RouteContext): Promise<Response> {
  try {
    const { token } = await context.params
    const address = clientAddress(request.headers)
    await takeFromLinkLimit(address)
    const actor = await linkActor(String(token), 'reply', address)
    const { pack } = parseInput(query, Object.fromEntries(new URL(request.url).searchParams))
    const { bytes, name } = await readReplyPdf(actor, { packId: pack })
    return new Response(Buffer.from(bytes), {
      headers: {
        'Content-Type': 'application/pdf',
        'Content-Length': String(bytes.byteLength),
        'Content-Disposition': `attachment; filename="pack.pdf"; filename*=UTF-8''${encodeURIComponent(name)}`,
        'Cache-Control': 'private, no-store',
      },
    })
  } catch (error) {
    return errorResponse(error)
  }
}
