import { z } from 'zod'
import { idSchema } from '@/lib/contracts/common'
import { contactSchema, createContactSchema } from '@/lib/contracts/directory'
import { createContact } from '@/lib/server/directory/contacts'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ supplierId: idSchema })

export const POST = defineRoute({
  params,
  body: createContactSchema,
  response: contactSchema,
  status: 201,
  handler: ({ actor, params, body }) => createContact(actor, { of: params, ...body }),
})
