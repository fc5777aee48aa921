import { analyseTap } from '@/lib/listening/analyse-tap'
import { tapRandom } from '@/lib/listening/tap-random'
import { figure } from '@/tests/bench/bench-row'
import type { BenchRow } from '@/tests/bench/bench-row'
import { pitchOf, splitBoundHz } from './cramer-rao'
import { goodTap } from './good-tap'
import { overBound, quantile } from './spread'

const SNRS_DB = [20, 30, 40] as const
const SPLITS_HZ = [0.5, 1, 2, 4, 8, 12] as const
const DECAYS_S = [0.8, 1.6] as const

/**
 * Rows of the warble part: how far Δf is off, for a lug 20° to 70° from the axis, where both of the pair sound. A tap whose
 * warble was not reported counts with the whole split as its error.
 */
export function warbleRows(seed: number, perCell: number): BenchRow[] {
  const random = tapRandom(seed)
  return SNRS_DB.flatMap((snrDb) =>
    SPLITS_HZ.flatMap((splitHz) => {
      const heard = DECAYS_S.flatMap((decayT60S) =>
        Array.from({ length: perCell }, () => {
          const offAxisRad = (Math.PI / 180) * (20 + 50 * random.uniform())
          const tap = goodTap(random, {
            decayT60S,
            splitHz,
            offAxisRad,
            noise: { colour: 'white', snrDb },
            lengthS: 1.3,
          })
          const report = analyseTap(tap.samples, tap.sampleRateHz, { expectHz: pitchOf(tap.tap) })
          const warble = report.outcome === 'heard' ? report.warble : null
          return {
            error: Math.abs((warble?.differenceHz ?? 0) - splitHz),
            missed: warble === null,
            bound: splitBoundHz({ ...tap, partials: tap.tap }),
          }
        }),
      )
      const name = `warble ${splitHz} Hz, ${snrDb} dB`
      return [
        figure({
          case: name,
          metric: 'median error of Δf',
          value: quantile(
            heard.map(({ error }) => error),
            0.5,
          ),
          unit: 'Hz',
        }),
        figure({
          case: name,
          metric: 'spread of Δf over the bound, median',
          value: overBound(heard.map(({ error, bound }) => error / bound)).median,
          unit: '× bound',
        }),
        figure({
          case: name,
          metric: 'not reported',
          value: (100 * heard.filter(({ missed }) => missed).length) / heard.length,
          unit: '%',
        }),
      ]
    }),
  )
}
