import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import { db } from '@/db/client'
import type { Db } from '@/db/client'
import type { ReadingRow } from '@/db/queries/bench'
import {
  findDeviceNumbers,
  findReadings,
  findStruck,
  insertPhysicalDrum,
  insertReadings,
  listBenchDrums,
  lockBench,
  setBenchDrum,
} from '@/db/queries/bench'
import { countTokenUse } from '@/db/queries/grant'
import { findShow } from '@/db/queries/show'
import type { addedReadingsSchema, ReadingInput } from '@/lib/contracts/bench'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { notThere } from '@/lib/server/refusals'
import { assertAtBench } from './assert-at-bench'
import { benchReading } from './bench-answer'
import { assertRoomOnBench } from './bench-limit'
import type { NightSheet } from './read-night-sheet'
import { readNightSheet } from './read-night-sheet'

/**
 * Logs a batch of readings, all or none. A reading that is there already is the same reading, so a batch that was sent twice
 * gets the same answer; batches may arrive in any order. A faulty one names its field and nothing of the batch is kept.
 */
export async function addReadings(
  actor: Actor,
  input: { showId: string; readings: readonly ReadingInput[] },
): Promise<z.input<typeof addedReadingsSchema>> {
  assertAtBench(actor, input.showId, 'bench:log')
  return db().transaction(async (tx) => {
    await lockBench(tx, actor, input.showId)
    const show = await findShow(tx, actor, input.showId)
    if (!show) throw notThere('show')
    const ids = input.readings.map(({ id }) => id)
    const known = new Map((await findReadings(tx, actor, ids)).map((row) => [row.id, row]))
    const faults: Faults = {}
    input.readings.forEach((reading, index) => {
      const row = known.get(reading.id)
      if (row && !isSame(row, reading, show.id)) faults[`readings.${index}.id`] = 'this id belongs to another reading'
    })
    const fresh = input.readings.flatMap((reading, index) => (known.has(reading.id) ? [] : [{ reading, index }]))
    if (fresh.length > 0) {
      await assertRoomOnBench(tx, actor, show.id, { readings: fresh.length })
      const sheet = await readNightSheet(tx, actor, show)
      if (!sheet)
        throw new AppError(
          'conflict',
          'No revision was issued for this show yet, so there is no drum to read. Nothing was kept.',
        )
      checkAgainstSheet(fresh, sheet, faults)
      await checkNumbers(tx, actor, fresh, faults)
      refuseAny(faults)
      const drums = await physicalDrums(tx, actor, {
        showId: show.id,
        sheet,
        entryIds: fresh.map(({ reading }) => reading.entryId),
      })
      await checkStrikes(tx, actor, { showId: show.id, fresh, drums }, faults)
      refuseAny(faults)
      const stored = await insertReadings(
        tx,
        actor,
        fresh.map(({ reading }) => readingRow(actor, show.id, reading, drums.get(reading.entryId) ?? '')),
      )
      if (stored < fresh.length) {
        throw new AppError('conflict', 'An id or a device number of this batch is taken. Nothing of it was kept.')
      }
      const entryIds = [...new Set(fresh.map(({ reading }) => reading.entryId))]
      await audit(tx, actor, 'bench.read', { type: 'show', id: show.id }, { readings: fresh.length, entryIds })
      await notifyLive(tx, actor.partyId, [`bench:${show.id}`])
    }
    refuseAny(faults)
    if (actor.kind === 'link') await countTokenUse(tx, actor, actor.tokenId)
    return { readings: (await findReadings(tx, actor, ids)).map(benchReading) }
  })
}

type Faults = Record<string, string>
type Fresh = readonly { readonly reading: ReadingInput; readonly index: number }[]

function refuseAny(faults: Faults): void {
  const first = Object.entries(faults)[0]
  if (!first) return
  throw new AppError('invalid', `Please check ${first[0]}: ${first[1]}. Nothing of this batch was kept.`, {
    details: { fields: faults },
  })
}

function isSame(row: ReadingRow, reading: ReadingInput, showId: string): boolean {
  return (
    row.showId === showId &&
    row.kitEntryId === reading.entryId &&
    row.side === reading.side &&
    row.lug === reading.lug &&
    row.method === reading.method &&
    row.unit === reading.unit &&
    row.value === reading.value &&
    row.pass === reading.pass &&
    row.strikesReadingId === reading.strikes &&
    row.deviceId === reading.deviceId &&
    row.deviceSequence === reading.deviceSequence
  )
}

