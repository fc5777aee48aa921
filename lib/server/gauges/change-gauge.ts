import { isDeepStrictEqual } from 'node:util'
import { db } from '@/db/client'
import type { Db } from '@/db/client'
import {
  findGauge,
  insertGauge,
  listGaugePairs,
  listGauges,
  lockGauge,
  markGaugeRemoved,
  setToursGauge,
  updateGauge,
} from '@/db/queries/gauge'
import { lockParty } from '@/db/queries/party'
import type { Gauge, GaugeInput, Gauges } from '@/lib/contracts/gauge'
import { gaugeInputSchema, gaugeLimit } from '@/lib/contracts/gauge'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, fieldFault, notThere, thereAlready } from '@/lib/server/refusals'

/** Adds a gauge. The first of a party is the tour's until another is chosen. */
export async function createGauge(actor: Actor, input: { id?: string | undefined; gauge: GaugeInput }): Promise<Gauge> {
  assertCan(actor, 'gauge:edit')
  return db().transaction(async (tx) => {
    await lockParty(tx, actor)
    const again = input.id === undefined ? undefined : await findGauge(tx, actor, input.id)
    if (again) return again
    const there = await listGauges(tx, actor)
    refuseMore(there.length)
    refuseTakenName(there, input.gauge.name)
    const made = await insertGauge(tx, actor, input)
    // An id that is there and not ours is somebody else's.
    if (!made) return thereAlready<Gauge>(undefined)
    const first = there.length === 0
    if (first) await setToursGauge(tx, actor, made.id)
    await audit(tx, actor, 'gauge.added', { type: 'gauge', id: made.id }, { name: made.name, scale: made.scale })
    await notifyGauges(tx, actor)
    return { ...made, toursGauge: first }
  })
}

export async function changeGauge(
  actor: Actor,
  input: { gaugeId: string; version: number; gauge: GaugeInput },
): Promise<Gauge> {
  assertCan(actor, 'gauge:edit')
  const { version, gauge } = input
  return db().transaction(async (tx) => {
    await lockParty(tx, actor)
    const before = await lockGauge(tx, actor, input.gaugeId)
    if (!before || before.removed) throw notThere('gauge')
    const repeated =
      before.version === version + 1 && isDeepStrictEqual(gaugeInputSchema.parse(before), gaugeInputSchema.parse(gauge))
    if (repeated) return before
    refuseTakenName(
      (await listGauges(tx, actor)).filter(({ id }) => id !== before.id),
      gauge.name,
    )
    await refuseDialWithoutReadings(tx, actor, before.id, gauge.scale)
    const changed = await updateGauge(tx, actor, { id: before.id, version, gauge })
    const after = await changedOr('gauge', changed, () => findGauge(tx, actor, before.id))
    const told = ({ name, scale, remark }: Gauge) => ({ name, scale, remark })
    await audit(tx, actor, 'gauge.changed', { type: 'gauge', id: after.id }, { from: told(before), to: told(after) })
    await notifyGauges(tx, actor)
    return after
  })
}

/** Takes a gauge away; its row and its pairs stay, so that it can be put back. */
export async function removeGauge(actor: Actor, input: { gaugeId: string; version: number }): Promise<Gauge> {
  assertCan(actor, 'gauge:edit')
  return mark(actor, { ...input, removed: true })
}

/** Puts a gauge back. Whether it is the tour's again is a choice of its own. */
export async function restoreGauge(actor: Actor, input: { gaugeId: string; version: number }): Promise<Gauge> {
  assertCan(actor, 'gauge:edit')
  return mark(actor, { ...input, removed: false })
}

/** Which gauge revisions freeze and sheets speak of. The last choice holds. */
export async function chooseToursGauge(actor: Actor, { gaugeId }: { gaugeId: string | null }): Promise<Gauges> {
  assertCan(actor, 'gauge:edit')
  return db().transaction(async (tx) => {
    await lockParty(tx, actor)
    const before = await listGauges(tx, actor)
    const chosen = before.find(({ id }) => id === gaugeId)
    if (gaugeId !== null && !chosen) throw notThere('gauge')
    const was = before.find(({ toursGauge }) => toursGauge)
    if (was?.id !== chosen?.id) {
      await setToursGauge(tx, actor, gaugeId)
      const subject = { type: 'gauge', id: chosen?.id ?? was?.id ?? actor.partyId }
      await audit(tx, actor, 'gauge.chosen', subject, { from: was?.name ?? '', to: chosen?.name ?? '' })
      await notifyGauges(tx, actor)
    }
    return { gauges: await listGauges(tx, actor) }
  })
}

/** Gauges changed, and with them what a revision would freeze and a kit page shows. */
export async function notifyGauges(tx: Db, actor: Actor): Promise<void> {
  await notifyLive(tx, actor.partyId, [`gauge:${actor.partyId}`])
}

async function mark(actor: Actor, input: { gaugeId: string; version: number; removed: boolean }): Promise<Gauge> {
  const { gaugeId: id, version, removed } = input
  return db().transaction(async (tx) => {
    await lockParty(tx, actor)
    const before = await lockGauge(tx, actor, id)
    if (!before) throw notThere('gauge')
    if (before.removed === removed && before.version === version + 1) return before
    if (!removed) {
      const there = (await listGauges(tx, actor)).filter((other) => other.id !== id)
      refuseMore(there.length)
      if (taken(there, before.name))
        throw new AppError(
          'conflict',
          `Another gauge is called ${before.name} by now. Rename it first; nothing was changed.`,
        )
    }
    const marked = await markGaugeRemoved(tx, actor, { id, version, removed })
    const after = await changedOr('gauge', marked, () => findGauge(tx, actor, id))
    await audit(tx, actor, removed ? 'gauge.removed' : 'gauge.restored', { type: 'gauge', id }, { name: after.name })
    await notifyGauges(tx, actor)
    return after
  })
}

function refuseMore(standing: number): void {
  if (standing >= gaugeLimit)
    throw new AppError(
      'conflict',
      `A party keeps at most ${gaugeLimit} gauges. Take one away that is not used. Nothing was changed.`,
    )
}

function taken(others: readonly Pick<Gauge, 'name'>[], name: string): boolean {
  return others.some((other) => other.name.toLowerCase() === name.toLowerCase())
}

function refuseTakenName(others: readonly Pick<Gauge, 'name'>[], name: string): void {
  if (taken(others, name)) throw fieldFault('gauge.name', 'another gauge of the party has this name')
}

/** A dial that could not have shown what was read off it. */
async function refuseDialWithoutReadings(tx: Db, actor: Actor, gaugeId: string, scale: Gauge['scale']): Promise<void> {
  const pairs = await listGaugePairs(tx, actor, { gaugeId, struckToo: false })
  const off = (field: 'min' | 'max', reading: number) =>
    fieldFault(`gauge.scale.${field}`, `the pairs hold a reading of ${reading}; strike it first`)
  for (const { reading } of pairs) {
    if (reading < scale.min) throw off('min', reading)
    if (reading > scale.max) throw off('max', reading)
  }
}
