import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { requireQuantity } from '@/lib/acoustics/require-quantity'
import type { ReadingBasis } from './head-state'
import { HOOP_LIMITS, lugResponse, USUAL_HOOP } from './lug-response'
import { requireLugs } from './lug-order'

/** One logged move: whole key turns (1 = one turn tighter) and the readings before and after, lug 1 first; null where not read. */
export type LoggedMove = {
  turns: readonly number[]
  before: readonly (number | null)[]
  after: readonly (number | null)[]
}

/** Log-normal: median, and standard deviation of the natural logarithm. */
export type LogNormal = { median: number; spread: number }

export type HoopPrior = { hoop: LogNormal; gain: LogNormal }

/** A learned figure: its mean (of the logarithm) and the interval that holds it nine times in ten. */
export type Learned = { value: number; low: number; high: number }

export type HoopLearning = {
  /** Hoop parameter κ of `lugResponse`, no unit. */
  hoop: Learned
  /** Reading units by which the whole head rises when every lug is turned once. */
  gain: Learned
  /** Moves that say something: some turn and some lug read before and after. */
  used: number
  /** Moves, counted from 0, that what was learned does not explain: a slip of the key or of the log. */
  doubtful: number[]
}

/**
 * Where to start before any move, all from memory. Hoop: pressed steel about 0.02, cast about five times that, thin ones a
 * tenth. Gain: a quarter turn all round raises a dial gauge by some 5 units and a tap by 1.5 to 2 semitones, give or take a factor of two.
 */
export const HOOP_PRIORS: Readonly<Record<ReadingBasis, HoopPrior>> = {
  gauge: { hoop: { median: USUAL_HOOP, spread: 1.2 }, gain: { median: 20, spread: 0.7 } },
  tap: { hoop: { median: USUAL_HOOP, spread: 1.2 }, gain: { median: 700, spread: 0.7 } },
}

/** Share by which a hand misses the turn it means to make, standard deviation (from memory). */
export const HAND_ERROR = 0.2

/** The gain never leaves its prior's median by more than this factor. */
const GAIN_REACH = 30

/** Degrees of Student's t that a move's misfit follows: near to normal, yet one bad log cannot pull far. */
const STUDENT_DEGREES = 5
/** A move is doubtful when noise and hand alone would miss so far once in ten thousand times (normal quantile, one side). */
const DOUBTFUL_QUANTILE = 3.72

/** Less of a turn than this says nothing. */
const LEAST_TURN = 1e-3

const LARGEST = 1e6

const GRID = 17
const MAX_ZOOMS = 5
/** Parts of the grid this far below its best, in natural logarithms, do not count. */
const NEGLIGIBLE = 14
/** With so many points that count along each axis, one step is little more than a standard deviation: fine enough to sum over. */
const FINE_ENOUGH = 9

/**
 * The hoop parameter and the gain from logged moves, by Bayes' rule on a grid in the logarithms of both that closes in on where
 * the chance lies. Each move's change is gain·R(κ)·turns, off by reading noise (twice, before and after) and by the hand's error:
 * one factor for the move, and what two hands differ; the misfit of a whole move follows Student's t. Bounded by `HOOP_LIMITS`
 * and the gain's reach. No moves: the prior. It holds for moves about one tension: give the last few dozen of one head.
 * Left out: that the gain falls as the head goes up, friction.
 * @param noise standard deviation of one reading, in the readings' unit (cents of taps, gauge units)
 * @throws AcousticsError naming `lugs`, `noise`, `handError`, `prior`, `turns`, `before` or `after`
 */
