import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { kitSchema, setNotesSchema } from '@/lib/contracts/kit'
import { defineRoute } from '@/lib/server/http/define-route'
import { setNotes } from '@/lib/server/kit/set-notes'

export const PUT = defineRoute({
  params: z.object({ rigId: idSchema }),
  body: setNotesSchema,
  response: kitSchema,
  handler: ({ actor, params, body }) => setNotes(actor, { ...params, ...body }),
})
