import { db } from '@/db/client'
import type { ContactOf } from '@/db/queries/contact'
import { wasWrittenTo, deleteContact, findContact, insertContact, updateContact } from '@/db/queries/contact'
import { findSupplier } from '@/db/queries/supplier'
import { findVenue } from '@/db/queries/venue'
import type { Contact, ContactInput } from '@/lib/contracts/directory'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, notThere, stillInUse, thereAlready } from '@/lib/server/refusals'

export async function createContact(
  actor: Actor,
  input: { of: ContactOf; id?: string | undefined; contact: ContactInput },
): Promise<Contact> {
  assertCan(actor, 'directory:edit')
  const { of } = input
  return db().transaction(async (tx) => {
    const there =
      'venueId' in of ? await findVenue(tx, actor, of.venueId) : await findSupplier(tx, actor, of.supplierId)
    if (!there) throw notThere('venueId' in of ? 'venue' : 'supplier')
    const made = await insertContact(tx, actor, { ...input.contact, ...of, id: input.id })
    if (!made) return thereAlready(input.id ? await findContact(tx, actor, input.id) : undefined)
    // The trail says who and what for; an address stays in the row alone.
    await audit(tx, actor, 'contact.added', { type: 'contact', id: made.id }, { ...of, duties: made.duties })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return made
  })
}

export async function changeContact(
  actor: Actor,
  input: { contactId: string; version: number; contact: ContactInput },
): Promise<Contact> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const before = await findContact(tx, actor, input.contactId)
    if (!before) throw notThere('contact')
    const changed = await updateContact(tx, actor, { id: before.id, version: input.version, contact: input.contact })
    const contact = await changedOr('contact', changed, () => findContact(tx, actor, before.id))
    const fields = (['name', 'email', 'phone'] as const).filter((field) => before[field] !== contact[field])
    await audit(
      tx,
      actor,
      'contact.changed',
      { type: 'contact', id: contact.id },
      {
        fields,
        from: { duties: before.duties },
        to: { duties: contact.duties },
      },
    )
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return contact
  })
}

export async function removeContact(actor: Actor, input: { contactId: string; version: number }): Promise<Contact> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const contact = await findContact(tx, actor, input.contactId)
    if (!contact) throw notThere('contact')
    if (await wasWrittenTo(tx, actor, { contactId: contact.id })) {
      throw stillInUse(
        `${contact.name} has had mail or a link, and the record of it names this contact. Change the contact instead.`,
      )
    }
    const gone = await deleteContact(tx, actor, { id: contact.id, version: input.version })
    await changedOr('contact', gone ? contact : undefined, () => findContact(tx, actor, contact.id))
    await audit(tx, actor, 'contact.removed', { type: 'contact', id: contact.id }, { duties: contact.duties })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return contact
  })
}
