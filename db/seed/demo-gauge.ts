import { addGaugePair, strikeGaugePair } from '@/lib/server/gauges/gauge-pairs'
import { createGauge } from '@/lib/server/gauges/change-gauge'
import { demoId } from './demo-id'
import type { Team } from './demo-team'

export const demoGaugeId = demoId('gauge', 'brass')

const coated10 = { plyMils: [10], film: 'coated', coatingGPerM2: 0 } as const
/** What the drum tech read at rehearsal, three tunings of a head or two, and what each head sounded. */
const heads = [
  {
    name: 'Floor tom 16 batter',
    diameterIn: 16,
    depthIn: 14,
    read: [
      [138, 69],
      [150.5, 71.5],
      [164.5, 73.5],
    ],
  },
  {
    name: 'Tom 14 batter',
    diameterIn: 14,
    depthIn: 10,
    read: [
      [195, 74],
      [214, 76.5],
    ],
  },
  {
    name: 'Tom 12 batter',
    diameterIn: 12,
    depthIn: 8,
    read: [
      [236, 74.5],
      [256, 77],
      [283, 80],
    ],
  },
  {
    name: 'Snare 14 batter',
    diameterIn: 14,
    depthIn: 6.5,
    read: [
      [265, 85],
      [288, 87],
      [309, 88.5],
    ],
  },
] as const
/** Read with the other head ringing along, and struck when that was seen. */
const struck = { name: 'Tom 12 batter, other head left open', diameterIn: 12, depthIn: 8, tapHz: 262, reading: 71 }

/** The tour's gauge, calibrated, with one pair struck. */
export async function makeGauge(team: Team): Promise<void> {
  const tech = team['drum-tech']
  await createGauge(tech, {
    id: demoGaugeId,
    gauge: {
      name: 'Brass gauge',
      scale: { min: 0, max: 100, step: 1 },
      remark: 'Jory’s hand, set down two fingers in from the hoop.',
    },
  })
  const add = async (pair: { name: string; diameterIn: number; depthIn: number; tapHz: number; reading: number }) => {
    const { name: remark, diameterIn, depthIn, tapHz, reading } = pair
    const id = demoId('gauge pair', remark, String(tapHz))
    await addGaugePair(tech, {
      gaugeId: demoGaugeId,
      id,
      pair: {
        ...coated10,
        plyMils: [...coated10.plyMils],
        diameterIn,
        depthIn,
        tapHz,
        reading,
        temperatureC: 20,
        remark,
      },
    })
    return id
  }
  for (const { read, ...head } of heads) for (const [tapHz, reading] of read) await add({ ...head, tapHz, reading })
  await strikeGaugePair(tech, { pairId: await add(struck) })
}
