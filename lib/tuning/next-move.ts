import { requireQuantity } from '@/lib/acoustics/require-quantity'
import type { ReadingBasis } from './head-state'
import { lugOrder, requireLugs } from './lug-order'
import { believe } from './next-move-belief'
import type { Belief } from './next-move-belief'
import { bringUp } from './next-move-bring-up'
import { cleanLog, READING_NOISE } from './next-move-log'
import type { CleanLog, HeadEvent } from './next-move-log'
import { outChance } from './next-move-out-chance'
import { standing } from './next-move-plan'
import { startingGain, waysToAnswer } from './next-move-response'
import type { KnownResponse } from './next-move-response'
import { inOrder, ordinals, step } from './next-move-step'
import type { NextMove } from './next-move-step'
import { nudge, turnNext } from './next-move-turn'

export type HeadPhase = 'seat' | 'bring-up' | 'even' | 'fine'

export type NextMoveInput = {
  /** Evenly spaced lugs on the head, 4 to 12. */
  lugs: number
  /** Which readings to go by; those of the other basis are left out. */
  basis: ReadingBasis
  /** Every reading of this head and every turn, in the order in which they happened. */
  log: readonly HeadEvent[]
  /** Tap pitch wanted in Hz or, with the gauge, its reading in gauge units; null: even only. */
  target: number | null
  /** How far off a lug may be and still count as even: cents, or gauge units. */
  tolerance: number
  phase: HeadPhase
  /** Hoop and gain learned for this head or one like it (`learnHoop`), or null. */
  learned: KnownResponse | null
  /** Gauge units a cent of tap pitch here, where the gauge is calibrated; null otherwise. */
  gaugeUnitsPerCent: number | null
  /** Fifteen minutes: good enough is enough. */
  shortWay: boolean
}

/**
 * Least chance of being even at which it is called so: at once, after a whole pass that reads even, or when neither readings nor
 * turns settle it. The chance is one less the lugs' chances of being out, added up: a lower bound by the belief, no promise. On
 * drums as modelled 92 to 98 in 100 first calls are true, by the benchmark; on a head with a side leak or a bent hoop, fewer.
 */
const SURE = { atOnce: 0.9, afterPass: 0.7, short: 0.7, atEdge: 0.4 }
/** Readings a lug since the last turn after which reading on is no longer the answer, and after which nothing is. */
const SETTLED_ROUND = 2
const GIVEN_UP_ROUND = 4
/** Chance of being out past which a lug is named as lying at the edge. */
const AT_EDGE = 0.2
/** Runs of turns after which a head that is not even does not follow. */
const passesAtMost = (lugs: number) => 6 + 2 * lugs
/** Relative spread of the gain under which a whole pass is turned before it is read again. */
const GAIN_KNOWN = 0.2
/** Readings after the last turn, beyond one a lug, past which turning is better than reading on. */
const TIRED_AFTER = 3
/** Spread of where readings may lie at all: many tolerances. */
const LEVEL_SPREAD = { gauge: 15, tap: 400 }
/**
 * How unequally a bring-up leaves the rods, in turns (from memory), and what else unevens a head, in noises of a reading: taps show
 * the mean and the two-fold part only, so what else they read is no shape of the head.
 */
const RODS_SPREAD = 0.14
const SEAT_SPREAD = { gauge: 1.2, tap: 0.3 }
/** Deviations from what was expected past which a reading is asked for again. */
const SURPRISING = 5
/** A head that follows the model this little is read all round after every change. */
const DOUBTED = 0.5

/**
 * The one next step for a head, by the rules of the trade (common practice) and, within them, the fewest seconds expected:
 * seat finger-tight first; bring up in quarter turns, two keys on facing lugs; read every lug before touching one; never one low
 * lug alone unless it has slipped or is loose; over on the whole nothing goes up, under on the whole nothing goes down; read what
 * was turned before it is turned again or the head is called even; arrive from below.
 * A head that does not follow what is expected of it is believed less and read more.
 * @throws AcousticsError naming `lugs`, `lug`, `value`, `unit`, `turns`, `target`, `tolerance` or `gaugeUnitsPerCent`
 */