export function learnHoop({
  lugs,
  basis,
  moves,
  noise,
  handError = HAND_ERROR,
  prior = HOOP_PRIORS[basis],
}: {
  lugs: number
  basis: ReadingBasis
  moves: readonly LoggedMove[]
  noise: number
  handError?: number
  prior?: HoopPrior
}): HoopLearning {
  requireLugs(lugs)
  requireQuantity('noise', noise, { min: 1e-6, max: 1e4, unit: '' })
  requireQuantity('handError', handError, { min: 0, max: 1, unit: '' })
  for (const { median, spread } of [prior.hoop, prior.gain]) {
    requireQuantity('prior', median, { min: 1e-6, max: 1e6, unit: '' })
    requireQuantity('prior', spread, { min: 0.01, max: 5, unit: '' })
  }
  moves.forEach((move) => requireMove(move, lugs))
  const known = moves.flatMap((move, index) => {
    const saying =
      move.turns.some((turn) => Math.abs(turn) >= LEAST_TURN) &&
      move.before.some((value, i) => value !== null && move.after[i] !== null)
    return saying ? [{ index, move }] : []
  })

  const sumsAt = (hoop: number) => {
    // The logarithm and back may step over a bound by rounding.
    const within = Math.min(HOOP_LIMITS.max, Math.max(HOOP_LIMITS.min, hoop))
    const { shares } = lugResponse({ lugs, basis, hoop: within })
    return known.map(({ move }) => moveSums(move, shares, handError))
  }
  const noiseSquare = 2 * noise ** 2
  const priorAt = ({ median, spread }: LogNormal, at: number) => -(((at - Math.log(median)) / spread) ** 2) / 2
  let axes = {
    hoop: span(Math.log(HOOP_LIMITS.min), Math.log(HOOP_LIMITS.max)),
    gain: span(Math.log(prior.gain.median / GAIN_REACH), Math.log(prior.gain.median * GAIN_REACH)),
  }
  let chances: number[][] = []
  for (let zoom = 0; ; zoom++) {
    const gains = axes.gain.map(Math.exp)
    const logs = axes.hoop.map((logHoop) => {
      const sums = sumsAt(Math.exp(logHoop))
      return gains.map((gain, j) => {
        let log = priorAt(prior.hoop, logHoop) + priorAt(prior.gain, axes.gain[j] ?? 0)
        for (const ofMove of sums) log += logChance(ofMove, gain, noiseSquare)
        return log
      })
    })
    const best = Math.max(...logs.flat())
    chances = logs.map((row) => row.map((log) => Math.exp(log - best)))
    const counting = {
      hoop: counted(chances.map((row) => Math.max(...row))),
      gain: counted(axes.gain.map((_, j) => Math.max(...chances.map((row) => row[j] ?? 0)))),
    }
    const fine = Math.min(counting.hoop.length, counting.gain.length) >= FINE_ENOUGH
    if (fine || zoom === MAX_ZOOMS) break
    axes = { hoop: closeIn(axes.hoop, counting.hoop), gain: closeIn(axes.gain, counting.gain) }
  }

  const hoop = learned(
    axes.hoop,
    chances.map((row) => row.reduce((sum, chance) => sum + chance, 0)),
  )
  const gain = learned(
    axes.gain,
    axes.gain.map((_, j) => chances.reduce((sum, row) => sum + (row[j] ?? 0), 0)),
  )
  const last = sumsAt(hoop.value)
  const doubtful = known.flatMap(({ index }, i) => {
    const sums = last[i]
    return sums !== undefined && squaredMisfit(sums, gain.value, noiseSquare) > doubtfulSquare(sums.count)
      ? [index]
      : []
  })
  return { hoop, gain, used: known.length, doubtful }
}

/** Sums over the lugs of one move: y the change read, m the change for a gain of 1; and the hand's error, shared and apart (variances). */
type MoveSums = { count: number; yy: number; ym: number; mm: number; shared: number; apart: number }

/**
 * With y = gain·s·m + error and s the hand's factor N(1, shared), y has covariance v·I + shared·gain²·m·mᵀ, which Sherman and
 * Morrison's formula inverts: sums are enough, and a gain costs a few operations. Hands at several lugs miss apart from one
 * another: what they share is h²·Σt²/(Σ|t|)², the rest goes into v.
 */
