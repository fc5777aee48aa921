import { WANTED_READING } from './true-drum'
import type { TrueDrum } from './true-drum'

/** Seconds by common practice: a gauge reading, one lug turned by one key. Two keys at once are counted as two. */
export const SECONDS_A_READING = 3
export const SECONDS_A_MOVE = 5
/** Seconds lost when a head called even is not: off its stand again, set up again; the readings that follow count besides. */
const SECONDS_A_FALSE_CALL = 30
/** Every false call makes every player ask for this much closer readings. */
const CLOSER = 0.8
/** A head that is not even by then counts with these seconds. */
const SECONDS_AT_MOST = 900
/** Readings within one unit count as even: common practice. */
export const TOLERANCE = 1

/** Against what a head is to be even: its own mean, or the reading wanted. */
export type Against = 'mean' | 'target'

export type Score = {
  seconds: number
  keyMoves: number
  readings: number
  /** Readings after the first pass round the head. */
  rereadings: number
  falseCalls: number
  /** Truly even when the clock stopped. */
  even: boolean
}

/** One head in one player's hands: counts time, and is over once a call of "even" is true or the time is up. */
export type Game = {
  lugs: number
  against: Against
  over: () => boolean
  read: (lug: number) => number
  turn: (lug: number, turns: number) => void
  /** What a player asks of the readings: the tolerance, and less after every false call. */
  tolerance: () => number
  /** "It is even": ends the game when it truly is. */
  call: () => void
  /** "It does not follow": ends the game, and counts as a head that is not even by then. */
  giveUp: () => void
  score: () => Score
}

export function newGame(drum: TrueDrum, against: Against): Game {
  let readings = 0
  let keyMoves = 0
  let falseCalls = 0
  let even = false
  let givenUp = false
  const seconds = () => readings * SECONDS_A_READING + keyMoves * SECONDS_A_MOVE + falseCalls * SECONDS_A_FALSE_CALL
  return {
    lugs: drum.lugs,
    against,
    over: () => even || givenUp || seconds() >= SECONDS_AT_MOST,
    read: (lug) => {
      readings++
      return drum.read(lug)
    },
    turn: (lug, turns) => {
      keyMoves++
      drum.turn(lug, turns)
    },
    tolerance: () => TOLERANCE * CLOSER ** falseCalls,
    call: () => {
      even = largestDeviation(drum.readings(), against) <= TOLERANCE
      if (!even) falseCalls++
    },
    giveUp: () => {
      givenUp = true
    },
    score: () => ({
      seconds: even ? seconds() : SECONDS_AT_MOST,
      keyMoves,
      readings,
      rereadings: readings - drum.lugs,
      falseCalls,
      even,
    }),
  }
}

/** How far each lug is off what it is judged against, units. */
export function deviations(readings: readonly number[], against: Against): number[] {
  const level =
    against === 'target' ? WANTED_READING : readings.reduce((sum, value) => sum + value, 0) / readings.length
  return readings.map((value) => value - level)
}

export function largestDeviation(readings: readonly number[], against: Against): number {
  return Math.max(...deviations(readings, against).map(Math.abs))
}