export function nextMove(input: NextMoveInput): NextMove {
  const { basis, phase } = input
  const lugs = requireLugs(input.lugs)
  requireQuantity('tolerance', input.tolerance, { min: 0.05, max: 600, unit: basis === 'tap' ? 'cents' : '' })
  if (input.gaugeUnitsPerCent !== null) {
    requireQuantity('gaugeUnitsPerCent', input.gaugeUnitsPerCent, { min: 1e-4, max: 10, unit: '' })
  }
  const log = cleanLog(input.log, input)
  if (phase === 'seat') return step('seat', 'seat-first', { lugs: lugOrder(lugs) })
  if (log.contradictory.length > 0) return step('not-sure', 'contradictory', { lugs: ordinals(log.contradictory) })
  return (phase === 'bring-up' ? bringUp(input, log) : null) ?? evenOut(input, log)
}

function evenOut(input: NextMoveInput, log: CleanLog): NextMove {
  const { lugs, basis, tolerance } = input
  const history = readAndTurned(lugs, log)
  const unread = history.lastRead.flatMap((at, lug) => (at < 0 ? [lug] : []))
  const lost = unread.filter((lug) => log.missed[lug]! >= 2)
  if (unread.length > lost.length)
    return step('read', 'not-read-yet', { lugs: ordinals(unread.filter((lug) => !lost.includes(lug))) })
  if (lost.length > 0) return step('not-sure', 'no-reading', { lugs: ordinals(lost) })
  if (history.doubtful.length > 0) return step('read', 'doubtful', { lugs: ordinals(history.doubtful) })

  const noise = basis === 'gauge' ? READING_NOISE.gauge : READING_NOISE['tap-heard']
  const heights = log.events.flatMap((event) => (event.kind === 'read' ? [event.value] : []))
  const belief = believe(
    {
      lugs,
      hypotheses: waysToAnswer(lugs, basis, input.learned, noise),
      gain: startingGain(basis, input.learned, input.gaugeUnitsPerCent),
      level: { value: heights[0] ?? 0, spread: LEVEL_SPREAD[basis] },
      rods: RODS_SPREAD,
      seat: SEAT_SPREAD[basis] * noise,
    },
    log.events,
  )
  const { off, variance } = standing(belief, log.target)
  const out = Array.from(off, (value, lug) => outChance(value, variance[lug]!, tolerance))
  const evenChance = Math.max(0, 1 - out.reduce((sum, chance) => sum + chance, 0))
  const said = { evenChance }
  const last = log.events.at(-1)
  if (
    last?.kind === 'read' &&
    Math.abs(belief.lastSurprise) > SURPRISING &&
    history.readsSinceTurn[last.lug] === 1 &&
    history.lastTurned >= 0
  ) {
    return step('not-sure', 'surprising', { ...said, lugs: [last.lug + 1] })
  }

  const pending = history.lastRead.flatMap((at, lug) => (at < history.lastTurn[lug]! ? [lug] : []))
  const doubted = belief.doubt > DOUBTED
  const stale = history.lastRead.flatMap((at, lug) => (at < history.lastTurned ? [lug] : []))
  const left = ordinals(out.flatMap((chance, lug) => (chance > AT_EDGE ? [lug] : [])))
  if (stale.length === 0 && history.passes >= passesAtMost(lugs) && evenChance < SURE.atEdge) {
    return step('not-sure', 'no-progress', { ...said, lugs: left })
  }
  const known = !doubted && belief.gainSpread / belief.gain < GAIN_KNOWN
  if (pending.length === 0 || known) {
    const turn = turnNext({ lugs, tolerance, fine: input.phase === 'fine', shortWay: input.shortWay }, log, belief, {
      pending,
      tired: history.sinceTurn > lugs + TIRED_AFTER,
      known,
      off,
      said,
    })
    if (turn !== null) return turn
  }
  if (pending.length > 0)
    return step('read', 'turned-since', { ...said, lugs: inOrder(doubted ? stale : pending, lugs) })

  const passDone = stale.length === 0
  const unexplained = basis === 'tap' ? readsOut(history.latest, log.target, tolerance + 2 * noise) : []
  if (unexplained.length > 0 && evenChance >= SURE.afterPass) {
    return step('not-sure', 'no-turn-helps', { lugs: ordinals(unexplained) })
  }
  if (!doubted || passDone) {
    if (evenChance >= SURE.atOnce) return step('done', 'believed-even', said)
    if (passDone && evenChance >= SURE.afterPass && readsOut(history.latest, log.target, tolerance).length === 0) {
      return step('done', 'pass-even', said)
    }
  }
  if (input.shortWay && passDone && (evenChance >= SURE.short || history.passes >= 2)) {
    return step('done', 'good-enough', {
      ...said,
      lugs: ordinals(out.flatMap((chance, lug) => (chance > 0.5 ? [lug] : []))),
    })
  }
  if (passDone && history.sinceTurn >= SETTLED_ROUND * lugs) {
    if (evenChance >= SURE.atEdge) return step('done', 'at-the-edge', { ...said, lugs: left })
    const small = nudge({ lugs, tolerance }, log, belief, { off, said })
    if (small !== null) return small
    if (history.sinceTurn >= GIVEN_UP_ROUND * lugs) return step('not-sure', 'no-progress', { ...said, lugs: left })
  }
  const telling = mostTelling(belief, out, noise, stale.length > 0 ? stale : [...out.keys()])
  return step('read', stale.length > 0 ? 'rest-of-pass' : 'would-decide', { ...said, lugs: [telling + 1] })
}

