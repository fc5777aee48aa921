import { db } from '@/db/client'
import { findPartyName, listBenchDrums, listHiresOfShow, listReadings, listSignOffs } from '@/db/queries/bench'
import { findShow } from '@/db/queries/show'
import type { Bench } from '@/lib/contracts/bench'
import type { Actor } from '@/lib/server/auth/actor'
import type { LiveTopic } from '@/lib/server/live/notify-live'
import { notThere } from '@/lib/server/refusals'
import { tryCalibration } from '@/lib/tuning/gauge-of-head'
import { assertAtBench } from './assert-at-bench'
import { benchDrum, benchReading, benchSignOff } from './bench-answer'
import { readNightSheet } from './read-night-sheet'

/** Everything on the bench of one show: the night's drums, what was read of them and who signed them off. */
export async function readBench(actor: Actor, input: { showId: string }): Promise<Bench> {
  assertAtBench(actor, input.showId, 'party:read')
  return db().transaction(
    async (tx) => {
      const show = await findShow(tx, actor, input.showId)
      const party = await findPartyName(tx, actor)
      if (!show || party === undefined) throw notThere('show')
      const [sheet, standing, readings, signOffs] = [
        await readNightSheet(tx, actor, show),
        await listBenchDrums(tx, actor, show.id),
        await listReadings(tx, actor, show.id),
        await listSignOffs(tx, actor, show.id),
      ]
      // A reading counts for the very drum it was taken of: when another size came instead, the old ones are of another drum.
      const counted = new Set(
        sheet?.drums.flatMap(({ id, spec }) =>
          standing
            .filter(
              (drum) =>
                drum.kitEntryId === id &&
                drum.lugs === spec.lugs &&
                drum.diameterIn === spec.diameterIn &&
                drum.depthIn === spec.depthIn,
            )
            .map(({ physicalDrumId }) => physicalDrumId),
        ),
      )
      const calibration = sheet?.gauge ? tryCalibration(sheet.gauge).calibration : null
      return {
        show: {
          id: show.id,
          title: show.name === '' ? show.venueName : `${show.name}: ${show.venueName}`,
          town: show.town,
          date: show.date,
          zone: show.zone,
          mustNotRetune: show.sharedKit && !show.sharedKit.mayRetune ? show.sharedKit.owner : null,
        },
        party,
        rig: show.rigName,
        sheet: sheet && { number: sheet.number, from: sheet.from, newestNumber: sheet.newestNumber },
        drums: sheet?.drums.map((drum) => benchDrum(drum, sheet.party, calibration)) ?? [],
        readings: readings.filter(({ physicalDrumId }) => counted.has(physicalDrumId)).map(benchReading),
        signOffs: signOffs.map(benchSignOff),
      }
    },
    // The sheet and its readings are several reads; they must be of one moment.
    { isolationLevel: 'repeatable read', accessMode: 'read only' },
  )
}

/** What can change a bench: its own readings, what was settled with the house and the hires, a revision of its rig. */
export async function benchTopics(actor: Actor, input: { showId: string }): Promise<LiveTopic[]> {
  assertAtBench(actor, input.showId, 'party:read')
  const show = await findShow(db(), actor, input.showId)
  if (!show) throw notThere('show')
  const hires = await listHiresOfShow(db(), actor, show.id)
  return [
    `bench:${show.id}`,
    `advance:${show.id}`,
    ...hires.map(({ hireId }): LiveTopic => `advance:${hireId}`),
    `revision:${show.rigId}`,
  ]
}
