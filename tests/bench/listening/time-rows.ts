import { Bench } from 'tinybench'
import { analyseTap } from '@/lib/listening/analyse-tap'
import { tapRandom } from '@/lib/listening/tap-random'
import { compared, figure } from '@/tests/bench/bench-row'
import type { BenchRow } from '@/tests/bench/bench-row'
import { pitchOf } from './cramer-rao'
import { goodTap } from './good-tap'
import { rivals, windowOf } from './rival'

/** Time for one tap, ours from raw samples to report, the packages' with the band-pass that they need. */
export async function timeRows(seed: number): Promise<BenchRow[]> {
  const random = tapRandom(seed)
  const taps = Array.from({ length: 8 }, (_, i) =>
    goodTap(random, { decayT60S: 0.8, splitHz: i % 2 === 0 ? 0 : 3, noise: { colour: 'white', snrDb: 30 } }),
  ).map((tap) => ({ ...tap, expectHz: pitchOf(tap.tap) }))
  const bench = new Bench({ time: 1500, warmupTime: 300 })
  let turn = 0
  const next = () => taps[turn++ % taps.length] as (typeof taps)[number]
  bench.add('ours', () => {
    const tap = next()
    analyseTap(tap.samples, tap.sampleRateHz, { expectHz: tap.expectHz })
  })
  for (const rival of rivals) {
    bench.add(rival.name, () => {
      const tap = next()
      rival.pitchHz(windowOf(tap, tap.expectHz, rival.window), tap.sampleRateHz)
    })
  }
  await bench.run()
  const medianMs = (name: string) => {
    const result = bench.getTask(name)?.result
    if (result === undefined || !('latency' in result)) throw new Error(`No time was measured for ${name}.`)
    return result.latency.p50
  }
  const ours = medianMs('ours')
  return [
    figure({ case: 'one tap of a second', metric: 'analysis time, median', value: ours, unit: 'ms' }),
    ...rivals.map(({ name }) =>
      compared({
        case: 'one tap of a second',
        metric: 'analysis time, median',
        value: ours,
        unit: 'ms',
        baseline: name,
        baselineValue: medianMs(name),
      }),
    ),
  ]
}
