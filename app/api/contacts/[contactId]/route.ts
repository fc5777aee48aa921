import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { contactSchema, updateContactSchema } from '@/lib/contracts/directory'
import { changeContact, removeContact } from '@/lib/server/directory/contacts'
import { defineRoute } from '@/lib/server/http/define-route'

const params = z.object({ contactId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateContactSchema,
  response: contactSchema,
  handler: ({ actor, params, body }) => changeContact(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: contactSchema,
  handler: ({ actor, params, body }) => removeContact(actor, { ...params, ...body }),
})
