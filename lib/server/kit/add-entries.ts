import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import type { Db, Scope } from '@/db/client'
import { insertEntries, kitEnd, listEntries, lockEntries } from '@/db/queries/kit'
import { lockRig } from '@/db/queries/revision'
import type { Entry, EntryInput, Kit } from '@/lib/contracts/kit'
import { kitLimit } from '@/lib/contracts/kit'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { noSuchRig } from '@/lib/server/plots/read-plot'
import { notifyKit } from './notify-kit'

/** Adds one entry to the end of the kit. The same id again is the same request: it answers the entry that is there. */
export async function createEntry(
  actor: Actor,
  input: { rigId: string; id?: string | undefined; entry: EntryInput },
): Promise<Entry> {
  assertCan(actor, 'kit:edit')
  const id = input.id ?? randomUUID()
  return db().transaction(async (tx) => {
    if (!(await lockRig(tx, actor, input.rigId))) throw noSuchRig()
    const made = await appendEntries(tx, actor, { rigId: input.rigId, entries: [{ id, entry: input.entry }] })
    for (const entry of made) {
      await audit(
        tx,
        actor,
        'kit.added',
        { type: 'kit-entry', id },
        { rigId: input.rigId, entry: input.entry, name: entry.name },
      )
      await notifyKit(tx, actor, input.rigId)
    }
    const [there] = made.length > 0 ? made : await lockEntries(tx, actor, { rigId: input.rigId, ids: [id] })
    if (!there) throw takenId()
    return there
  })
}

/** Adds several entries in one step. Those whose ids are there already are left as they are. */
export async function addEntries(
  actor: Actor,
  input: { rigId: string; entries: { id: string; entry: EntryInput }[] },
): Promise<Kit> {
  assertCan(actor, 'kit:edit')
  return db().transaction(async (tx) => {
    if (!(await lockRig(tx, actor, input.rigId))) throw noSuchRig()
    const made = await appendEntries(tx, actor, input)
    if (made.length > 0) {
      const names = made.map(({ name }) => name)
      await audit(tx, actor, 'kit.added', { type: 'rig', id: input.rigId }, { names, ids: made.map(({ id }) => id) })
      await notifyKit(tx, actor, input.rigId)
    }
    return { rigId: input.rigId, entries: await listEntries(tx, actor, { rigId: input.rigId, removedToo: false }) }
  })
}

/** Puts new entries behind the last one; answers only those that were new. The rig must be locked. */
export async function appendEntries(
  tx: Db,
  scope: Scope,
  input: { rigId: string; entries: readonly { id: string; entry: EntryInput }[] },
): Promise<Entry[]> {
  const { rigId } = input
  const there = await lockEntries(tx, scope, { rigId, ids: input.entries.map(({ id }) => id) })
  const fresh = input.entries.filter(({ id }) => !there.some((entry) => entry.id === id))
  const { standing, next } = await kitEnd(tx, scope, rigId)
  if (standing + fresh.length > kitLimit)
    throw new AppError(
      'conflict',
      `A kit holds at most ${kitLimit} entries and this one has ${standing}. Nothing was changed.`,
    )
  const made = await insertEntries(
    tx,
    scope,
    fresh.map(({ id, entry }, index) => ({ ...entry, id, rigId, position: next + index })),
  )
  if (made.length < fresh.length) throw takenId()
  return made
}

/** The id belongs to something else; whether that is another rig's or another party's is not told. */
function takenId(): AppError {
  return new AppError('conflict', 'This id is taken. Nothing was changed; send it with a new id.')
}
