import { benchSignOffSchema, signOffSchema } from '@/lib/contracts/bench'
import { showOfLink } from '@/lib/server/bench/assert-at-bench'
import { signOffDrum } from '@/lib/server/bench/sign-off'
import { definePublicRoute } from '@/lib/server/http/define-public-route'

export const POST = definePublicRoute({
  purpose: 'bench',
  body: signOffSchema,
  response: benchSignOffSchema,
  handler: ({ actor, body }) => signOffDrum(actor, { showId: showOfLink(actor), signOff: body }),
})
