import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import type { Db } from '@/db/client'
import type { HireRow } from '@/db/queries/hire'
import {
  deleteHire,
  findHire,
  findHireHangers,
  insertHire,
  listHires,
  listHireShows,
  replaceHireShows,
  updateHire,
} from '@/db/queries/hire'
import { listShows } from '@/db/queries/show'
import { findSupplier, listSupplierChoices } from '@/db/queries/supplier'
import { lockTour } from '@/db/queries/tour'
import type { Hire, HireInput } from '@/lib/contracts/hire'
import { audit } from '@/lib/server/audit/audit'
import type { Actor, MemberActor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { extendLinksOfHire } from '@/lib/server/grants/extend-links'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, fieldFault, notThere, stillInUse, thereAlready } from '@/lib/server/refusals'
import { parseMoney } from '@/lib/staging/money'
import { instantOfWallTime, wallTimeOfInstant } from '@/lib/staging/wall-time'

export async function readHires(actor: Actor, tourId: string): Promise<Hire[]> {
  assertCan(actor, 'party:read')
  const rows = await listHires(db(), actor, tourId)
  const covered = await listHireShows(
    db(),
    actor,
    rows.map((row) => row.id),
  )
  return rows.map((row) => hireAnswer(row, covered))
}

export async function readSupplierChoices(actor: Actor) {
  assertCan(actor, 'party:read')
  return listSupplierChoices(db(), actor)
}

export async function createHire(
  actor: Actor,
  input: { tourId: string; id?: string | undefined; hire: HireInput },
): Promise<Hire> {
  assertCan(actor, 'hire:edit')
  return db().transaction(async (tx) => {
    if (!(await lockTour(tx, actor, input.tourId))) throw notThere('tour')
    const id = input.id ?? randomUUID()
    const there = await findHire(tx, actor, id)
    if (there) return hireNow(tx, actor, id)
    const values = await checkHire(tx, actor, input.tourId, input.hire, null)
    if (!(await insertHire(tx, actor, { ...values, id, tourId: input.tourId }))) return thereAlready<Hire>(undefined)
    await replaceHireShows(tx, actor, { hireId: id, showIds: input.hire.showIds })
    await audit(tx, actor, 'hire.added', { type: 'hire', id }, { tourId: input.tourId, ...input.hire })
    await notifyLive(tx, actor.partyId, [`run:${input.tourId}`])
    return hireNow(tx, actor, id)
  })
}

export async function changeHire(
  actor: Actor,
  input: { hireId: string; version: number; hire: HireInput },
): Promise<Hire> {
  assertCan(actor, 'hire:edit')
  return db().transaction(async (tx) => {
    const before = await findHire(tx, actor, input.hireId)
    if (!before || !(await lockTour(tx, actor, before.tourId))) throw notThere('hire')
    const was = await hireNow(tx, actor, before.id)
    if (input.hire.supplierId !== before.supplierId) await assertUnasked(tx, actor, before)
    const values = await checkHire(tx, actor, before.tourId, input.hire, before)
    const changed = await updateHire(tx, actor, { id: before.id, version: input.version, hire: values })
    await changedOr('hire', changed ? was : undefined, () => hireNow(tx, actor, before.id))
    await replaceHireShows(tx, actor, { hireId: before.id, showIds: input.hire.showIds })
    await extendLinksOfHire(tx, actor, before.id)
    await audit(tx, actor, 'hire.changed', { type: 'hire', id: before.id }, { from: was, to: input.hire })
    await notifyLive(tx, actor.partyId, [`run:${before.tourId}`, `advance:${before.id}`])
    return hireNow(tx, actor, before.id)
  })
}

export async function removeHire(actor: Actor, input: { hireId: string; version: number }): Promise<Hire> {
  assertCan(actor, 'hire:edit')
  return db().transaction(async (tx) => {
    const row = await findHire(tx, actor, input.hireId)
    if (!row) throw notThere('hire')
    const hire = await hireNow(tx, actor, row.id)
    const hangers = await findHireHangers(tx, actor, row.id)
    if (hangers?.packs || hangers?.grants || hangers?.answers) {
      throw stillInUse(`${row.supplierName} was asked or has answered, and that is kept. Change the hire instead.`)
    }
    const gone = await deleteHire(tx, actor, { id: row.id, version: input.version })
    await changedOr('hire', gone ? hire : undefined, () => hireNow(tx, actor, row.id))
    await audit(tx, actor, 'hire.removed', { type: 'hire', id: row.id }, { was: hire })
    await notifyLive(tx, actor.partyId, [`run:${row.tourId}`])
    return hire
  })
}

/** The links of one supplier must not show what another one says, so a hire that was asked stays with its supplier. */
async function assertUnasked(tx: Db, actor: MemberActor, hire: HireRow): Promise<void> {
  const hangers = await findHireHangers(tx, actor, hire.id)
  if (!hangers?.grants && !hangers?.answers) return
  throw stillInUse(
    `${hire.supplierName} was asked or has answered about this hire, and that is kept. Add another hire for the other supplier.`,
  )
}

function hireAnswer(row: HireRow, covered: readonly { hireId: string; showId: string }[]): Hire {
  const { answersDueAt, zone } = row
  return {
    ...row,
    showIds: covered.filter((entry) => entry.hireId === row.id).map((entry) => entry.showId),
    answersDueAt: answersDueAt?.toISOString() ?? null,
    answersDue: answersDueAt && zone ? wallTimeOfInstant(answersDueAt, zone) : null,
    confirmedAt: row.confirmedAt?.toISOString() ?? null,
  }
}

async function hireNow(tx: Db, actor: MemberActor, id: string): Promise<Hire> {
  const row = await findHire(tx, actor, id)
  if (!row) throw notThere('hire')
  return hireAnswer(row, await listHireShows(tx, actor, [id]))
}

/** Checks what a hire names; answers the row's values with instants and minor units derived. */
async function checkHire(tx: Db, actor: MemberActor, tourId: string, hire: HireInput, before: HireRow | null) {
  const { showIds, transport, taxPercent, answersDue, confirmed, ...same } = hire
  const supplier = await findSupplier(tx, actor, hire.supplierId)
  if (!supplier) throw fieldFault('hire.supplierId', 'choose a supplier from the directory')
  const ofTour = new Set((await listShows(tx, actor, tourId)).map((show) => show.id))
  if (showIds.some((id) => !ofTour.has(id))) throw fieldFault('hire.showIds', 'choose shows of this tour')
  const zone = hire.zone ?? supplier.zone
  if (answersDue && !zone) {
    throw fieldFault(
      'hire.answersDue',
      'the zone is not known yet, so no moment follows from this; give the zone first',
    )
  }
  return {
    ...same,
    zone,
    transportMinor: transport === '' || !hire.currency ? null : parseMoney(transport, hire.currency),
    taxBasisPoints: taxPercent === null ? null : Math.round(taxPercent * 100),
    answersDueAt: answersDue && zone ? instantOfWallTime(answersDue, zone) : null,
    confirmedAt: confirmed ? (before?.confirmedAt ?? new Date()) : null,
  }
}
