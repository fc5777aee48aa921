import { db } from '@/db/client'
import { findEntry, kitEnd, markRemoved, updateEntry } from '@/db/queries/kit'
import { lockRig } from '@/db/queries/revision'
import type { Entry, EntryInput } from '@/lib/contracts/kit'
import { entryInputSchema, kitLimit } from '@/lib/contracts/kit'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { alreadyDone, noSuchEntry, refusedField, staleEntry } from './entry-refusals'
import { notifyKit } from './notify-kit'

/** Changes an entry that is as the writer saw it. Its kind stays: a drum does not turn into a stand. */
export async function changeEntry(
  actor: Actor,
  input: { entryId: string; version: number; entry: EntryInput },
): Promise<Entry> {
  assertCan(actor, 'kit:edit')
  return db().transaction(async (tx) => {
    const before = await findEntry(tx, actor, input.entryId)
    if (!before) throw noSuchEntry()
    if (before.kind !== input.entry.kind)
      throw refusedField('entry.kind', `${before.name} is a ${before.kind} and stays one: take it out and add another`)
    const changed = await updateEntry(tx, actor, { id: before.id, version: input.version, entry: input.entry })
    if (!changed) {
      const current = await findEntry(tx, actor, before.id)
      if (!current) throw noSuchEntry()
      if (alreadyDone(current, input)) return current
      throw staleEntry(current)
    }
    await audit(
      tx,
      actor,
      'kit.changed',
      { type: 'kit-entry', id: before.id },
      { from: entryInputSchema.parse(before), to: input.entry },
    )
    await notifyKit(tx, actor, before.rigId)
    return changed
  })
}

/** Takes an entry out of the kit. The row stays: the plot, a line or a reading may still speak of it. */
export async function removeEntry(actor: Actor, input: { entryId: string; version: number }): Promise<Entry> {
  assertCan(actor, 'kit:edit')
  return mark(actor, { ...input, removed: true })
}

/** Puts an entry back that was taken out, in its old place. */
export async function restoreEntry(actor: Actor, input: { entryId: string; version: number }): Promise<Entry> {
  assertCan(actor, 'kit:edit')
  return mark(actor, { ...input, removed: false })
}

async function mark(actor: Actor, input: { entryId: string; version: number; removed: boolean }): Promise<Entry> {
  const { entryId: id, version, removed } = input
  return db().transaction(async (tx) => {
    const before = await findEntry(tx, actor, id)
    if (!before || !(await lockRig(tx, actor, before.rigId))) throw noSuchEntry()
    if (!removed && (await kitEnd(tx, actor, before.rigId)).standing >= kitLimit)
      throw new AppError('conflict', `A kit holds at most ${kitLimit} entries. Take something else out first.`)
    const marked = await markRemoved(tx, actor, { id, version, removed })
    if (!marked) {
      const current = await findEntry(tx, actor, id)
      if (!current) throw noSuchEntry()
      if (current.removed === removed && current.version === version + 1) return current
      throw staleEntry(current)
    }
    await audit(
      tx,
      actor,
      removed ? 'kit.removed' : 'kit.restored',
      { type: 'kit-entry', id },
      { name: marked.name, rigId: marked.rigId },
    )
    await notifyKit(tx, actor, marked.rigId)
    return marked
  })
}
