import { calibrateGauge, outsideRange } from '@/lib/tuning/gauge-calibration'
import { gaugeOfHead, tryCalibration } from '@/lib/tuning/gauge-of-head'
import { sameReadingOnFilms, startingGauge, tapOfReading } from '@/lib/tuning/gauge-prediction'
import { requireReading } from '@/lib/tuning/gauge-profile'
import type { GaugeProfile } from '@/lib/tuning/gauge-profile'
import { tapOfTensionHz, tensionOfTapNPerM } from '@/lib/tuning/gauge-tension'
import { sampleGauge, tom12 } from '@/lib/tuning/sample-gauge'
import { PLIES, SIZES } from './kit-rows'
import { row } from './refusal-table'
import type { Bad } from './refusal-table'

const sizesOf = (place: string) => SIZES.map(([size, ...values]): Bad => [`${place}.${size}`, ...values])

const calibration = calibrateGauge(sampleGauge)
/** Seven of its pairs, the stage's temperature said. */
const profile: GaugeProfile = {
  ...sampleGauge,
  pairs: sampleGauge.pairs.slice(0, 7).map((pair) => ({ ...pair, temperatureC: 20 })),
}
const [pair] = profile.pairs
const PROFILES: Bad[] = [
  // None, too few, one and the same, and readings that fall where the tension rises.
  ['pairs', [], profile.pairs.slice(0, 2), profile.pairs.map(() => pair)],
  ['pairs', profile.pairs.map((each) => ({ ...each, reading: 100 - each.reading }))],
  ['scale', { min: 100, max: 0, step: 1 }, { min: 0, max: 100, step: 0 }, { min: 0, max: 100, step: 200 }],
  ['pairs.0.reading', -1, 101],
  ['pairs.0.tapHz', 0, -255, 0.255, 5000],
  ...sizesOf('pairs.0'),
  ['pairs.0.plyMils', ...PLIES],
  ['pairs.0.temperatureC', 68, 293.15],
]

const HEADS: Bad[] = [
  ...sizesOf('head'),
  ['head.plyMils', ...PLIES],
  ['head.coatingGPerM2', -1, 4000],
  ['temperatureC', 68, 293.15, -41],
]
const TAPS: Bad = ['tapHz', 0, -255, 0.255, 5000]
const READINGS: Bad = ['reading', -1, 101]
const atTap = { head: tom12, tapHz: 255, temperatureC: 20 }
const atReading = { head: tom12, reading: 70, temperatureC: 20 }
const atTension = { head: tom12, tension: 2000, temperatureC: 20 }
type AtTap = typeof atTap
type AtReading = typeof atReading

export const gaugeRows = [
  row('calibrateGauge', calibrateGauge, profile, PROFILES),
  row('tryCalibration', tryCalibration, profile, PROFILES, (answer) => {
    const { calibration: made, refusal } = answer as { calibration: unknown; refusal: unknown }
    return made === null && refusal !== null
  }),
  row('requireReading', ({ reading }) => requireReading(reading, sampleGauge.scale), { reading: 70 }, [READINGS]),
  row('outsideRange', ({ tension }) => outsideRange(calibration, tension), { tension: 2000 }, [
    ['tension', -2000, 2e6],
  ]),
  row('tensionOfTapNPerM', (of: AtTap) => tensionOfTapNPerM(of.head, of.tapHz, of.temperatureC), atTap, [
    ...HEADS,
    TAPS,
  ]),
  row('tapOfTensionHz', (of: typeof atTension) => tapOfTensionHz(of.head, of.tension, of.temperatureC), atTension, [
    ...HEADS,
    ['tension', 0, -2000, 2e6],
  ]),
  row('startingGauge', (of: AtTap) => startingGauge(calibration, of.head, of.tapHz, of.temperatureC), atTap, [
    ...HEADS,
    TAPS,
  ]),
  row('tapOfReading', (of: AtReading) => tapOfReading(calibration, of.head, of.reading, of.temperatureC), atReading, [
    ...HEADS,
    READINGS,
  ]),
  row(
    'sameReadingOnFilms',
    (of: AtReading) => sameReadingOnFilms(calibration, of.head, [of.head], of.reading, of.temperatureC),
    atReading,
    [...HEADS, READINGS],
  ),
  row(
    'gaugeOfHead',
    (of: AtTap) => gaugeOfHead(calibration, of.head, { ...of, noted: null }),
    atTap,
    [...HEADS, TAPS],
    (answer) => answer === null,
  ),
]
