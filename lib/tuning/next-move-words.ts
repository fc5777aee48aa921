import { listed } from './head-state-words'
import type { NextMove, TurnSize } from './next-move-step'

const SIZE_WORDS: Readonly<Record<TurnSize, string>> = {
  hair: 'a hair (a sixteenth of a turn)',
  eighth: 'an eighth of a turn',
  'eighth and a hair': 'an eighth of a turn and a hair',
  quarter: 'a quarter turn',
  'quarter and a hair': 'a quarter turn and a hair',
  'quarter and an eighth': 'a quarter turn and an eighth',
  half: 'half a turn',
}

/**
 * The next move as plain sentences: "Turn lugs 2 and 6 up an eighth of a turn, then read all round."
 * @param lugs lugs on the head
 */
export function nextMoveWords(move: NextMove, lugs: number): string {
  const which = lugWords(move.lugs)
  switch (move.kind) {
    case 'seat':
      return `Turn every lug finger-tight, working across the drum: ${move.lugs.join(', ')}.`
    case 'bring-up':
      return `With two keys, turn ${which} up a quarter turn${readWords(move.thenRead, lugs)}.`
    case 'read':
      return readStep(move, lugs)
    case 'turn':
      return `${turnReason(move)}${turnWords(move)}${readWords(move.thenRead, lugs)}.`
    case 'not-sure':
      return notSure(move, which)
    case 'done':
      return done(move, which)
  }
}

function readStep(move: NextMove, lugs: number): string {
  if (move.lugs.length === lugs) return 'Read every lug once round before touching one.'
  const which = lugWords(move.lugs)
  switch (move.reason) {
    case 'doubtful':
      return `Read ${which} again: the reading was doubtful.`
    case 'turned-since':
      return `Read ${which} again: turned since the last reading.`
    case 'would-decide':
      return `Read ${which} again: that decides whether the head is even.`
    case 'far-under':
      return `Read ${which} to see how far up the head is.`
    default:
      return `Read ${which}.`
  }
}

function turnReason({ reason, lugs }: NextMove): string {
  switch (reason) {
    case 'over':
      return 'The head is over on the whole. '
    case 'under':
      return 'The head is under on the whole. '
    case 'slipped':
      return `Lug ${lugs[0]} has slipped or is loose. `
    default:
      return ''
  }
}

function turnWords({ direction, size, turns, lugs, twoKeys }: NextMove): string {
  const facing = twoKeys ? ', facing each other,' : ''
  const what =
    size === null
      ? `Turn ${listed(turns.map((turn, i) => `${i === 0 ? 'lug ' : ''}${turn.lug} ${direction} ${SIZE_WORDS[turn.size]}`))}`
      : `Turn ${lugWords(lugs)}${facing} ${direction} ${SIZE_WORDS[size]}`
  return direction === 'down' ? `${what}: go under, then come up to it` : what
}

function readWords(then: readonly number[], lugs: number): string {
  if (then.length === 0) return ''
  return then.length === lugs ? ', then read all round' : `, then read ${lugWords(then)}`
}

function notSure({ reason, lugs }: NextMove, which: string): string {
  const again = `Not sure: read ${which} again`
  switch (reason) {
    case 'contradictory':
      return `${again}. ${lugs.length === 1 ? 'Its readings' : 'Their readings'} do not agree.`
    case 'no-turn-helps':
      return `Not sure: no turn is likely to bring ${which} closer. Look for a bent hoop or an uneven edge, or leave it so.`
    case 'no-progress':
      return `Not sure: the head does not follow${lugs.length === 0 ? '' : ` at ${which}`}. Look for a bent hoop, a stiff rod or an unseated edge, then read again.`
    case 'no-reading':
      return `${again}. Without a reading there the head cannot be called even.`
    default:
      return `${again}. It is far from what the last turn should have done; look for a sticking rod or a slip.`
  }
}

function done({ reason, lugs }: NextMove, which: string): string {
  if (reason === 'at-the-edge' && lugs.length > 0) {
    return `As even as turns make it: leave it. ${which[0]!.toUpperCase()}${which.slice(1)} may lie at the edge of the tolerance.`
  }
  if (reason !== 'good-enough') return 'Even: leave it.'
  return lugs.length === 0
    ? 'Good enough for the time there is: leave it.'
    : `Good enough for the time there is: ${which} may still be out.`
}

function lugWords(lugs: readonly number[]): string {
  return lugs.length === 1 ? `lug ${lugs[0]}` : `lugs ${listed(lugs.map(String))}`
}
