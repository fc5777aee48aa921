import { analyseTap } from '@/lib/listening/analyse-tap'
import { tapRandom } from '@/lib/listening/tap-random'
import { pitchBoundHz, pitchOf } from './cramer-rao'
import { goodTap } from './good-tap'
import { rivals, windowOf } from './rival'

export const SNRS_DB = [10, 20, 30, 40] as const
export const SPLITS_HZ = [0, 1.5, 5] as const
export const DECAYS_S = [0.4, 0.8, 1.6] as const

/** One tap heard by all. Errors in Hz; null where no pitch was named. */
export type PitchCase = {
  snrDb: number
  splitHz: number
  decayT60S: number
  boundHz: number
  oursHz: number | null
  /** By the rival's name; only for the taps that the rivals were given. */
  rivalsHz: Map<string, number | null> | null
}

/** How far off the target may be that the listener is told, cents either way. */
const TARGET_OFF_CENTS = 200

/**
 * Taps in white noise at every level, split and decay; each listener is told a target up to 200 cents off, as the bench page would:
 * ours as `expectHz`, the packages by a band-pass round it. The packages hear every `rivalsEvery`-th tap, being slow.
 */
export function pitchCases(seed: number, perCell: number, rivalsEvery: number): PitchCase[] {
  const random = tapRandom(seed)
  const cases: PitchCase[] = []
  for (const snrDb of SNRS_DB) {
    for (const splitHz of SPLITS_HZ) {
      for (const decayT60S of DECAYS_S) {
        for (let i = 0; i < perCell; i++) {
          const tap = goodTap(random, { decayT60S, splitHz, noise: { colour: 'white', snrDb } })
          const truth = pitchOf(tap.tap)
          const expectHz = truth * 2 ** ((TARGET_OFF_CENTS * (2 * random.uniform() - 1)) / 1200)
          const report = analyseTap(tap.samples, tap.sampleRateHz, { expectHz })
          const errorOf = (hz: number | null) => (hz === null ? null : Math.abs(hz - truth))
          const rivalsHz =
            cases.length % rivalsEvery === 0
              ? new Map(
                  rivals.map((rival) => [
                    rival.name,
                    errorOf(rival.pitchHz(windowOf(tap, expectHz, rival.window), tap.sampleRateHz)),
                  ]),
                )
              : null
          cases.push({
            snrDb,
            splitHz,
            decayT60S,
            boundHz: pitchBoundHz({ ...tap, partials: tap.tap }),
            oursHz: errorOf(report.outcome === 'heard' ? report.pitchHz : null),
            rivalsHz,
          })
        }
      }
    }
  }
  return cases
}
