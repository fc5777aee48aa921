import { analyseTap } from '@/lib/listening/analyse-tap'
import { tapRandom } from '@/lib/listening/tap-random'
import { figure } from '@/tests/bench/bench-row'
import type { BenchRow } from '@/tests/bench/bench-row'
import { pitchOf } from './cramer-rao'
import { goodTap } from './good-tap'
import { NON_TAP_RATE_HZ, nonTaps } from './non-taps'

/** A pitch further off than this is a wrong note. */
const WRONG_CENTS = 30

/**
 * How often a pitch is named where there is none (two hundred non-taps, with and without a target), and how often a good tap in a
 * room with hum, pink noise, click and glide is refused or named wrong.
 */
export function refusalRows(seed: number, goodTaps: number): BenchRow[] {
  const random = tapRandom(seed)
  const heard = nonTaps(seed).map(({ kind, samples }) => ({
    kind,
    blind: analyseTap(samples, NON_TAP_RATE_HZ).outcome === 'heard',
    told: analyseTap(samples, NON_TAP_RATE_HZ, { expectHz: 100 * 3.5 ** random.uniform() }).outcome === 'heard',
  }))
  const share = (count: number, of: number) => (100 * count) / of
  const accepted = (which: 'blind' | 'told') =>
    figure({
      case: which === 'told' ? '200 non-taps, target told' : '200 non-taps, no target',
      metric: 'falsely accepted',
      value: share(heard.filter((one) => one[which]).length, heard.length),
      unit: '%',
      goal: 2,
    })
  const worst = [...new Set(heard.filter(({ blind, told }) => blind || told).map(({ kind }) => kind))].map((kind) =>
    figure({
      case: `200 non-taps, ${kind}`,
      metric: 'falsely accepted, with or without target',
      value: heard.filter((one) => one.kind === kind && (one.blind || one.told)).length,
      unit: `of ${heard.filter((one) => one.kind === kind).length}`,
    }),
  )

  const good = Array.from({ length: goodTaps }, () => {
    const tap = roomTap(random)
    const truth = pitchOf(tap.tap)
    const expectHz = truth * 2 ** ((200 * (2 * random.uniform() - 1)) / 1200)
    const outcome = (options: { expectHz?: number }) => {
      const report = analyseTap(tap.samples, tap.sampleRateHz, options)
      if (report.outcome === 'refused') return 'refused'
      return Math.abs(1200 * Math.log2(report.pitchHz / truth)) > WRONG_CENTS ? 'wrong' : 'right'
    }
    return { told: outcome({ expectHz }), blind: outcome({}) }
  })
  const goodRow = (which: 'blind' | 'told', what: 'refused' | 'wrong', goal?: number) =>
    figure({
      case: `${goodTaps} good taps, ${which === 'told' ? 'target told' : 'no target'}`,
      metric: what === 'refused' ? 'falsely refused' : 'wrong note named',
      value: share(good.filter((one) => one[which] === what).length, good.length),
      unit: '%',
      ...(goal === undefined ? {} : { goal }),
    })
  return [
    accepted('told'),
    accepted('blind'),
    ...worst,
    goodRow('told', 'refused', 3),
    goodRow('told', 'wrong', 1),
    goodRow('blind', 'refused'),
    goodRow('blind', 'wrong'),
  ]
}

/** A tap as a phone hears it on a working stage, well enough to be read: pink noise at 12 to 40 dB, room, hum, click, some glide. */
function roomTap(random: ReturnType<typeof tapRandom>) {
  const between = (low: number, high: number) => low + (high - low) * random.uniform()
  return goodTap(random, {
    decayT60S: between(0.35, 1.6),
    splitHz: random.uniform() < 0.5 ? 0 : between(0.5, 6),
    noise: { colour: 'pink', snrDb: between(12, 40) },
    hum: { mainsHz: random.uniform() < 0.5 ? 50 : 60, snrDb: between(25, 45) },
    room: { reverbT60S: between(0.3, 1.3), share: between(0, 0.15) },
    glideCents: between(0, 25),
    clickDb: between(-20, -5),
    peak: between(0.05, 0.95),
  })
}
