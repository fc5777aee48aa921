import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { plotSchema } from '@/lib/contracts/plot'
import { defineRoute } from '@/lib/server/http/define-route'
import { readPlot } from '@/lib/server/plots/read-plot'

export const GET = defineRoute({
  params: z.object({ rigId: idSchema }),
  response: plotSchema,
  handler: ({ actor, params }) => readPlot(actor, params),
})
