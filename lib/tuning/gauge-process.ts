/**
 * A Bayesian straight line with a smooth bend: reading against the natural logarithm of film tension.
 *
 *   reading = a + b·(x − x̄) + bend(x) + head + noise,   x = ln T
 *
 * bend: Gaussian process, Matérn 5/2, one length in x; head: one offset a head, for what the tap model and the film's own
 * stiffness leave out; noise: one hand's repeat. How strong bend and noise are is not guessed but averaged over a grid, each
 * point weighted by how well it explains the pairs (Rasmussen & Williams, Gaussian Processes for Machine Learning, 2006,
 * sections 2.2, 2.7 and 5.2). Everything is stated in shares of the dial's span, so that any dial will do.
 */
export type ProcessPair = { readonly lnTension: number; readonly reading: number; readonly head: string }

/** What one grid point foretells of a reading: a normal distribution, with its share of the whole. */
export type ProcessPart = { readonly share: number; readonly mean: number; readonly sd: number }

export type GaugeProcess = {
  /** A reading at a tension, on one of the heads of the pairs, or on another (null). */
  foretell: (lnTension: number, head: string | null) => ProcessPart[]
  /** Rise of the line, readings per e-fold of tension. */
  slope: { readonly mean: number; readonly sd: number }
  /** Standard deviation of one hand's repeats, in readings. */
  noise: number
  /** How far each pair lies off what the others say, in standard deviations, under the likeliest grid point. */
  surprise: readonly number[]
}

/**
 * Standard deviation between heads of what the pairs' tensions leave out, in ln T, root of the squares of: 2.4 %, the tap model
 * against real heads (2 % of pitch, Rossing 1982, taken as the 90 % bound); 2.4 %, film 5 % off its nominal thickness (from
 * memory, the same); 1.5 %, the film's bending stiffness, which a gauge feels and the tap model leaves out (derived: √(D/T) is
 * 2 mm for 10 mil at 2000 N/m and 1.6 mm for 7+7 mil, against feet some 50 mm apart).
 */
const HEAD_SCATTER = 0.037

/** One hand's repeats, as shares of the span: 0.35 to 1 on a dial of 100 (common practice). Centre and spread of the prior. */
const NOISE_SHARES = [0.0025, 0.004, 0.0065, 0.01, 0.016, 0.026, 0.042]
const NOISE_PRIOR = { centre: 0.006, logSd: 0.6 }
/** How far a dial bends off a straight line in ln T: 1 to 5 in 100 (derived for spring dials, r = max·T/(T + Ts)). */
const BEND_SHARES = [0.003, 0.008, 0.02, 0.05]
const BEND_PRIOR = { centre: 0.02, logSd: 0.8 }
const BEND_LENGTH = 1.2
/** Rise of a dial, span per e-fold of tension: wide enough to hold any (from memory). */
const SLOPE_PRIOR = { mean: 0.2, sd: 0.2 }
const LEAST_SLOPE = 0.05
const MOST_SLOPE = 0.6
const LEAST_SHARE = 1e-4

/** At least two pairs, whose order does not matter if they are given sorted. `span` is the length of the dial. */
export function fitGaugeProcess(pairs: readonly ProcessPair[], span: number): GaugeProcess {
  const centre = mean(pairs.map(({ lnTension }) => lnTension))
  const x = pairs.map(({ lnTension }) => lnTension - centre)
  const level = mean(pairs.map(({ reading }) => reading))
  const rise = SLOPE_PRIOR.mean * span
  const left = pairs.map(({ reading }, i) => reading - level - rise * at(x, i))
  const slopeSd = SLOPE_PRIOR.sd * span
  const headSd = HEAD_SCATTER * Math.min(MOST_SLOPE * span, Math.max(LEAST_SLOPE * span, medianSlope(pairs)))

  const posteriors = BEND_SHARES.flatMap((bend) =>
    NOISE_SHARES.map((noise) => {
      const shared = (i: number, j: number) =>
        curveCovariance(at(x, i), at(x, j), span, slopeSd, bend * span) +
        (pairs[i]?.head === pairs[j]?.head ? headSd ** 2 : 0)
      const factor = cholesky(pairs.length, (i, j) => shared(i, j) + (i === j ? (noise * span) ** 2 : 0))
      const weights = solve(factor, left)
      const fit = left.reduce((sum, value, i) => sum + value * at(weights, i), 0)
      const logDeterminant = factor.reduce((sum, row, i) => sum + 2 * Math.log(at(row, i)), 0)
      const logPrior = logNormal(noise, NOISE_PRIOR) + logNormal(bend, BEND_PRIOR)
      return { bend, noise, factor, weights, log: logPrior - 0.5 * (fit + logDeterminant) }
    }),
  )
  const best = Math.max(...posteriors.map(({ log }) => log))
  const likely = posteriors
    .map((posterior) => ({ ...posterior, share: Math.exp(posterior.log - best) }))
    .filter(({ share }) => share > LEAST_SHARE)
  const total = likely.reduce((sum, { share }) => sum + share, 0)
  const grid = likely.map((posterior) => ({ ...posterior, share: posterior.share / total }))

  const foretell = (lnTension: number, head: string | null): ProcessPart[] =>
    grid.map(({ bend, noise, factor, weights, share }) => {
      const here = lnTension - centre
      const to = x.map(
        (there, i) =>
          curveCovariance(here, there, span, slopeSd, bend * span) + (pairs[i]?.head === head ? headSd ** 2 : 0),
      )
      const half = forward(factor, to)
      const own = curveCovariance(here, here, span, slopeSd, bend * span) + headSd ** 2
      const known = half.reduce((sum, value) => sum + value * value, 0)
      return {
        share,
        mean: level + rise * here + to.reduce((sum, value, i) => sum + value * at(weights, i), 0),
        sd: Math.sqrt(Math.max(0, own - known) + (noise * span) ** 2),
      }
    })

  const slopes = grid.map(({ factor, weights, share }): ProcessPart => {
    const to = x.map((there) => slopeSd ** 2 * there)
    const half = forward(factor, to)
    return {
      share,
      mean: rise + to.reduce((sum, value, i) => sum + value * at(weights, i), 0),
      sd: Math.sqrt(Math.max(0, slopeSd ** 2 - half.reduce((sum, value) => sum + value * value, 0))),
    }
  })
  const likeliest = grid.find(({ log }) => log === best)
  return {
    foretell,
    slope: moments(slopes),
    noise: grid.reduce((sum, { share, noise }) => sum + share * noise * span, 0),
    surprise: likeliest ? surprises(likeliest.factor, likeliest.weights) : [],
  }
}

