import { db } from '@/db/client'
import { deleteStage, findStage, insertStage, listStageChoices, stageHasShows, updateStage } from '@/db/queries/stage'
import { findVenue } from '@/db/queries/venue'
import type { Stage, StageInput } from '@/lib/contracts/directory'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, notThere, stillInUse, thereAlready } from '@/lib/server/refusals'

/** Every stage of the party with its venue, for a choice. */
export async function readStageChoices(actor: Actor) {
  assertCan(actor, 'party:read')
  return listStageChoices(db(), actor)
}

export async function createStage(
  actor: Actor,
  input: { venueId: string; id?: string | undefined; stage: StageInput },
): Promise<Stage> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    if (!(await findVenue(tx, actor, input.venueId))) throw notThere('venue')
    const made = await insertStage(tx, actor, { ...input.stage, id: input.id, venueId: input.venueId })
    if (!made) return thereAlready(input.id ? await findStage(tx, actor, input.id) : undefined)
    await audit(tx, actor, 'stage.added', { type: 'stage', id: made.id }, { venueId: input.venueId, ...input.stage })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return made
  })
}

export async function changeStage(
  actor: Actor,
  input: { stageId: string; version: number; stage: StageInput },
): Promise<Stage> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const before = await findStage(tx, actor, input.stageId)
    if (!before) throw notThere('stage')
    const changed = await updateStage(tx, actor, { id: before.id, version: input.version, stage: input.stage })
    const stage = await changedOr('stage', changed, () => findStage(tx, actor, before.id))
    await audit(tx, actor, 'stage.changed', { type: 'stage', id: stage.id }, { from: before, to: input.stage })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return stage
  })
}

export async function removeStage(actor: Actor, input: { stageId: string; version: number }): Promise<Stage> {
  assertCan(actor, 'directory:edit')
  return db().transaction(async (tx) => {
    const stage = await findStage(tx, actor, input.stageId)
    if (!stage) throw notThere('stage')
    if (await stageHasShows(tx, actor, stage.id)) {
      throw stillInUse(`${stage.name} has shows. Give them another stage first, or take them off the run.`)
    }
    const gone = await deleteStage(tx, actor, { id: stage.id, version: input.version })
    await changedOr('stage', gone ? stage : undefined, () => findStage(tx, actor, stage.id))
    await audit(tx, actor, 'stage.removed', { type: 'stage', id: stage.id }, { was: stage })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return stage
  })
}
