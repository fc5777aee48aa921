import { db } from '@/db/client'
import { findRig, insertRig, listRigs, rigNameTaken, updateRig } from '@/db/queries/rig'
import { lockTour } from '@/db/queries/tour'
import type { Rig, RigInput } from '@/lib/contracts/tour'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, fieldFault, notThere, thereAlready } from '@/lib/server/refusals'

export async function readRigs(actor: Actor, tourId: string): Promise<Rig[]> {
  assertCan(actor, 'party:read')
  return listRigs(db(), actor, tourId)
}

const nameTaken = () => fieldFault('rig.name', 'another rig of this tour has this name')

export async function createRig(
  actor: Actor,
  input: { tourId: string; id?: string | undefined; rig: RigInput },
): Promise<Rig> {
  assertCan(actor, 'rig:edit')
  return db().transaction(async (tx) => {
    if (!(await lockTour(tx, actor, input.tourId))) throw notThere('tour')
    const there = input.id ? await findRig(tx, actor, input.id) : undefined
    if (there) return there
    if (await rigNameTaken(tx, actor, { tourId: input.tourId, name: input.rig.name, exceptId: null })) throw nameTaken()
    const made = await insertRig(tx, actor, { ...input.rig, id: input.id, tourId: input.tourId })
    if (!made) return thereAlready<Rig>(undefined)
    await audit(tx, actor, 'rig.added', { type: 'rig', id: made.id }, { tourId: input.tourId, ...input.rig })
    await notifyLive(tx, actor.partyId, [`run:${input.tourId}`])
    return made
  })
}

export async function changeRig(actor: Actor, input: { rigId: string; version: number; rig: RigInput }): Promise<Rig> {
  assertCan(actor, 'rig:edit')
  return db().transaction(async (tx) => {
    const before = await findRig(tx, actor, input.rigId)
    if (!before || !(await lockTour(tx, actor, before.tourId))) throw notThere('rig')
    if (await rigNameTaken(tx, actor, { tourId: before.tourId, name: input.rig.name, exceptId: before.id }))
      throw nameTaken()
    const changed = await updateRig(tx, actor, { id: before.id, version: input.version, rig: input.rig })
    const rig = await changedOr('rig', changed, () => findRig(tx, actor, before.id))
    await audit(tx, actor, 'rig.changed', { type: 'rig', id: rig.id }, { from: before, to: input.rig })
    await notifyLive(tx, actor.partyId, [`run:${rig.tourId}`])
    return rig
  })
}
