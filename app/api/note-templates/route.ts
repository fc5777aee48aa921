import { createNoteTemplateSchema, noteTemplatesSchema, partyNoteTemplateSchema } from '@/lib/contracts/note-template'
import { defineRoute } from '@/lib/server/http/define-route'
import { createNoteTemplate, readNoteTemplates } from '@/lib/server/note-templates/note-templates'

export const GET = defineRoute({
  response: noteTemplatesSchema,
  handler: ({ actor }) => readNoteTemplates(actor),
})

export const POST = defineRoute({
  body: createNoteTemplateSchema,
  response: partyNoteTemplateSchema,
  status: 201,
  handler: ({ actor, body }) => createNoteTemplate(actor, body),
})
