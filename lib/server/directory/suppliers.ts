import { db } from '@/db/client'
import { listContacts, wasWrittenTo } from '@/db/queries/contact'
import {
  deleteSupplier,
  findSupplier,
  insertSupplier,
  listSuppliers,
  supplierIsNamed,
  updateSupplier,
} from '@/db/queries/supplier'
import type { Supplier, SupplierInput, SupplierListQuery } from '@/lib/contracts/directory'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, notThere, stillInUse, thereAlready } from '@/lib/server/refusals'

export async function readSuppliers(actor: Actor, query: SupplierListQuery) {
  assertCan(actor, 'party:read')
  return listSuppliers(db(), actor, query)
}

/** A supplier with the people there. */
export async function readSupplier(actor: Actor, supplierId: string) {
  assertCan(actor, 'party:read')
  const supplier = await findSupplier(db(), actor, supplierId)
  if (!supplier) throw notThere('supplier')
  return { supplier, contacts: await listContacts(db(), actor, { supplierId }) }
}

export async function createSupplier(
  actor: Actor,
  input: { id?: string | undefined; supplier: SupplierInput },
): Promise<Supplier> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const made = await insertSupplier(tx, actor, { ...input.supplier, id: input.id })
    if (!made) return thereAlready(input.id ? await findSupplier(tx, actor, input.id) : undefined)
    await audit(tx, actor, 'supplier.added', { type: 'supplier', id: made.id }, { name: made.name })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return made
  })
}

export async function changeSupplier(
  actor: Actor,
  input: { supplierId: string; version: number; supplier: SupplierInput },
): Promise<Supplier> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const before = await findSupplier(tx, actor, input.supplierId)
    if (!before) throw notThere('supplier')
    const changed = await updateSupplier(tx, actor, {
      id: before.id,
      version: input.version,
      supplier: input.supplier,
    })
    const supplier = await changedOr('supplier', changed, () => findSupplier(tx, actor, before.id))
    await audit(
      tx,
      actor,
      'supplier.changed',
      { type: 'supplier', id: supplier.id },
      { from: before, to: input.supplier },
    )
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return supplier
  })
}

export async function removeSupplier(actor: Actor, input: { supplierId: string; version: number }): Promise<Supplier> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const supplier = await findSupplier(tx, actor, input.supplierId)
    if (!supplier) throw notThere('supplier')
    if (await supplierIsNamed(tx, actor, supplier.id)) {
      throw stillInUse(`${supplier.name} has hires or drums in your records. Take those hires away first.`)
    }
    if (await wasWrittenTo(tx, actor, { supplierId: supplier.id })) {
      throw stillInUse(`Somebody at ${supplier.name} has had mail or a link, and the record of it names them.`)
    }
    const gone = await deleteSupplier(tx, actor, { id: supplier.id, version: input.version })
    await changedOr('supplier', gone ? supplier : undefined, () => findSupplier(tx, actor, supplier.id))
    await audit(tx, actor, 'supplier.removed', { type: 'supplier', id: supplier.id }, { was: supplier })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return supplier
  })
}
