'use client'

import { useState } from 'react'
import { FormSheet } from '@/components/form/form-sheet'
import { RemoveButton } from '@/components/form/remove-button'
import { Button } from '@/components/ui/button'
import { showToast } from '@/components/ui/toast'
import { useRemoveNoteTemplate, useSaveNoteTemplate } from '@/lib/client/note-templates'
import type { NoteTemplateInput, PartyNoteTemplate } from '@/lib/contracts/note-template'
import type { NoteTemplate } from '@/lib/tuning/note-template'
import { TemplateForm } from './template-form'

export interface TemplateToolsProps {
  partyId: string
  chosen: NoteTemplate
  own: readonly PartyNoteTemplate[]
  onChoose: (templateId: string) => void
}

/** Makes, changes and removes the party's own templates, where they are used. */
export function TemplateTools({ partyId, chosen, own, onChoose }: TemplateToolsProps) {
  const [open, setOpen] = useState<'new' | 'change' | null>(null)
  const remove = useRemoveNoteTemplate(partyId)
  const save = useSaveNoteTemplate(partyId)
  const mine = own.find(({ id }) => id === chosen.id) ?? null
  const { steps, resonantCents, kickBelowLowestTom } = chosen
  const copy: NoteTemplateInput = {
    ...{ name: '', resonantCents, kickBelowLowestTom: [...kickBelowLowestTom] },
    steps: steps.kind === 'per-pair' ? { kind: 'per-pair', semitones: [...steps.semitones] } : steps,
  }
  if (open) {
    return (
      <div className="mt-2 basis-full">
        <FormSheet>
          <TemplateForm
            key={`${open} ${chosen.id}`}
            partyId={partyId}
            template={open === 'change' ? mine : null}
            start={open === 'change' && mine ? mine : copy}
            onSaved={(saved) => {
              setOpen(null)
              onChoose(saved.id)
              showToast(`${saved.name} is kept with the party’s templates.`)
            }}
            onClose={() => setOpen(null)}
          />
        </FormSheet>
      </div>
    )
  }
  return (
    <div className="-mx-4 flex flex-wrap items-center">
      <Button kind="quiet" onClick={() => setOpen('new')}>
        Make a template from {chosen.name}
      </Button>
      {mine && (
        <>
          <Button kind="quiet" onClick={() => setOpen('change')}>
            Change {mine.name}
          </Button>
          <RemoveButton
            action={`Remove ${mine.name}`}
            busy="Removing the template"
            done={`${mine.name} is removed from the party’s templates.`}
            remove={() => remove.mutateAsync(mine)}
            undo={{
              label: `Put ${mine.name} back`,
              run: () =>
                save.mutateAsync({ id: crypto.randomUUID(), version: null, template: { ...copy, name: mine.name } }),
            }}
          />
        </>
      )}
    </div>
  )
}
