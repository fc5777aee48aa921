import { lugOrder } from './lug-order'

export type TurnSize =
  'hair' | 'eighth' | 'eighth and a hair' | 'quarter' | 'quarter and a hair' | 'quarter and an eighth' | 'half'

export type LugTurn = { lug: number; size: TurnSize; /** Whole turns of the key, tighter positive. */ turns: number }

export type NextMoveKind = 'seat' | 'bring-up' | 'read' | 'turn' | 'not-sure' | 'done'

export type NextMoveReason =
  /** Seat: finger-tight comes first. */
  | 'seat-first'
  /** Bring-up: the next quarter turn of the round. */
  | 'bring-up'
  /** Bring-up or read: the whole head lies far under the target. */
  | 'far-under'
  /** Read: lugs without a reading, with a doubtful one only, turned since theirs, the rest after a turn, or one that decides. */
  | 'not-read-yet'
  | 'doubtful'
  | 'turned-since'
  | 'rest-of-pass'
  | 'would-decide'
  /** Turn: the head is over or under on the whole, a lug stands alone far under the rest, or the head is uneven. */
  | 'over'
  | 'under'
  | 'slipped'
  | 'uneven'
  /** Not sure: readings of a lug contradict each other, one is far from anything expected, a lug gives none, no turn is of use. */
  | 'contradictory'
  | 'surprising'
  | 'no-reading'
  | 'no-turn-helps'
  /** Not sure: turns and readings enough for an even head, and it is not. */
  | 'no-progress'
  /** Done: believed so, by a whole pass within tolerance, or good enough for the short way. */
  | 'believed-even'
  | 'pass-even'
  /** Done: more likely even than reading on would show, some lugs at the edge of the tolerance. */
  | 'at-the-edge'
  | 'good-enough'

/** One next step. Lugs are 1-based, in the order in which to take them. */
export type NextMove = {
  kind: NextMoveKind
  reason: NextMoveReason
  lugs: number[]
  direction: 'up' | 'down' | null
  /** The size of every turn, or null where they differ (see `turns`) or there is none. */
  size: TurnSize | null
  turns: LugTurn[]
  /** Arrive from below: on the way down go under and come up. True of every turn. */
  fromBelow: boolean
  /** Two keys at once, on lugs that face each other. */
  twoKeys: boolean
  /** Readings to expect when it is done, lug by lug, in Hz, cents or gauge units as they were read; null without any. */
  expected: number[] | null
  /** Lugs to read then; none while more turns of the pass follow. */
  thenRead: number[]
  /** Least chance that every lug is within tolerance now, 0 to 1; null before every lug was read. */
  evenChance: number | null
}

/** A step with nothing in it but what is given. */
export function step(kind: NextMoveKind, reason: NextMoveReason, of: Partial<NextMove>): NextMove {
  return {
    kind,
    reason,
    lugs: [],
    direction: null,
    size: null,
    turns: [],
    fromBelow: of.turns !== undefined,
    twoKeys: false,
    expected: null,
    thenRead: [],
    evenChance: null,
    ...of,
  }
}

/** 0-based lugs as 1-based ones in the order of turning. */
export function inOrder(some: readonly number[], lugs: number): number[] {
  return lugOrder(lugs).filter((lug) => some.includes(lug - 1))
}

/** 0-based lugs as 1-based ones. */
export function ordinals(some: readonly number[]): number[] {
  return some.map((lug) => lug + 1)
}
