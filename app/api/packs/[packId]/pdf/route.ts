import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { currentActor } from '@/lib/server/auth/current-actor'
import type { RouteContext } from '@/lib/server/http/define-route'
import { errorResponse } from '@/lib/server/http/error-response'
import { parseInput } from '@/lib/server/http/parse-input'
import { readPackPdf } from '@/lib/server/packs/read-pack'

const params = z.object({ packId: idSchema })

/** The bytes of a pack's PDF, as they were or would be sent. */
export async function GET(_request: Request, context: RouteContext): Promise<Response> {
  try {
    const actor = await currentActor()
    const { bytes, name } = await readPackPdf(actor, parseInput(params, await context.params))
    return new Response(Buffer.from(bytes), {
      headers: {
        'Content-Type': 'application/pdf',
        'Content-Length': String(bytes.byteLength),
        'Content-Disposition': `inline; filename="pack.pdf"; filename*=UTF-8''${encodeURIComponent(name)}`,
        'Cache-Control': 'private, no-store',
      },
    })
  } catch (error) {
    return errorResponse(error)
  }
}
