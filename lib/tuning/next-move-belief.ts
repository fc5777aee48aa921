import type { CleanEvent } from './next-move-log'

/** One way the head may answer to turns. */
export type Hypothesis = {
  /** `shares[d]`: change of the reading d places clockwise of a turned lug, over what the same turn at every lug would do. */
  shares: readonly number[]
  /** Relative error of a turn, one deviation. */
  handError: number
  /** Turns lost or gained whatever the size, one deviation. */
  lostTurns: number
  /** Reading units by which any lug may shift of itself for every lug turned, one deviation. */
  restlessness: number
  /** A head that hardly follows the model: what is foretold of it counts for little. */
  restless: boolean
  /** Probability before any reading. */
  weight: number
}

export type BeliefPrior = {
  lugs: number
  hypotheses: readonly Hypothesis[]
  /** Reading units by which the whole head rises for one turn at every lug, and its relative deviation. */
  gain: { value: number; spread: number }
  /** Where the readings may lie at all: middle and one deviation, reading units. */
  level: { value: number; spread: number }
  /** How unequally the rods were left, one deviation in turns, and what else unevens the head, one deviation in reading units. */
  rods: number
  seat: number
}

/** What is believed of a head: Gaussian, moments matched over the hypotheses. */
export type Belief = {
  lugs: number
  /** Reading of each lug without noise. */
  mean: readonly number[]
  /** `covariance[i][j]` of those. */
  covariance: readonly (readonly number[])[]
  gain: number
  gainSpread: number
  /** Mean and variance over the hypotheses of the response shares. */
  shares: readonly number[]
  sharesVariance: readonly number[]
  handError: number
  lostTurns: number
  restlessness: number
  /** Probability that the head hardly follows the model. */
  doubt: number
  /** How many deviations the last reading lay from what was believed before it; 0 without one. */
  lastSurprise: number
}

type Filter = { of: Hypothesis; mean: Float64Array; cov: Float64Array; logWeight: number }

/**
 * Kalman filters side by side, one a hypothesis, each over the lugs' readings and the gain together (a turn is linear in both):
 * a reading updates one lug, a turn moves all by gain·R·turns and spreads them by the hand's error. Hypotheses are weighed by how
 * well they foretold the readings (Bayes).
 */
export function believe(prior: BeliefPrior, events: readonly CleanEvent[]): Belief {
  const filters = prior.hypotheses.map((of) => startFilter(prior, of))
  let lastSurprise = 0
  for (const event of events) {
    if (event.kind === 'read') lastSurprise = takeReading(filters, prior.lugs, event)
    else for (const filter of filters) takeTurn(filter, prior.lugs, event.turns)
  }
  return matched(prior.lugs, filters, lastSurprise)
}

function startFilter(prior: BeliefPrior, of: Hypothesis): Filter {
  const { lugs, gain, level, rods, seat } = prior
  const size = lugs + 1
  const mean = new Float64Array(size).fill(level.value)
  const cov = new Float64Array(size * size)
  mean[lugs] = gain.value
  cov[lugs * size + lugs] = (gain.value * gain.spread) ** 2
  const spread = (rods * gain.value) ** 2
  for (let i = 0; i < lugs; i++) {
    for (let j = 0; j < lugs; j++) {
      let together = 0
      for (let d = 0; d < lugs; d++) together += of.shares[d]! * of.shares[(d + i - j + lugs) % lugs]!
      cov[i * size + j] = level.spread ** 2 + spread * together + (i === j ? seat ** 2 : 0)
    }
  }
  return { of, mean, cov, logWeight: Math.log(of.weight) }
}

