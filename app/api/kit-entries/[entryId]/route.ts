import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { entrySchema, removeEntrySchema, updateEntrySchema } from '@/lib/contracts/kit'
import { defineRoute } from '@/lib/server/http/define-route'
import { changeEntry, removeEntry } from '@/lib/server/kit/change-entry'

const params = z.object({ entryId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateEntrySchema,
  response: entrySchema,
  handler: ({ actor, params, body }) => changeEntry(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeEntrySchema,
  response: entrySchema,
  handler: ({ actor, params, body }) => removeEntry(actor, { ...params, ...body }),
})
