import { lnTensionAt, readingAt, risingCurve } from './gauge-curve'
import type { GaugeCurve } from './gauge-curve'
import { GaugeError } from './gauge-error'
import type { GaugeProcess, ProcessPair } from './gauge-process'
import { chanceUnder, fitGaugeProcess, moments, quantile } from './gauge-process'
import { requireFigure, requireGaugeScale, requireReading } from './gauge-profile'
import type { GaugeHead, GaugePair, GaugeProfile, GaugeScale } from './gauge-profile'
import { tensionOfTapNPerM } from './gauge-tension'

/** Share of single readings on another head that an interval is to hold; the tests hold it to 0.86 to 0.97 by simulation. */
export const GAUGE_COVERAGE = 0.9

export const FEWEST_PAIRS = 3
/** More pairs say no more; they only take longer. */
export const MOST_PAIRS = 60

/** Tensions must reach over a fifth, about a semitone and a half of tap pitch: closer together noise drowns the rise. */
const LEAST_RATIO = 1.2
/** With fewer there is no telling which of them is wrong. */
const FEWEST_TO_DOUBT = 5
const DOUBTFUL_SHARE = 0.2
/** A reading that the other pairs hold for less likely than one in a thousand. */
const DOUBTFUL_CHANCE = 0.001
/** Among few pairs a fall by more than this share of the dial is no hand's noise: six units of a hundred are six to seventeen repeats. */
const MOST_FALL_SHARE = 0.06
/** Among many pairs it is the scatter round the curve that tells: three times a coarse hand's. */
const MOST_NOISE_SHARE = 0.03
/** The rise must stand out of its own uncertainty by this many standard deviations. */
const SURE_RISE = 2
/** Nowhere is a dial flatter than this share of its rise on the whole. */
const LEAST_SLOPE_SHARE = 0.1
const CURVE_POINTS = 65

/** What became of one pair. `off` is the reading less the curve's, in the gauge's own units. */
export type CalibratedPair = {
  readonly tensionNPerM: number
  readonly off: number
  /** Left out of the curve: the other pairs hold it for all but impossible. */
  readonly doubtful: boolean
}

/**
 * What a gauge reads at a film tension, in the range it was calibrated on. `low` and `high` hold one reading, taken by the
 * same hand on a head that is not among the pairs, with the chance `GAUGE_COVERAGE`.
 */
export type GaugeCalibration = {
  readonly name: string
  readonly scale: GaugeScale
  readonly range: { readonly lowNPerM: number; readonly highNPerM: number }
  readonly middle: GaugeCurve
  readonly low: GaugeCurve
  readonly high: GaugeCurve
  /** Standard deviation of one hand's repeats, in the gauge's own units. */
  readonly noise: number
  /** In the order they were given. */
  readonly pairs: readonly CalibratedPair[]
}

type Sorted = ProcessPair & { readonly index: number }

/**
 * Fits reading and film tension of a gauge's pairs. The tension of each comes from its tap (shape (1,1), other head damped);
 * the curve rises everywhere, its interval is Bayesian (see `gauge-process`), and a pair that the others hold for all but
 * impossible is set aside and marked. The order of the pairs does not matter. Refused rather than guessed: see `GaugeError`.
 * Leaves out the place on the head, the foot's size, wear, and any difference between operators: one profile is one hand.
 * @throws GaugeError
 */
export function calibrateGauge(profile: GaugeProfile): GaugeCalibration {
  const scale = requireGaugeScale(profile.scale)
  if (profile.pairs.length < FEWEST_PAIRS)
    throw new GaugeError(
      'too-few',
      'pairs',
      `${profile.pairs.length} of ${FEWEST_PAIRS} pairs: read three heads, or three tunings of one head.`,
    )
  if (profile.pairs.length > MOST_PAIRS)
    throw new GaugeError('quantity', 'pairs', `${profile.pairs.length} pairs: at most ${MOST_PAIRS}.`)
  const all = profile.pairs.map((pair, index) => sortable(pair, scale, index)).sort(inOrder)
  requireWide(all)

  const span = scale.max - scale.min
  const { used, doubtful } = setDoubtfulAside(all, span)
  requireWide(used)
  const process = fitGaugeProcess(used, span)
  requireRising(process, used, span)

  const from = used[0]?.lnTension ?? 0
  const to = used.at(-1)?.lnTension ?? 0
  const lnTensions = Array.from({ length: CURVE_POINTS }, (_, i) => from + ((to - from) * i) / (CURVE_POINTS - 1))
  const foretold = lnTensions.map((lnTension) => process.foretell(lnTension, null))
  const leastSlope = LEAST_SLOPE_SHARE * process.slope.mean
  const outside = (1 - GAUGE_COVERAGE) / 2
  const middle = risingCurve(
    lnTensions,
    foretold.map((parts) => moments(parts).mean),
    leastSlope,
  )
  const bound = (chance: number) =>
    risingCurve(
      lnTensions,
      foretold.map((parts) => quantile(parts, chance)),
      leastSlope,
    )
  const placed = new Map(all.map((pair) => [pair.index, pair]))
  return {
    name: profile.name,
    scale,
    range: { lowNPerM: Math.exp(from), highNPerM: Math.exp(to) },
    middle,
    low: bound(outside),
    high: bound(1 - outside),
    noise: process.noise,
    pairs: profile.pairs.map(({ reading }, index) => {
      const lnTension = placed.get(index)?.lnTension ?? Number.NaN
      return {
        tensionNPerM: Math.exp(lnTension),
        off: reading - readingAt(middle, lnTension),
        doubtful: doubtful.has(index),
      }
    }),
  }
}