function checkAgainstSheet(fresh: Fresh, sheet: NightSheet, faults: Faults): void {
  const drums = new Map(sheet.drums.map((drum) => [drum.id, drum]))
  for (const { reading, index } of fresh) {
    const spec = drums.get(reading.entryId)?.spec
    if (!spec) faults[`readings.${index}.entryId`] = 'this drum is not on the sheet of this show'
    else if (reading.side === 'resonant' && !spec.resonant)
      faults[`readings.${index}.side`] = 'this drum has no resonant head'
    else if (reading.lug > spec.lugs) faults[`readings.${index}.lug`] = `this head has ${spec.lugs} lugs`
  }
}

async function checkNumbers(tx: Db, actor: Actor, fresh: Fresh, faults: Faults): Promise<void> {
  const taken = await findDeviceNumbers(
    tx,
    actor,
    fresh.map(({ reading }) => reading),
  )
  for (const { reading, index } of fresh) {
    if (taken.some((row) => row.deviceId === reading.deviceId && row.deviceSequence === reading.deviceSequence)) {
      faults[`readings.${index}.deviceSequence`] = 'another reading of this device has this number'
    }
  }
}

/** A correction strikes a reading of the very same head, once: one kept before, or one that stands earlier in the batch. */
async function checkStrikes(
  tx: Db,
  actor: Actor,
  { showId, fresh, drums }: { showId: string; fresh: Fresh; drums: ReadonlyMap<string, string> },
  faults: Faults,
): Promise<void> {
  const wanted = fresh.flatMap(({ reading }) => (reading.strikes === null ? [] : [reading.strikes]))
  const kept = new Map((await findReadings(tx, actor, wanted)).map((row) => [row.id, row]))
  const struck = new Set(await findStruck(tx, actor, wanted))
  for (const { reading, index } of fresh) {
    if (reading.strikes === null) continue
    const field = `readings.${index}.strikes`
    const row = kept.get(reading.strikes)
    const before = fresh.find((other) => other.index < index && other.reading.id === reading.strikes)?.reading
    const sameHead = row
      ? row.showId === showId &&
        row.side === reading.side &&
        row.kitEntryId === reading.entryId &&
        row.physicalDrumId === drums.get(reading.entryId)
      : before?.side === reading.side && before.entryId === reading.entryId
    if (!sameHead) faults[field] = 'a correction strikes an earlier reading of the same head'
    else if (struck.has(reading.strikes)) faults[field] = 'this reading was struck already'
  }
}

/** The physical drum behind each kit drum; made at its first reading, and anew when what came is another size. */
async function physicalDrums(
  tx: Db,
  actor: Actor,
  { showId, sheet, entryIds }: { showId: string; sheet: NightSheet; entryIds: readonly string[] },
): Promise<Map<string, string>> {
  const there = await listBenchDrums(tx, actor, showId)
  const found = new Map<string, string>()
  for (const drum of sheet.drums.filter(({ id }) => entryIds.includes(id))) {
    const { diameterIn, depthIn, lugs } = drum.spec
    const same = there.find(
      (row) =>
        row.kitEntryId === drum.id && row.diameterIn === diameterIn && row.depthIn === depthIn && row.lugs === lugs,
    )
    const physicalDrumId = same?.physicalDrumId ?? randomUUID()
    found.set(drum.id, physicalDrumId)
    if (same) continue
    const supplierId = drum.supply === 'rented' ? sheet.supplierId : null
    await insertPhysicalDrum(tx, actor, { id: physicalDrumId, supplierId, diameterIn, depthIn, lugs })
    await setBenchDrum(tx, actor, { showId, kitEntryId: drum.id, physicalDrumId })
  }
  return found
}

function readingRow(
  actor: Exclude<Actor, { kind: 'job' }>,
  showId: string,
  reading: ReadingInput,
  physicalDrumId: string,
) {
  const { entryId, deviceAt, strikes, byName, targetHz, ...same } = reading
  return {
    ...same,
    ...{ showId, kitEntryId: entryId, physicalDrumId },
    deviceAt: new Date(deviceAt),
    targetHz: reading.unit === 'gauge' ? null : targetHz,
    strikesReadingId: strikes,
    byName: actor.kind === 'person' ? actor.name : byName || 'somebody at the bench',
    grantId: actor.kind === 'link' ? actor.grantId : null,
    personId: actor.kind === 'person' ? actor.personId : null,
  }
}
