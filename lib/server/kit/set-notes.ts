import { isDeepStrictEqual } from 'node:util'
import { db } from '@/db/client'
import { listEntries, lockEntries, updateEntry } from '@/db/queries/kit'
import { lockRig } from '@/db/queries/revision'
import type { DrumEntry, Entry, Kit, SetNotes } from '@/lib/contracts/kit'
import { entryInputSchema } from '@/lib/contracts/kit'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { noSuchRig } from '@/lib/server/plots/read-plot'
import { refusedField } from './entry-refusals'
import { notifyKit } from './notify-kit'

type NoteWanted = SetNotes['notes'][number]

/** Sets the notes of many drums in one step: all of them, or none when one drum is no longer as it was seen. */
export async function setNotes(actor: Actor, input: { rigId: string } & SetNotes): Promise<Kit> {
  assertCan(actor, 'kit:edit')
  const { rigId, notes } = input
  return db().transaction(async (tx) => {
    if (!(await lockRig(tx, actor, rigId))) throw noSuchRig()
    const rows = await lockEntries(tx, actor, { rigId, ids: notes.map(({ entryId }) => entryId) })
    const pairs = notes.map((wanted, index) => ({ wanted, drum: drumOf(rows, wanted, index) }))
    const stale = pairs.filter(({ wanted, drum }) => !hasNote(drum, wanted) && drum.version !== wanted.version)
    if (stale.length > 0 || pairs.some(({ drum }) => drum.removed)) {
      const current = stale.map(({ drum }) => drum)
      const names = pairs.filter(({ drum }) => drum.removed || current.includes(drum)).map(({ drum }) => drum.name)
      throw new AppError(
        'stale',
        `Someone changed ${names.join(', ')} meanwhile. No note was set; look at them again.`,
        {
          details: { current: { rigId, entries: await listEntries(tx, actor, { rigId, removedToo: false }) } },
        },
      )
    }
    const changes = pairs.filter(({ wanted, drum }) => !hasNote(drum, wanted))
    for (const { wanted, drum } of changes)
      await updateEntry(tx, actor, { id: drum.id, version: drum.version, entry: noted(drum, wanted) })
    if (changes.length > 0) {
      const detail = changes.map(({ wanted, drum }) => ({
        ...{ id: drum.id, from: drum.spec.note, to: wanted.note },
        ...(wanted.headRelationCents === undefined
          ? {}
          : { headRelationCents: { from: drum.spec.headRelationCents, to: wanted.headRelationCents } }),
      }))
      await audit(tx, actor, 'kit.notes-set', { type: 'rig', id: rigId }, { notes: detail })
      await notifyKit(tx, actor, rigId)
    }
    return { rigId, entries: await listEntries(tx, actor, { rigId, removedToo: false }) }
  })
}

function drumOf(rows: readonly Entry[], { entryId }: NoteWanted, index: number): DrumEntry {
  const entry = rows.find(({ id }) => id === entryId)
  if (!entry) throw refusedField(`notes.${index}.entryId`, 'There is no such drum in this kit')
  if (entry.kind !== 'drum') throw refusedField(`notes.${index}.entryId`, `${entry.name} is no drum and has no note`)
  return entry
}

/** A drum that already has the note wanted is no conflict: the request came twice, or two people wanted the same. */
function hasNote(drum: DrumEntry, wanted: NoteWanted): boolean {
  const { note, noteLocked, headRelationCents } = drum.spec
  return (
    isDeepStrictEqual(note, wanted.note) &&
    noteLocked === wanted.noteLocked &&
    (wanted.headRelationCents ?? headRelationCents) === headRelationCents
  )
}

function noted(drum: DrumEntry, { note, noteLocked, headRelationCents = drum.spec.headRelationCents }: NoteWanted) {
  return entryInputSchema.parse({ ...drum, spec: { ...drum.spec, note, noteLocked, headRelationCents } })
}
