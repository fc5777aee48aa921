import { shiftByCents } from '@/lib/acoustics/note'
import { addReadings } from '@/lib/server/bench/add-readings'
import { readBench } from '@/lib/server/bench/read-bench'
import { signOffDrum } from '@/lib/server/bench/sign-off'
import { lugOrder } from '@/lib/tuning/lug-order'
import { demoId } from './demo-id'
import { demoEntryId } from './demo-kit'
import type { Team } from './demo-team'
import { demoShowId } from './demo-tour'

/** How far each lug stood from its target at two benches, cents, lug 1 first: an even head, and one with two facing lugs high. */
const even = [2, -1, 0, 1, -2, 0]
const facingPairHigh = [14, -3, -9, 13, -4, -10]

async function readHead(team: Team, venue: string, drum: string, at: string, cents: readonly number[]): Promise<void> {
  const entryId = demoEntryId('full rig', drum)
  const bench = await readBench(team['drum-tech'], { showId: demoShowId(venue) })
  const sheet = bench.drums.find((entry) => entry.entryId === entryId)
  const target = sheet?.heads.find(({ side }) => side === 'batter')?.tap?.hz
  if (!sheet || !target) throw new Error(`${venue} has no tap target for ${drum}`)
  const deviceId = demoId('device', venue, drum)
  await addReadings(team['drum-tech'], {
    showId: demoShowId(venue),
    readings: lugOrder(sheet.lugCount).map((lug, index) => ({
      ...{ id: demoId('reading', venue, drum, String(lug)), entryId, side: 'batter' as const, lug },
      ...{ deviceId, deviceSequence: index + 1, deviceAt: new Date(Date.parse(at) + index * 20_000).toISOString() },
      ...{ method: 'tap-typed' as const, unit: 'Hz' as const, targetHz: target },
      value: Math.round(shiftByCents(target, cents[(lug - 1) % cents.length] ?? 0) * 10) / 10,
      ...{
        otherHead: 'damped' as const,
        onStand: false,
        gauge: '',
        temperatureC: 19,
        pass: 1,
        strikes: null,
        byName: '',
      },
    })),
  })
}

/** The last row that the demo makes: where it stands, all the others do. */
export const lastDemoReadingId = demoId('reading', 'Salle Nord', 'tom 12', String(lugOrder(6).at(-1)))

/** One bench done and signed, one under way today. */
export async function makeBench(team: Team, today: string, firstDate: string): Promise<void> {
  for (const drum of ['tom 12', 'tom 14', 'floor 16']) {
    await readHead(team, 'Harbour Hall', drum, `${firstDate}T13:40:00Z`, even)
    await signOffDrum(team['drum-tech'], {
      showId: demoShowId('Harbour Hall'),
      signOff: {
        id: demoId('sign-off', drum),
        entryId: demoEntryId('full rig', drum),
        decision: 'signed',
        byName: 'Jory Pell',
        remark: '',
      },
    })
  }
  await readHead(team, 'Salle Nord', 'tom 12', `${today}T09:10:00Z`, facingPairHigh)
}