/** Updates every filter and its weight; returns the surprise, in deviations of the mixture. */
function takeReading(
  filters: readonly Filter[],
  lugs: number,
  { lug, value, noise }: Extract<CleanEvent, { kind: 'read' }>,
): number {
  const size = lugs + 1
  const best = Math.max(...filters.map(({ logWeight }) => logWeight))
  let total = 0
  let expected = 0
  let square = 0
  for (const { mean, cov, logWeight } of filters) {
    const weight = Math.exp(logWeight - best)
    total += weight
    expected += weight * mean[lug]!
    square += weight * (mean[lug]! ** 2 + cov[lug * size + lug]! + noise ** 2)
  }
  expected /= total
  const surprise = (value - expected) / Math.sqrt(square / total - expected ** 2)

  for (const filter of filters) {
    const { mean, cov } = filter
    const variance = cov[lug * size + lug]! + noise ** 2
    const miss = value - mean[lug]!
    filter.logWeight -= 0.5 * (Math.log(variance) + miss ** 2 / variance)
    const column = Float64Array.from({ length: size }, (_, i) => cov[i * size + lug]!)
    for (let i = 0; i < size; i++) {
      const share = column[i]! / variance
      mean[i]! += share * miss
      for (let j = 0; j < size; j++) cov[i * size + j]! -= share * column[j]!
    }
  }
  return surprise
}

function takeTurn({ of, mean, cov }: Filter, lugs: number, turns: readonly number[]): void {
  const size = lugs + 1
  const gain = mean[lugs]!
  const change = new Float64Array(lugs)
  for (let j = 0; j < lugs; j++) {
    if (turns[j] === 0) continue
    for (let i = 0; i < lugs; i++) change[i]! += of.shares[(i - j + lugs) % lugs]! * turns[j]!
  }
  const gainVariance = cov[lugs * size + lugs]!
  const withGain = Float64Array.from({ length: lugs }, (_, i) => cov[i * size + lugs]!)
  for (let i = 0; i < lugs; i++) {
    mean[i]! += gain * change[i]!
    for (let j = 0; j < lugs; j++) {
      cov[i * size + j]! +=
        withGain[i]! * change[j]! + change[i]! * withGain[j]! + gainVariance * change[i]! * change[j]!
    }
    cov[i * size + lugs]! += gainVariance * change[i]!
    cov[lugs * size + i]! += gainVariance * change[i]!
  }
  for (let lug = 0; lug < lugs; lug++) {
    if (turns[lug] === 0) continue
    const spread = gain ** 2 * ((of.handError * turns[lug]!) ** 2 + of.lostTurns ** 2)
    for (let i = 0; i < lugs; i++) {
      const here = of.shares[(i - lug + lugs) % lugs]! * spread
      for (let j = 0; j < lugs; j++) cov[i * size + j]! += here * of.shares[(j - lug + lugs) % lugs]!
      cov[i * size + i]! += of.restlessness ** 2
    }
  }
}

function matched(lugs: number, filters: readonly Filter[], lastSurprise: number): Belief {
  const size = lugs + 1
  const best = Math.max(...filters.map(({ logWeight }) => logWeight))
  const raw = filters.map(({ logWeight }) => Math.exp(logWeight - best))
  const total = raw.reduce((sum, weight) => sum + weight, 0)
  const weights = raw.map((weight) => weight / total)
  const average = (of: (filter: Filter) => number) =>
    filters.reduce((sum, filter, h) => sum + weights[h]! * of(filter), 0)

  const mean = Array.from({ length: size }, (_, i) => average((filter) => filter.mean[i]!))
  const covariance = Array.from({ length: size }, (_, i) =>
    Array.from({ length: size }, (_, j) =>
      average(({ mean: m, cov }) => cov[i * size + j]! + (m[i]! - mean[i]!) * (m[j]! - mean[j]!)),
    ),
  )
  const shares = Array.from({ length: lugs }, (_, d) => average(({ of }) => of.shares[d]!))
  return {
    lugs,
    mean: mean.slice(0, lugs),
    covariance,
    gain: mean[lugs]!,
    gainSpread: Math.sqrt(covariance[lugs]![lugs]!),
    shares,
    sharesVariance: shares.map((share, d) => average(({ of }) => (of.shares[d]! - share) ** 2)),
    handError: average(({ of }) => of.handError),
    lostTurns: average(({ of }) => of.lostTurns),
    restlessness: average(({ of }) => of.restlessness),
    doubt: average(({ of }) => (of.restless ? 1 : 0)),
    lastSurprise,
  }
}
