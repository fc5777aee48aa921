'use client'

import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import type { NoteTemplateInput, PartyNoteTemplate } from '@/lib/contracts/note-template'
import { noteTemplatesSchema, partyNoteTemplateSchema } from '@/lib/contracts/note-template'
import { callApi } from './http'

const templatesKey = (partyId: string) => ['party', partyId, 'note-templates']

/** The party's own note templates by name. */
export function useNoteTemplates(partyId: string, initial: readonly PartyNoteTemplate[]) {
  return useQuery({
    queryKey: templatesKey(partyId),
    queryFn: async ({ signal }) =>
      (await callApi('/api/note-templates', { response: noteTemplatesSchema, signal })).templates,
    initialData: [...initial],
  })
}

export type SavedTemplate = { id: string; version: number | null; template: NoteTemplateInput }

/** Makes a template, or changes it by the version that was seen. */
export function useSaveNoteTemplate(partyId: string) {
  return useTemplateChange(partyId, ({ id, version, template }: SavedTemplate) =>
    version === null
      ? callApi('/api/note-templates', { method: 'POST', body: { id, template }, response: partyNoteTemplateSchema })
      : callApi(`/api/note-templates/${id}`, {
          method: 'PATCH',
          body: { version, template },
          response: partyNoteTemplateSchema,
        }),
  )
}

export function useRemoveNoteTemplate(partyId: string) {
  return useTemplateChange(partyId, ({ id, version }: PartyNoteTemplate) =>
    callApi(`/api/note-templates/${id}`, { method: 'DELETE', body: { version }, response: partyNoteTemplateSchema }),
  )
}

/** It is done when the list shows it. */
function useTemplateChange<Change>(partyId: string, send: (change: Change) => Promise<PartyNoteTemplate>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: send,
    onSettled: () => client.invalidateQueries({ queryKey: templatesKey(partyId) }),
  })
}
