import { compared, figure } from './bench-row'
import type { Bench, BenchRow } from './bench-row'
import { adviceMs, play, quantile, seconds } from './evenness/tournament'
import type { Field, Players } from './evenness/tournament'
import type { Score } from './evenness/game'
import { GENTLE } from './evenness/true-drum'

/**
 * Next move: seconds, key moves and re-reads until a head is truly even, following the advice, against worst lug first and blind
 * full passes (both told the true gain) and the best possible on the same drums (see evenness/best-possible.ts). Readings cost
 * 3 s, every lug turned 5 s, a false "even" 30 s and what it takes to go on; a head given up, or not even by then, 900 s. How a
 * bring-up leaves the rods is from memory, so a gentler one stands beside it. Tuned on other seeds than these.
 */
export const rows: Bench = (say) =>
  FIELDS.flatMap(({ name, full, ...field }) =>
    COUNTS.flatMap((lugs) => {
      const players = play({ ...field, lugs, firstSeed: FIRST_SEED })
      say(`${name}, ${lugs} lugs`)
      return figures(`${name}, ${lugs} lugs`, lugs, players, full)
    }),
  )

const FIRST_SEED = 400_000
const COUNTS = [4, 5, 6, 7, 8, 9, 10, 11, 12]

const FIELDS: (Omit<Field, 'lugs' | 'firstSeed'> & { name: string; full: boolean })[] = [
  { name: 'as modelled', kind: 'plain', drums: 400, against: 'mean', gainLearned: true, full: true },
  {
    name: 'gentle bring-up',
    kind: 'plain',
    fingerTight: GENTLE,
    drums: 400,
    against: 'mean',
    gainLearned: true,
    full: true,
  },
  { name: 'nothing learned', kind: 'plain', drums: 40, against: 'mean', gainLearned: false, full: false },
  { name: 'quiet gauge', kind: 'plain', drums: 40, against: 'mean', gainLearned: true, noise: 0.2, full: false },
  { name: 'rough gauge', kind: 'plain', drums: 40, against: 'mean', gainLearned: true, noise: 0.5, full: false },
  { name: 'to a reading', kind: 'plain', drums: 40, against: 'target', gainLearned: true, full: false },
  { name: 'friction', kind: 'friction', drums: 40, against: 'mean', gainLearned: true, full: false },
  { name: 'sticking rod', kind: 'sticking rod', drums: 40, against: 'mean', gainLearned: true, full: false },
  { name: 'side leak', kind: 'side leak', drums: 40, against: 'mean', gainLearned: true, full: false },
  { name: 'bent hoop', kind: 'bent hoop', drums: 40, against: 'mean', gainLearned: true, full: false },
]

function figures(at: string, lugs: number, players: Players, full: boolean): BenchRow[] {
  const { advice, best } = players
  const habits = [
    { name: 'worst lug first', scores: players.worstFirst },
    { name: 'blind passes', scores: players.blind },
  ]
  const better = habits.reduce((a, b) => (quantile(seconds(b.scores), 0.5) < quantile(seconds(a.scores), 0.5) ? b : a))
  const goal = lugs >= 6 && lugs <= 10 ? 0.7 : 1
  const row = (metric: string, of: (score: Score) => number, share: number, unit: string, aim?: number) =>
    compared({
      case: at,
      metric,
      value: quantile(advice.map(of), share),
      unit,
      baseline: better.name,
      baselineValue: quantile(better.scores.map(of), share),
      ...(aim === undefined ? {} : { goal: aim }),
    })
  const over = (metric: string, baseline: string, others: number[], aim?: number) =>
    compared({
      case: at,
      metric,
      value: quantile(seconds(advice), 0.5),
      unit: 's',
      baseline,
      baselineValue: quantile(others, 0.5),
      ...(aim === undefined ? {} : { goal: aim }),
    })
  const rows = [
    row('time to even, median', ({ seconds: s }) => s, 0.5, 's', goal),
    row('time to even, 90 %', ({ seconds: s }) => s, 0.9, 's', goal),
    ...[{ name: 'advice', scores: advice }, better].map(({ name, scores }) =>
      figure({ case: at, metric: `never even, ${name}`, value: percent(scores, ({ even }) => !even), unit: '%' }),
    ),
    over('time to even, median', 'blind passes, best damping', seconds(players.blindDamped), 1),
  ]
  if (!full) return rows
  const trueCalls = (scores: readonly Score[]) => percent(scores, ({ falseCalls }) => falseCalls === 0)
  return [
    ...rows,
    over('time to even, median', 'best possible', seconds(best)),
    row('key moves, median', ({ keyMoves }) => keyMoves, 0.5, ''),
    row('key moves, 90 %', ({ keyMoves }) => keyMoves, 0.9, ''),
    row('re-reads, median', ({ rereadings }) => rereadings, 0.5, ''),
    row('re-reads, 90 %', ({ rereadings }) => rereadings, 0.9, ''),
    figure({
      case: at,
      metric: 'best possible, key moves, median',
      value: quantile(
        best.map(({ keyMoves }) => keyMoves),
        0.5,
      ),
      unit: '',
    }),
    figure({ case: at, metric: 'advice, a call', value: adviceMs(lugs, FIRST_SEED), unit: 'ms', goal: 5 }),
    figure({ case: at, metric: 'first call of even true, advice', value: trueCalls(advice), unit: '%' }),
    ...habits.map(({ name, scores }) =>
      figure({ case: at, metric: `first call of even true, ${name}`, value: trueCalls(scores), unit: '%' }),
    ),
  ]
}

function percent(scores: readonly Score[], those: (score: Score) => boolean): number {
  return (100 * scores.filter(those).length) / scores.length
}