/** Whether a tension lies under or over what the gauge was calibrated on; null within. Rounding is not outside. @throws GaugeError no tension */
export function outsideRange(calibration: GaugeCalibration, tensionNPerM: number): 'under' | 'over' | null {
  requireFigure('tensionNPerM', tensionNPerM, 0, 50_000, 'N/m')
  const { lowNPerM, highNPerM } = calibration.range
  const rounding = 1e-9
  if (tensionNPerM < lowNPerM * (1 - rounding)) return 'under'
  return tensionNPerM > highNPerM * (1 + rounding) ? 'over' : null
}

/** Tension in N/m at which the curve gives a reading; the end's beyond an end. */
export function tensionAtReading(curve: GaugeCurve, reading: number): number {
  return Math.exp(lnTensionAt(curve, reading))
}

/** Heads of one size and film share what the model leaves out of them. */
function headKey({ diameterIn, depthIn, plyMils, coatingGPerM2 }: GaugeHead): string {
  return [diameterIn, depthIn, plyMils.join('+'), coatingGPerM2].join(' ')
}

function sortable(pair: GaugePair, scale: GaugeScale, index: number): Sorted {
  try {
    requireReading(pair.reading, scale)
    const lnTension = Math.log(tensionOfTapNPerM(pair, pair.tapHz, pair.temperatureC))
    return { lnTension, reading: pair.reading, head: headKey(pair), index }
  } catch (error) {
    if (error instanceof GaugeError) throw new GaugeError(error.reason, error.field, error.message, [index])
    throw error
  }
}

function inOrder(a: Sorted, b: Sorted): number {
  return a.lnTension - b.lnTension || a.reading - b.reading || (a.head < b.head ? -1 : a.head > b.head ? 1 : 0)
}

/** One at a time, the worst first, at most a fifth of all: each against a curve that knows the others only. */
function setDoubtfulAside(all: readonly Sorted[], span: number): { used: Sorted[]; doubtful: Set<number> } {
  let used = [...all]
  const doubtful = new Set<number>()
  const most = all.length < FEWEST_TO_DOUBT ? 0 : Math.floor(all.length * DOUBTFUL_SHARE)
  while (doubtful.size < most) {
    const { surprise } = fitGaugeProcess(used, span)
    const suspects = used
      .map((pair, i) => ({ pair, surprise: Math.abs(surprise[i] ?? 0) }))
      .sort((a, b) => b.surprise - a.surprise)
      .slice(0, 3)
      .map(({ pair }) => ({ pair, chance: chanceAmongOthers(pair, used, span) }))
      .sort((a, b) => a.chance - b.chance)
    const worst = suspects[0]
    if (worst === undefined || worst.chance > DOUBTFUL_CHANCE) break
    doubtful.add(worst.pair.index)
    used = used.filter((pair) => pair !== worst.pair)
  }
  return { used, doubtful }
}

function chanceAmongOthers(pair: Sorted, used: readonly Sorted[], span: number): number {
  const others = used.filter((other) => other !== pair)
  const under = chanceUnder(fitGaugeProcess(others, span).foretell(pair.lnTension, pair.head), pair.reading)
  return 2 * Math.min(under, 1 - under)
}

function requireWide(pairs: readonly Sorted[]): void {
  const [low, high] = [pairs[0], pairs.at(-1)]
  if (!low || !high || high.lnTension - low.lnTension >= Math.log(LEAST_RATIO)) return
  throw new GaugeError(
    'narrow',
    'pairs',
    `All pairs lie between ${tensionWords(low)} and ${tensionWords(high)}: read a head at least two semitones higher or lower.`,
    pairs.map(({ index }) => index),
  )
}

function requireRising({ slope, noise }: GaugeProcess, pairs: readonly Sorted[], span: number): void {
  const { before, after, fall } = worstFall(pairs)
  const rises = slope.mean > 0 && slope.mean >= SURE_RISE * slope.sd
  const fits = pairs.length < FEWEST_TO_DOUBT ? fall <= MOST_FALL_SHARE * span : noise <= MOST_NOISE_SHARE * span
  if (rises && fits) return
  throw new GaugeError(
    'contradict',
    'pairs',
    `Pairs contradict each other: ${before.reading} at ${tensionWords(before)}, yet only ${after.reading} at ${tensionWords(after)}. A gauge reads more on a tighter head; strike the wrong pair or read both again.`,
    [before.index, after.index],
  )
}

/** The two pairs between which the reading falls most while the tension rises; where none falls, the two least apart. */
function worstFall(pairs: readonly Sorted[]): { before: Sorted; after: Sorted; fall: number } {
  let worst: { before: Sorted; after: Sorted; fall: number } | undefined
  let highest: Sorted | undefined
  for (const after of pairs) {
    const fall = highest ? highest.reading - after.reading : 0
    if (highest && (worst === undefined || fall > worst.fall)) worst = { before: highest, after, fall }
    if (!highest || after.reading > highest.reading) highest = after
  }
  if (worst === undefined) throw new GaugeError('too-few', 'pairs', 'A calibration needs pairs.')
  return worst
}

function tensionWords({ lnTension }: Sorted): string {
  return `${(Math.exp(lnTension) / 1000).toFixed(2)} kN/m`
}
