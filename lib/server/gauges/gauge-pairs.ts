import { randomUUID } from 'node:crypto'
import { db } from '@/db/client'
import { countGaugePairs, findGaugePair, insertGaugePair, lockGauge, markGaugePairStruck } from '@/db/queries/gauge'
import type { GaugePairInput, GaugePairRow } from '@/lib/contracts/gauge'
import { gaugePairLimit } from '@/lib/contracts/gauge'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { fieldFault, notThere, thereAlready } from '@/lib/server/refusals'
import { GaugeError } from '@/lib/tuning/gauge-error'
import { requireReading } from '@/lib/tuning/gauge-profile'
import type { GaugeScale } from '@/lib/tuning/gauge-profile'
import { tensionOfTapNPerM } from '@/lib/tuning/gauge-tension'
import { notifyGauges } from './change-gauge'

/** Adds a pair. The same id again is the same pair. Whether it fits the others is the calibration's to say, not a refusal. */
export async function addGaugePair(
  actor: Actor,
  input: { gaugeId: string; id?: string | undefined; pair: GaugePairInput },
): Promise<GaugePairRow> {
  assertCan(actor, 'gauge:edit')
  const { gaugeId, pair } = input
  const id = input.id ?? randomUUID()
  return db().transaction(async (tx) => {
    const gauge = await lockGauge(tx, actor, gaugeId)
    if (!gauge || gauge.removed) throw notThere('gauge')
    const again = await findGaugePair(tx, actor, id)
    if (again) return thereAlready(again.gaugeId === gaugeId ? again : undefined)
    refuseImpossible(pair, gauge.scale)
    refuseMore(await countGaugePairs(tx, actor, gaugeId))
    const made = await insertGaugePair(tx, actor, { id, gaugeId, byPersonId: actor.personId, pair })
    const row = thereAlready(made ? await findGaugePair(tx, actor, id) : undefined)
    await audit(tx, actor, 'gauge.pair-added', { type: 'gauge', id: gaugeId }, told(gauge.name, row))
    await notifyGauges(tx, actor)
    return row
  })
}

/** Strikes a pair out of the calibration; it stays to be read. Struck twice is struck once. */
export async function strikeGaugePair(actor: Actor, input: { pairId: string }): Promise<GaugePairRow> {
  assertCan(actor, 'gauge:edit')
  return mark(actor, { ...input, struck: true })
}

/** Lets a struck pair count again. */
export async function restoreGaugePair(actor: Actor, input: { pairId: string }): Promise<GaugePairRow> {
  assertCan(actor, 'gauge:edit')
  return mark(actor, { ...input, struck: false })
}

async function mark(actor: Actor, { pairId, struck }: { pairId: string; struck: boolean }): Promise<GaugePairRow> {
  return db().transaction(async (tx) => {
    const found = await findGaugePair(tx, actor, pairId)
    const gauge = found && (await lockGauge(tx, actor, found.gaugeId))
    if (!found || !gauge || gauge.removed) throw notThere('pair')
    // Whoever changes a pair holds its gauge, so what is read now stands until the end.
    const before = (await findGaugePair(tx, actor, pairId)) ?? found
    if (before.struck === struck) return before
    if (!struck) {
      refuseImpossible(before, gauge.scale)
      refuseMore(await countGaugePairs(tx, actor, gauge.id))
    }
    await markGaugePairStruck(tx, actor, { id: pairId, struck })
    const row = { ...before, struck }
    const action = struck ? 'gauge.pair-struck' : 'gauge.pair-restored'
    await audit(tx, actor, action, { type: 'gauge', id: gauge.id }, told(gauge.name, row))
    await notifyGauges(tx, actor)
    return row
  })
}

function told(name: string, { id: pairId, reading, tapHz }: GaugePairRow) {
  return { name, pairId, reading, tapHz }
}

function refuseMore(standing: number): void {
  if (standing >= gaugePairLimit)
    throw new AppError(
      'conflict',
      `A gauge keeps at most ${gaugePairLimit} pairs. Strike old ones first. Nothing was changed.`,
    )
}

function refuseImpossible(pair: GaugePairInput, scale: GaugeScale): void {
  try {
    requireReading(pair.reading, scale)
    tensionOfTapNPerM(pair, pair.tapHz, pair.temperatureC)
  } catch (error) {
    if (error instanceof GaugeError) throw fieldFault(`pair.${error.field}`, error.message)
    throw error
  }
}
