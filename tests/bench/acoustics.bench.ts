import { Bench as Timer } from 'tinybench'
import { coupledHeads } from '@/lib/acoustics/coupled-heads'
import { drumModel } from '@/lib/acoustics/drum-model'
import type { Drum } from '@/lib/acoustics/drum-model'
import { drumTuning } from '@/lib/acoustics/drum-tuning'
import type { DrumTuningInput } from '@/lib/acoustics/drum-tuning'
import { idealModeHz } from '@/lib/acoustics/membrane-mode'
import { openAirDensityKgPerM2 } from '@/lib/acoustics/open-air-head'
import { loadedPair, twoHeadModes } from '@/lib/acoustics/two-head-drum'
import { playableRange } from '@/lib/tuning/playable-range'
import { galerkinDrumHz, galerkinLimitHz } from '@/tests/helpers/galerkin-drum'
import { compared, figure } from './bench-row'
import type { Bench, BenchRow } from './bench-row'

/**
 * A drum with two heads: time of the forward solve, of the inverse with all its bounds, and of a playable range, beside a dense
 * Galerkin solution that comes as near in pitch and beside one head in the open air; and how far the two solvers lie apart, in cents.
 */
const INCH = 0.0254
const tenMil = { plyMils: [10], coatingKgPerM2: 0 }
const twoPly = { plyMils: [7, 7], coatingKgPerM2: 0.03 }
const thin = { plyMils: [3], coatingKgPerM2: 0 }

const drums: readonly { name: string; drum: Drum & { resonant: typeof tenMil }; batterNPerM: number }[] = [
  { name: '10×7 tom', drum: drumOf(10, 7, twoPly, tenMil, 200), batterNPerM: 2000 },
  { name: '12×8 tom', drum: drumOf(12, 8, tenMil, tenMil, 0), batterNPerM: 2000 },
  { name: '16×14 floor tom', drum: drumOf(16, 14, twoPly, tenMil, -200), batterNPerM: 1600 },
  { name: '14×6.5 snare', drum: drumOf(14, 6.5, tenMil, thin, 300), batterNPerM: 4500 },
  { name: '22×16 kick, closed', drum: drumOf(22, 16, tenMil, tenMil, 0), batterNPerM: 1300 },
]

function drumOf(diameterIn: number, depthIn: number, batter: typeof tenMil, resonant: typeof tenMil, cents: number) {
  return { diameterM: diameterIn * INCH, depthM: depthIn * INCH, batter, resonant, relationCents: cents }
}

const tom = drums[1]!
const tensions = { batterNPerM: 2000, resonantNPerM: 2300 }
const pair = { ...loadedPair(0, tom.drum), tensionNPerM: [2000, 2300] as const }
/** Shapes a head at which the dense solution of this drum comes within 0.01 Hz of its limit. */
const TERMS = 12

export const rows: Bench = async (say) => {
  say('the coupled equation beside a dense Galerkin solution')
  const apart = drums.map(({ drum, batterNPerM }) => {
    const loaded = loadedPair(0, drum)
    const heads = { ...loaded, tensionNPerM: [batterNPerM, batterNPerM * (drumModel(drum).tensionRatio ?? 1)] as const }
    const made = coupledHeads(heads)
    return [made.noteHz, made.upperPartnerHz].map((hz, index) =>
      Math.abs(1200 * Math.log2(hz / galerkinLimitHz(heads, index, 16))),
    )
  })
  const input: DrumTuningInput = { ...tom.drum, role: 'tom', lugs: 6, noteHz: 146.8324, relationCents: 100 }
  const trade = { plyMils: [10], coatingGPerM2: 0 }
  const ranged = { role: 'tom', diameterIn: 12, depthIn: 8, ported: false, headRelationCents: 100 } as const
  const model = drumModel(input)

  say('time')
  const timer = new Timer({ time: 400, warmupTime: 200 })
  timer
    .add('single', () => idealModeHz({ m: 0, n: 1 }, openHead()))
    .add('dense', () => galerkinDrumHz(pair, TERMS))
    .add('forward', () => twoHeadModes(tom.drum, tensions))
    .add('inverse', () => model.batterNPerM(146.8324))
    .add('tuning', () => drumTuning(input))
    .add('range', () => playableRange({ ...ranged, batter: trade, resonant: trade }))
  await timer.run()
  const microseconds = (name: string) => medianMicroseconds(timer, name)
  const dense = { baseline: 'dense Galerkin', baselineValue: microseconds('dense') }
  return [
    figure({
      case: 'five drums',
      metric: 'most apart from Galerkin',
      value: Math.max(...apart.flat()),
      unit: 'cents',
      goal: 0.05,
    }),
    figure({ case: '12×8 tom', metric: 'one head in the open air', value: microseconds('single'), unit: 'µs' }),
    timed('note, partner, taps from tensions', microseconds('forward'), dense, 0.05),
    timed('tension from note', microseconds('inverse'), dense, 0.01),
    timed('both heads with bounds from note', microseconds('tuning'), dense, 0.25),
    timed('playable range', microseconds('range'), dense, 0.25),
  ]
}

function openHead() {
  const { diameterM, batter } = tom.drum
  return { diameterM, tensionNPerM: 2000, arealDensityKgPerM2: openAirDensityKgPerM2(0, { ...batter, diameterM }) }
}

function timed(
  metric: string,
  value: number,
  beside: { baseline: string; baselineValue: number },
  goal: number,
): BenchRow {
  return compared({ case: '12×8 tom', metric, value, unit: 'µs', ...beside, goal })
}

function medianMicroseconds(timer: Timer, name: string): number {
  const result = timer.getTask(name)?.result
  if (!result || !('latency' in result)) throw new Error(`${name} was not timed.`)
  return result.latency.p50 * 1000
}