function moveSums({ turns, before, after }: LoggedMove, shares: readonly number[], handError: number): MoveSums {
  const lugs = shares.length
  let [count, yy, ym, mm, scatter] = [0, 0, 0, 0, 0]
  for (let i = 0; i < lugs; i++) {
    const [was, is] = [before[i] ?? null, after[i] ?? null]
    if (was === null || is === null) continue
    let m = 0
    for (let j = 0; j < lugs; j++) {
      const turn = turns[j] ?? 0
      if (turn === 0) continue
      const part = turn * (shares[(i - j + lugs) % lugs] ?? 0)
      m += part
      scatter += part * part
    }
    const y = is - was
    count += 1
    yy += y * y
    ym += y * m
    mm += m * m
  }
  const squares = turns.reduce((sum, turn) => sum + turn * turn, 0)
  const shared = (handError ** 2 * squares) / turns.reduce((sum, turn) => sum + Math.abs(turn), 0) ** 2
  return { count, yy, ym, mm, shared, apart: Math.max(0, handError ** 2 * scatter - shared * mm) / count }
}

/** yᵀ·C⁻¹·y of the misfit. */
function squaredMisfit({ yy, ym, mm, shared, apart }: MoveSums, gain: number, noiseSquare: number): number {
  const gainSquare = gain * gain
  const v = noiseSquare + gainSquare * apart
  const along = ym - gain * mm
  const together = shared * gainSquare
  return (yy - 2 * gain * ym + gainSquare * mm - (together * along * along) / (v + together * mm)) / v
}

/** Quantile of χ² by Wilson and Hilferty's cube root. */
function doubtfulSquare(count: number): number {
  const ninth = 2 / (9 * count)
  return count * (1 - ninth + DOUBTFUL_QUANTILE * Math.sqrt(ninth)) ** 3
}

/** Logarithm of Student's t of the misfit, less what no parameter changes. */
function logChance(sums: MoveSums, gain: number, noiseSquare: number): number {
  const { count, mm, shared, apart } = sums
  const v = noiseSquare + gain * gain * apart
  const volume = (count * Math.log(v) + Math.log(1 + (shared * gain * gain * mm) / v)) / 2
  return (
    -volume - ((STUDENT_DEGREES + count) / 2) * Math.log(1 + squaredMisfit(sums, gain, noiseSquare) / STUDENT_DEGREES)
  )
}

function span(from: number, to: number): number[] {
  return Array.from({ length: GRID }, (_, i) => from + ((to - from) * i) / (GRID - 1))
}

/** The points of an axis where the chance is not negligible. */
function counted(chances: readonly number[]): number[] {
  return chances.flatMap((chance, i) => (chance > Math.exp(-NEGLIGIBLE) ? [i] : []))
}

/** The stretch of an axis from the first point that counts to the last, and one step on either side, never past its ends. */
function closeIn(axis: readonly number[], counting: readonly number[]): number[] {
  const first = Math.max(0, (counting[0] ?? 0) - 1)
  const last = Math.min(axis.length - 1, (counting.at(-1) ?? 0) + 1)
  return span(axis[first] ?? 0, axis[last] ?? 0)
}

/** Mean and 5 to 95 % of the logarithm, from chances on an even axis, straight lines between. */
function learned(axis: readonly number[], chances: readonly number[]): Learned {
  const total = chances.reduce((sum, chance) => sum + chance, 0)
  const mean = axis.reduce((sum, at, i) => sum + at * (chances[i] ?? 0), 0) / total
  const areas = axis.slice(1).map((_, i) => ((chances[i] ?? 0) + (chances[i + 1] ?? 0)) / 2)
  const area = areas.reduce((sum, part) => sum + part, 0)
  const quantile = (share: number) => {
    let left = share * area
    for (const [i, part] of areas.entries()) {
      if (left <= part && part > 0) {
        const [from = 0, to = 0, low = 0, high = 0] = [axis[i], axis[i + 1], chances[i], chances[i + 1]]
        return from + (to - from) * ((2 * left) / (low + Math.sqrt(low * low + 2 * (high - low) * left)))
      }
      left -= part
    }
    return axis.at(-1) ?? 0
  }
  return { value: Math.exp(mean), low: Math.exp(quantile(0.05)), high: Math.exp(quantile(0.95)) }
}

function requireMove(move: LoggedMove, lugs: number): void {
  for (const field of ['turns', 'before', 'after'] as const) {
    const values = move[field]
    if (values.length !== lugs || !values.every((value) => value === null || Math.abs(value) <= LARGEST)) {
      throw new AcousticsError(
        field,
        `${field}: one number for each of the ${lugs} lugs is needed, −${LARGEST} to ${LARGEST}.`,
      )
    }
  }
}
