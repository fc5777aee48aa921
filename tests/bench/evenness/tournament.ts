import { HOOP_PRIORS } from '@/lib/tuning/hoop-learning'
import type { KnownResponse } from '@/lib/tuning/next-move-response'
import { advise, followAdvice, gaugeReading } from './advised'
import { bestPossible } from './best-possible'
import { newGame, TOLERANCE } from './game'
import type { Against, Score } from './game'
import { blindPasses, worstLugFirst } from './habits'
import type { Gains } from './habits'
import { seededRandom } from './seeded-random'
import { trueDrum } from './true-drum'
import type { DrumOf, TrueDrum } from './true-drum'

export type Field = DrumOf & {
  drums: number
  firstSeed: number
  against: Against
  /** Whether the advice is told this drum's gain beforehand, give or take; the habits always know it exactly. */
  gainLearned: boolean
}

export type Players = {
  advice: Score[]
  /** As the habit is commonly played, by the way of reading again that is best here. */
  worstFirst: Score[]
  /** Every lug that reads out is turned by its own deviation. */
  blind: Score[]
  /** The same at the damping and threshold that did best on other seeds: what a very practised hand does. */
  blindDamped: Score[]
  best: { seconds: number; keyMoves: number }[]
}

/** Relative deviation of the gain that the advice is told from the true one. */
const LEARNED_GAIN_SPREAD = 0.15
const TOLD_STREAM = 103

/** Everybody plays the same drums: the same start, hand and noise by seed. Drums that no turns can make even are left out. */
export function play({ drums, firstSeed, against, gainLearned, ...of }: Field): Players {
  const seeds: number[] = []
  const best: Players['best'] = []
  for (let seed = firstSeed; seeds.length < drums; seed++) {
    const least = bestPossible(trueDrum(seed, of), against)
    if (least === null) continue
    seeds.push(seed)
    best.push(least)
  }
  const each = (go: (drum: TrueDrum, game: ReturnType<typeof newGame>, seed: number) => void) =>
    seeds.map((seed) => {
      const drum = trueDrum(seed, of)
      const game = newGame(drum, against)
      go(drum, game, seed)
      return game.score()
    })
  const habit = (way: ReturnType<typeof blindPasses>) => each((drum, game) => way(game, trueGains(drum)))
  return {
    advice: each((drum, game, seed) =>
      followAdvice(game, gainLearned ? told(trueGains(drum).whole, seed, of.lugs) : null),
    ),
    worstFirst: (['turned', 'facing', 'all'] as const)
      .map((again) => habit(worstLugFirst(again)))
      .reduce((a, b) => (quantile(seconds(b), 0.5) < quantile(seconds(a), 0.5) ? b : a)),
    blind: habit(blindPasses({ leave: 1, share: 1 })),
    blindDamped: habit(blindPasses({ leave: 0.8, share: 0.75 })),
    best,
  }
}

/** Median milliseconds of one call of the advice right after the first pass, where it plans the most. */
export function adviceMs(lugs: number, firstSeed: number): number {
  const times = Array.from({ length: 40 }, (_, i) => {
    const drum = trueDrum(firstSeed + i, { lugs, kind: 'plain' })
    const log = Array.from({ length: lugs }, (__, lug) => gaugeReading(lug + 1, drum.read(lug + 1)))
    const from = performance.now()
    advise(log, { lugs, against: 'mean', tolerance: TOLERANCE, learned: null })
    return performance.now() - from
  })
  return quantile(times, 0.5)
}

export function seconds(scores: readonly { seconds: number }[]): number[] {
  return scores.map((score) => score.seconds)
}

export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b)
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? Number.NaN
}

function trueGains({ response }: TrueDrum): Gains {
  const own = response.map((row, i) => row[i] ?? 0)
  const whole = response.map((row) => row.reduce((sum, value) => sum + value, 0))
  return { own: mean(own), whole: mean(whole) }
}

function told(wholeGain: number, seed: number, lugs: number): KnownResponse {
  const value = wholeGain * Math.exp(LEARNED_GAIN_SPREAD * seededRandom(seed, lugs, TOLD_STREAM).normal())
  const interval = (middle: number, spread: number) => ({
    value: middle,
    low: middle * Math.exp(-1.645 * spread),
    high: middle * Math.exp(1.645 * spread),
  })
  const { hoop } = HOOP_PRIORS.gauge
  return { gain: interval(value, LEARNED_GAIN_SPREAD), hoop: interval(hoop.median, hoop.spread) }
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length
}