type History = {
  /** Place in the log of each lug's last reading and last turn, −1 for none; and of the last turn of any. */
  lastRead: number[]
  lastTurn: number[]
  lastTurned: number
  readsSinceTurn: number[]
  /** Readings since anything was turned. */
  sinceTurn: number
  /** Runs of turns with readings between. */
  passes: number
  latest: number[]
  /** Lugs with one reading since anything was turned, and that one doubtful. */
  doubtful: number[]
}

function readAndTurned(lugs: number, log: CleanLog): History {
  const none = Array.from({ length: lugs }, () => -1)
  const history: History = {
    lastRead: [...none],
    lastTurn: [...none],
    lastTurned: -1,
    readsSinceTurn: none.map(() => 0),
    sinceTurn: 0,
    passes: 0,
    latest: none.map(() => Number.NaN),
    doubtful: [],
  }
  log.events.forEach((event, at) => {
    if (event.kind === 'read') {
      history.lastRead[event.lug] = at
      history.readsSinceTurn[event.lug]!++
      history.latest[event.lug] = event.value
      history.sinceTurn++
      const once = history.readsSinceTurn[event.lug] === 1
      history.doubtful = history.doubtful.filter((lug) => lug !== event.lug)
      if (event.doubtful && once) history.doubtful.push(event.lug)
      return
    }
    if (log.events[at - 1]?.kind === 'read') history.passes++
    event.turns.forEach((turns, lug) => {
      if (turns !== 0) history.lastTurn[lug] = at
    })
    history.lastTurned = at
    history.readsSinceTurn.fill(0)
    history.doubtful = []
    history.sinceTurn = 0
  })
  return history
}

/** Lugs (0-based) whose latest reading lies outside the tolerance. */
function readsOut(latest: readonly number[], target: number | null, tolerance: number): number[] {
  const level = target ?? latest.reduce((sum, value) => sum + value, 0) / latest.length
  return latest.flatMap((value, lug) => (Math.abs(value - level) > tolerance ? [lug] : []))
}

/** The lug whose reading would tell most of the lugs that may be out. */
function mostTelling(belief: Belief, out: readonly number[], noise: number, among: readonly number[]): number {
  const tells = (lug: number) => {
    const row = belief.covariance[lug]!
    return out.reduce((sum, chance, other) => sum + (chance * row[other]! ** 2) / (row[lug]! + noise ** 2), 0)
  }
  return among.reduce((best, lug) => (tells(lug) > tells(best) ? lug : best))
}
