import { useState } from 'react'
import type { FieldValues, Path, UseFormReturn } from 'react-hook-form'
import { useMarkEntry, useSaveEntry } from '@/lib/client/kit'
import type { Entry, EntryInput } from '@/lib/contracts/kit'
import { entrySchema } from '@/lib/contracts/kit'
import { formPath } from '@/lib/contracts/kit-form'
import { AppError } from '@/lib/errors'
import type { EntryTarget } from './entry-target'

/**
 * Saves what a form holds. A refusal that names fields goes to the fields; when someone else was first, `theirs` holds the entry
 * as it now is beside `mine`, and saving again goes on top of it.
 */
export function useSaveForm<Form extends FieldValues>(options: {
  rigId: string
  target: EntryTarget
  form: UseFormReturn<Form, unknown, EntryInput>
  onSaved: (entry: Entry) => void
}) {
  const { rigId, target, form, onSaved } = options
  const save = useSaveEntry(rigId)
  const mark = useMarkEntry(rigId)
  const [clash, setClash] = useState<{ theirs: Entry; mine: EntryInput } | null>(null)
  const [said, setSaid] = useState<string | null>(null)
  const version = clash?.theirs.version ?? (target.do === 'change' ? target.start.version : 1)

  const send = async (entry: EntryInput, seen: number) => {
    setSaid(null)
    const { id } = target
    try {
      onSaved(
        await save.mutateAsync(
          target.do === 'add' ? { do: 'add', id, entry } : { do: 'change', id, version: seen, entry },
        ),
      )
    } catch (error) {
      if (!(error instanceof AppError)) throw error
      refused(error, entry)
    }
  }
  const refused = (error: AppError, mine: EntryInput) => {
    const theirs = entrySchema.safeParse(error.details?.['current'])
    if (error.code === 'stale' && theirs.success) return setClash({ theirs: theirs.data, mine })
    const fields = Object.entries((error.details?.['fields'] ?? {}) as Record<string, string>)
    for (const [field, message] of fields) {
      const path = formPath(field.split('.').slice(field.startsWith('entry.') ? 1 : 0)).join('.')
      form.setError(path as Path<Form>, { message })
    }
    setSaid(error.message)
  }
  return {
    clash,
    /** Why it was not saved, where that is not about a field alone. */
    said,
    busy: save.isPending || mark.isPending,
    /** How often it was sent in vain for want of a connection. */
    tries: save.failureCount + mark.failureCount,
    submit: form.handleSubmit((entry) => send(entry, version)),
    /** Puts mine over theirs; an entry that was taken out comes back first. */
    keepMine: async () => {
      if (!clash) return
      try {
        const { theirs } = clash
        const standing = theirs.removed ? await mark.mutateAsync({ entry: theirs, removed: false }) : theirs
        setClash(null)
        await form.handleSubmit((entry) => send(entry, standing.version))()
      } catch (error) {
        if (!(error instanceof AppError)) throw error
        refused(error, clash.mine)
      }
    },
  }
}
