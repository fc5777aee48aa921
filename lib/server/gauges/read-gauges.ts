import { db } from '@/db/client'
import type { Db, Scope } from '@/db/client'
import { findGauge, findToursGauge, listGaugePairs, listGauges, listPartyDrums } from '@/db/queries/gauge'
import { findParty } from '@/db/queries/party'
import type { FrozenGauge } from '@/lib/advance/frozen-gauge'
import { headWords, inchWords } from '@/lib/advance/kit-words'
import type { Gauges, GaugeWithPairs, KnownHead } from '@/lib/contracts/gauge'
import type { DrumSpec } from '@/lib/contracts/kit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notThere } from '@/lib/server/refusals'
import { drumEstimate } from '@/lib/tuning/drum-estimate'

export async function readGauges(actor: Actor): Promise<Gauges> {
  assertCan(actor, 'party:read')
  return { gauges: await listGauges(db(), actor) }
}

export async function readGauge(actor: Actor, gaugeId: string): Promise<GaugeWithPairs> {
  assertCan(actor, 'party:read')
  const gauge = await findGauge(db(), actor, gaugeId)
  if (!gauge) throw notThere('gauge')
  return { gauge, pairs: await listGaugePairs(db(), actor, { gaugeId, struckToo: true }) }
}

/** The tour's gauge with its standing pairs, for a page that shows what it should read; null when none was chosen. */
export async function readToursGauge(actor: Actor): Promise<FrozenGauge | null> {
  assertCan(actor, 'party:read')
  return loadToursGauge(db(), actor)
}

/** The same within a transaction that has already asked who may. */
export async function loadToursGauge(tx: Db, scope: Scope): Promise<FrozenGauge | null> {
  const gauge = await findToursGauge(tx, scope)
  if (!gauge) return null
  const pairs = await listGaugePairs(tx, scope, { gaugeId: gauge.id, struckToo: false })
  return {
    ...{ id: gauge.id, name: gauge.name, scale: gauge.scale },
    pairs: pairs.map(({ reading, diameterIn, depthIn, plyMils, coatingGPerM2, tapHz, temperatureC }) => ({
      ...{ reading, diameterIn, depthIn, plyMils, coatingGPerM2, tapHz, temperatureC },
    })),
  }
}

/** The heads of the party's kits, each film on each size once, with the tap that its note asks for. */
export async function readKnownHeads(actor: Actor): Promise<KnownHead[]> {
  assertCan(actor, 'party:read')
  const party = await findParty(db(), actor)
  if (!party) throw notThere('party')
  const known = new Map<string, KnownHead>()
  for (const { name, spec } of await listPartyDrums(db(), actor)) {
    const figures = drumEstimate(spec, { referenceHz: party.referenceHz })
    const batterTap = figures?.tuning?.batter.tapHz.value ?? null
    const resonantTap = figures?.tuning?.resonant?.tapHz.value ?? null
    for (const head of [
      knownHead(name, spec, 'batter', spec.batter, batterTap),
      spec.resonant && knownHead(name, spec, 'resonant', spec.resonant, resonantTap),
    ])
      if (head && !known.has(head.words)) known.set(head.words, head)
  }
  return [...known.values()]
}

function knownHead(
  name: string,
  { diameterIn, depthIn, ported, resonant }: DrumSpec,
  side: 'batter' | 'resonant',
  head: DrumSpec['batter'],
  tapHz: number | null,
): KnownHead {
  const { plyMils, film, coatingGPerM2 } = head
  const size = `${inchWords(diameterIn)}×${inchWords(depthIn)} in`
  const words = `${name}, ${side}: ${size}, ${headWords({ plyMils, film, damping: 'none' })}`
  const openShell = ported || resonant === null
  return { words, diameterIn, depthIn, plyMils, film, coatingGPerM2, openShell, tapHz }
}
