import { z } from 'zod'
import { idSchema, removeSchema } from '@/lib/contracts/common'
import { partyNoteTemplateSchema, updateNoteTemplateSchema } from '@/lib/contracts/note-template'
import { defineRoute } from '@/lib/server/http/define-route'
import { changeNoteTemplate, removeNoteTemplate } from '@/lib/server/note-templates/note-templates'

const params = z.object({ templateId: idSchema })

export const PATCH = defineRoute({
  params,
  body: updateNoteTemplateSchema,
  response: partyNoteTemplateSchema,
  handler: ({ actor, params, body }) => changeNoteTemplate(actor, { ...params, ...body }),
})

export const DELETE = defineRoute({
  params,
  body: removeSchema,
  response: partyNoteTemplateSchema,
  handler: ({ actor, params, body }) => removeNoteTemplate(actor, { ...params, ...body }),
})