/** Mean and standard deviation of a mixture. */
export function moments(parts: readonly ProcessPart[]): { mean: number; sd: number } {
  const middle = parts.reduce((sum, part) => sum + part.share * part.mean, 0)
  const square = parts.reduce((sum, part) => sum + part.share * (part.sd ** 2 + (part.mean - middle) ** 2), 0)
  return { mean: middle, sd: Math.sqrt(square) }
}

/** Chance that a mixture lies at or under a value. */
export function chanceUnder(parts: readonly ProcessPart[], value: number): number {
  return parts.reduce((sum, part) => sum + part.share * normalChanceUnder((value - part.mean) / part.sd), 0)
}

/** The value that a mixture lies under with a given chance, by bisection. */
export function quantile(parts: readonly ProcessPart[], chance: number): number {
  const { mean: middle, sd } = moments(parts)
  let low = middle - 12 * sd
  let high = middle + 12 * sd
  for (let step = 0; step < 48; step++) {
    const half = (low + high) / 2
    if (chanceUnder(parts, half) < chance) low = half
    else high = half
  }
  return (low + high) / 2
}

/** Abramowitz & Stegun 7.1.26; the largest error is 1.5·10⁻⁷. */
function normalChanceUnder(z: number): number {
  const t = 1 / (1 + 0.3275911 * (Math.abs(z) / Math.SQRT2))
  const tail =
    0.5 *
    t *
    (0.254829592 + t * (-0.284496736 + t * (1.421413741 + t * (-1.453152027 + t * 1.061405429)))) *
    Math.exp((-z * z) / 2)
  return z < 0 ? tail : 1 - tail
}

/** Level, line and bend; the level may lie anywhere on the dial. */
function curveCovariance(a: number, b: number, span: number, slopeSd: number, bendSd: number): number {
  const far = (Math.sqrt(5) * Math.abs(a - b)) / BEND_LENGTH
  return span ** 2 + slopeSd ** 2 * a * b + bendSd ** 2 * (1 + far + far ** 2 / 3) * Math.exp(-far)
}

/** Median of the slopes between all pairs that lie apart (Theil 1950, Sen 1968): one bad pair does not move it. */
function medianSlope(pairs: readonly ProcessPair[]): number {
  const apart = 0.05
  const slopes = pairs.flatMap((from, i) =>
    pairs.slice(i + 1).flatMap((to) => {
      const step = to.lnTension - from.lnTension
      return Math.abs(step) < apart ? [] : [(to.reading - from.reading) / step]
    }),
  )
  slopes.sort((a, b) => a - b)
  return slopes.length === 0 ? 0 : (at(slopes, (slopes.length - 1) >> 1) + at(slopes, slopes.length >> 1)) / 2
}

function logNormal(value: number, prior: { centre: number; logSd: number }): number {
  return -0.5 * (Math.log(value / prior.centre) / prior.logSd) ** 2
}

/** Lower triangle L of a positive definite matrix, L·Lᵀ. */
function cholesky(size: number, entry: (i: number, j: number) => number): number[][] {
  const rows: number[][] = []
  for (let i = 0; i < size; i++) {
    const row: number[] = []
    for (let j = 0; j <= i; j++) {
      const above = j === i ? row : (rows[j] ?? [])
      let sum = entry(i, j)
      for (let k = 0; k < j; k++) sum -= at(row, k) * at(above, k)
      row.push(i === j ? Math.sqrt(sum) : sum / at(above, j))
    }
    rows.push(row)
  }
  return rows
}

/** L⁻¹·values. */
function forward(factor: readonly number[][], values: readonly number[]): number[] {
  const out: number[] = []
  factor.forEach((row, i) => {
    let sum = at(values, i)
    for (let k = 0; k < i; k++) sum -= at(row, k) * at(out, k)
    out.push(sum / at(row, i))
  })
  return out
}

/** (L·Lᵀ)⁻¹·values. */
function solve(factor: readonly number[][], values: readonly number[]): number[] {
  const out = forward(factor, values)
  for (let i = factor.length - 1; i >= 0; i--) {
    let sum = at(out, i)
    for (let k = i + 1; k < factor.length; k++) sum -= at(factor[k] ?? [], i) * at(out, k)
    out[i] = sum / at(factor[i] ?? [], i)
  }
  return out
}

/** Leave-one-out residuals over their standard deviations (Rasmussen & Williams, eq. 5.12). */
function surprises(factor: readonly number[][], weights: readonly number[]): number[] {
  return weights.map((weight, i) => {
    const unit = factor.map((_, k) => (k === i ? 1 : 0))
    const precision = forward(factor, unit).reduce((sum, value) => sum + value * value, 0)
    return weight / Math.sqrt(precision)
  })
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length
}

/** Indices here stay inside their arrays. */
function at(values: readonly number[], index: number): number {
  return values[index] ?? Number.NaN
}
