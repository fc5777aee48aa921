import { isDeepStrictEqual } from 'node:util'
import type { Entry, EntryInput } from '@/lib/contracts/kit'
import { entryInputSchema } from '@/lib/contracts/kit'
import { AppError } from '@/lib/errors'

export function noSuchEntry(): AppError {
  return new AppError('not-found', 'There is no such entry in a kit of this party.')
}

/** Someone was there first: the row as it is now goes along, so that both values can be shown. */
export function staleEntry(current: Entry): AppError {
  const said = current.removed
    ? `${current.name} was taken out of the kit meanwhile`
    : `Someone changed ${current.name} meanwhile`
  return new AppError('stale', `${said}. Nothing was changed; look at both and choose.`, { details: { current } })
}

export function refusedField(field: string, message: string): AppError {
  return new AppError('invalid', `${message}. Nothing was changed.`, { details: { fields: { [field]: message } } })
}

/** Whether the entry already is what a repeated request asked for, one step after the version that it saw. */
export function alreadyDone(current: Entry, input: { version: number; entry: EntryInput }): boolean {
  return (
    !current.removed &&
    current.version === input.version + 1 &&
    isDeepStrictEqual(entryInputSchema.parse(current), input.entry)
  )
}
