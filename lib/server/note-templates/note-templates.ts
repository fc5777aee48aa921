import { db } from '@/db/client'
import type { Db } from '@/db/client'
import {
  deleteNoteTemplate,
  findNoteTemplate,
  insertNoteTemplate,
  listNoteTemplates,
  updateNoteTemplate,
} from '@/db/queries/note-template'
import { lockParty } from '@/db/queries/party'
import type { NoteTemplateInput, PartyNoteTemplate } from '@/lib/contracts/note-template'
import { noteTemplateLimit } from '@/lib/contracts/note-template'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, fieldFault, notThere, thereAlready } from '@/lib/server/refusals'

export async function readNoteTemplates(actor: Actor): Promise<{ templates: PartyNoteTemplate[] }> {
  assertCan(actor, 'party:read')
  return { templates: await listNoteTemplates(db(), actor) }
}

export async function createNoteTemplate(
  actor: Actor,
  input: { id?: string | undefined; template: NoteTemplateInput },
): Promise<PartyNoteTemplate> {
  assertCan(actor, 'kit:edit')
  return db().transaction(async (tx) => {
    const there = await heldTemplates(tx, actor)
    const again = there.find(({ id }) => id === input.id)
    if (again) return again
    if (there.length >= noteTemplateLimit) {
      throw new AppError(
        'conflict',
        `A party keeps at most ${noteTemplateLimit} templates. Remove one that is not used. Nothing was changed.`,
      )
    }
    refuseTakenName(there, input.template)
    const made = await insertNoteTemplate(tx, actor, input)
    // An id that is there and not ours is somebody else's.
    if (!made) return thereAlready<PartyNoteTemplate>(undefined)
    await audit(tx, actor, 'note-template.added', { type: 'note-template', id: made.id }, { name: made.name })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
    return made
  })
}

export async function changeNoteTemplate(
  actor: Actor,
  input: { templateId: string; version: number; template: NoteTemplateInput },
): Promise<PartyNoteTemplate> {
  assertCan(actor, 'kit:edit')
  return db().transaction(async (tx) => {
    const { version, template } = input
    const there = await heldTemplates(tx, actor)
    const before = there.find(({ id }) => id === input.templateId)
    if (!before) throw notThere('template')
    refuseTakenName(
      there.filter((other) => other !== before),
      template,
    )
    const changed = await updateNoteTemplate(tx, actor, { id: before.id, version, template })
    const after = await changedOr('template', changed, () => findNoteTemplate(tx, actor, before.id))
    await audit(
      tx,
      actor,
      'note-template.changed',
      { type: 'note-template', id: after.id },
      { from: before, to: after },
    )
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
    return after
  })
}

export async function removeNoteTemplate(
  actor: Actor,
  input: { templateId: string; version: number },
): Promise<PartyNoteTemplate> {
  assertCan(actor, 'kit:edit')
  return db().transaction(async (tx) => {
    const template = await findNoteTemplate(tx, actor, input.templateId)
    if (!template) throw notThere('template')
    const gone = await deleteNoteTemplate(tx, actor, { id: template.id, version: input.version })
    await changedOr('template', gone ? template : undefined, () => findNoteTemplate(tx, actor, template.id))
    await audit(tx, actor, 'note-template.removed', { type: 'note-template', id: template.id }, { was: template })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
    return template
  })
}

/** The party's templates, held still so that two people cannot take one name at once. */
async function heldTemplates(tx: Db, actor: Actor): Promise<PartyNoteTemplate[]> {
  await lockParty(tx, actor)
  return listNoteTemplates(tx, actor)
}

function refuseTakenName(others: readonly PartyNoteTemplate[], { name }: NoteTemplateInput): void {
  if (others.some((other) => other.name.toLowerCase() === name.toLowerCase())) {
    throw fieldFault('template.name', 'another template of the party has this name')
  }
}
