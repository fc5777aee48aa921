import { randomUUID } from 'node:crypto'
import type { Db } from '@/db/client'
import {
  findLastSentRevision,
  findPackHire,
  insertPack,
  listHireShowIds,
  listHouseContacts,
  listPackShows,
  listPartyCrew,
  listSupplierNames,
} from '@/db/queries/pack'
import { findNewestRevision, findRevision } from '@/db/queries/revision'
import { composePack } from '@/lib/advance/pack'
import type { PackContactInput, PackRecipient, PackShowInput } from '@/lib/advance/pack-input'
import type { PackDocument } from '@/lib/advance/pack-document'
import { upgradeRevisionDocument } from '@/lib/advance/revision-document'
import { roleWords } from '@/lib/contracts/common'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { MemberActor } from '@/lib/server/auth/actor'

export type StorePackInput = {
  /** Made by the client that may repeat itself. */
  id?: string | undefined
  of: { showId: string } | { hireId: string }
  /** The rig's newest revision unless given. */
  revisionId?: string | undefined
  /** Of a hire over shows of several rigs: which one is packed. */
  rigId?: string | undefined
  /** Whom it goes to: what changed is told against what this reader had. Anybody's last pack unless given. */
  contactId?: string | undefined
  /** The reader's language; the party's unless given. */
  locale?: string | undefined
}

export type StoredPack = { packId: string; revisionId: string; revisionNumber: number; document: PackDocument }

/**
 * Composes the pack of a recipient and keeps it, in the caller's transaction. The PDF is another step: enqueue
 * `make-pack-pdf`. The caller has asserted what the actor may do.
 */
export async function storePack(tx: Db, actor: MemberActor, input: StorePackInput): Promise<StoredPack> {
  const { of } = input
  const target = 'showId' in of ? await ofShow(tx, actor, of.showId) : await ofHire(tx, actor, of.hireId, input.rigId)
  const revision = await revisionFor(tx, actor, target, input.revisionId)
  const frozen = upgradeRevisionDocument(revision.document)
  const locale = input.locale ?? frozen.party.locale
  const sent = await findLastSentRevision(tx, actor, { of, rigId: target.rigId, contactId: input.contactId })
  const document = composePack({
    revision: {
      number: revision.number,
      issuedAt: revision.issuedAt.toISOString(),
      note: revision.note,
      document: frozen,
    },
    recipient: { ...target.recipient, locale },
    contacts: [...(await partyContacts(tx, actor)), ...target.contacts],
    previous: sent ? { number: sent.number, document: upgradeRevisionDocument(sent.document) } : null,
  })
  if (document.lines.length === 0 && document.audience === 'supplier') {
    throw new AppError(
      'conflict',
      'This revision asks the supplier for nothing: no entry of the kit is rented. Nothing was made.',
    )
  }
  const packId = await insertPack(tx, actor, {
    id: input.id ?? randomUUID(),
    revisionId: revision.id,
    showId: 'showId' in of ? of.showId : null,
    hireId: 'hireId' in of ? of.hireId : null,
    schemaVersion: document.schemaVersion,
    document,
  })
  if (!packId) throw new AppError('conflict', 'This id is taken. Please send it again with another one.')
  await audit(
    tx,
    actor,
    'pack.make',
    { type: 'pack', id: packId },
    { ...of, revisionId: revision.id, number: revision.number },
  )
  return { packId, revisionId: revision.id, revisionNumber: revision.number, document }
}

// A recipient before the reader's language is known; distributive, so that each kind keeps its own fields.
type Unspoken<Recipient> = Recipient extends unknown ? Omit<Recipient, 'locale'> : never
type Target = { rigId: string; rigName: string; recipient: Unspoken<PackRecipient>; contacts: PackContactInput[] }

async function ofShow(tx: Db, actor: MemberActor, showId: string): Promise<Target> {
  const [show] = await packShows(tx, actor, [showId])
  if (!show) throw new AppError('not-found', 'There is no such show in this party.')
  return {
    ...{ rigId: show.rigId, rigName: show.rigName },
    recipient: { kind: 'venue', show },
    contacts: await houseContacts(tx, actor, { kind: 'venue', id: show.venue.id }),
  }
}

async function ofHire(tx: Db, actor: MemberActor, hireId: string, rigId: string | undefined): Promise<Target> {
  const hire = await findPackHire(tx, actor, hireId)
  if (!hire) throw new AppError('not-found', 'There is no such hire in this party.')
  const all = await packShows(tx, actor, await listHireShowIds(tx, actor, hireId))
  const rigs = new Map(all.map((show) => [show.rigId, show.rigName]))
  if (rigs.size === 0) throw new AppError('conflict', 'This hire covers no show yet. Add its shows first.')
  if (rigId === undefined && rigs.size > 1) {
    throw new AppError(
      'conflict',
      `This hire covers shows of ${[...rigs.values()].join(' and ')}. Say which rig this pack is for.`,
      {
        details: { rigIds: [...rigs.keys()] },
      },
    )
  }
  const chosen = rigId ?? [...rigs.keys()][0] ?? ''
  const rigName = rigs.get(chosen)
  if (rigName === undefined) throw new AppError('not-found', 'No show of this hire plays that rig.')
  return {
    ...{ rigId: chosen, rigName },
    recipient: {
      kind: 'supplier',
      hire: { ...hire, answersDueAt: hire.answersDueAt?.toISOString() ?? null },
      shows: all.filter((show) => show.rigId === chosen),
    },
    contacts: await houseContacts(tx, actor, { kind: 'supplier', id: hire.supplier.id }),
  }
}

async function packShows(
  tx: Db,
  actor: MemberActor,
  showIds: string[],
): Promise<(PackShowInput & { rigId: string; rigName: string })[]> {
  const rows = await listPackShows(tx, actor, showIds)
  const shows = []
  for (const row of rows) {
    const supplierNames = await listSupplierNames(tx, actor, row.id)
    shows.push({ ...row, answersDueAt: row.answersDueAt?.toISOString() ?? null, supplierNames })
  }
  return shows
}

async function revisionFor(tx: Db, actor: MemberActor, target: Target, revisionId: string | undefined) {
  const revision = revisionId
    ? await findRevision(tx, actor, revisionId)
    : await findNewestRevision(tx, actor, { rigId: target.rigId })
  if (revision?.rigId === target.rigId) return revision
  if (revisionId) throw new AppError('not-found', `There is no such revision of ${target.rigName}.`)
  throw new AppError(
    'conflict',
    `No revision of ${target.rigName} was issued yet. Issue one first; then there is something to send.`,
  )
}

async function partyContacts(tx: Db, actor: MemberActor): Promise<PackContactInput[]> {
  const crew = await listPartyCrew(tx, actor)
  return crew.map(({ name, email, roles }) => ({
    of: { kind: 'party' },
    ...{ name, email, phone: '' },
    duty: roles
      .filter((role) => role === 'tour-manager' || role === 'drum-tech')
      .map((role) => roleWords[role])
      .join(', '),
  }))
}

async function houseContacts(
  tx: Db,
  actor: MemberActor,
  of: { kind: 'venue' | 'supplier'; id: string },
): Promise<PackContactInput[]> {
  const rows = await listHouseContacts(tx, actor, of.kind === 'venue' ? { venueId: of.id } : { supplierId: of.id })
  return rows.map(({ duties, ...contact }) => ({ ...contact, of, duty: duties.join(', ') }))
}
