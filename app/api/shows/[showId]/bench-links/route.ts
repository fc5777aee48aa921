import { z } from 'zod'
import { benchLinksSchema } from '@/lib/contracts/bench'
import { idSchema } from '@/lib/contracts/common'
import { printedLinkSchema } from '@/lib/contracts/grant'
import { listBenchLinks } from '@/lib/server/bench/bench-links'
import { printBench } from '@/lib/server/grants/print-link'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ showId: idSchema })

export const GET = defineRoute({
  params,
  response: benchLinksSchema,
  handler: ({ actor, params }) => listBenchLinks(actor, params),
})

export const POST = defineRoute({
  params,
  response: printedLinkSchema,
  status: 201,
  handler: ({ actor, params }) => printBench(actor, params),
})
