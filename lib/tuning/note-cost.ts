import type { PlayableRange } from './playable-range'

/**
 * What a plan is charged for, in one unit: an interval of the toms one semitone off what the template asks costs 1. Weights
 * of our own choosing, made so that intervals give way before a drum comes near the edge of its range, a drum stays in its
 * range before two keep apart, and nothing ever buys a larger drum above a smaller one.
 */
export const NOTE_COSTS = {
  /** A drum at the edge of its range. From nothing at the edge of the middle third it grows with the square of the way there. */
  offMiddleAtEdge: 3,
  /** A drum outside its range, at once and for every semitone. */
  outOfRange: 10,
  outOfRangePerSemitone: 5,
  /** An interval of the toms, or the kick's under the lowest tom, for every semitone off the nearest that is asked. */
  intervalPerSemitone: 1,
  /** Two drums nearer than the set distance: at the distance, and what comes to it down to one and the same note. */
  tooClose: 4,
  tooCloseAtSameNote: 4,
  /** A snare on the note name of a tom, for each such tom. */
  sharedName: 2,
  /** A larger tom above the next smaller, or a kick above the lowest tom: more than everything else together. */
  order: 10_000,
} as const

/** A tone: nearer, two drums of a kit are hard to tell apart. */
export const DEFAULT_APART_SEMITONES = 2

/** Costs are counted in whole thousandths, so that sums are exact and equal plans are equal in any order of adding. */
const THOUSANDTHS = 1000

function thousandths(cost: number): number {
  return Math.round(cost * THOUSANDTHS)
}

/** A sum of whole thousandths in the cost's unit. */
export function costOf(sumOfThousandths: number): number {
  return sumOfThousandths / THOUSANDTHS
}

/** Semitones outside a span: negative under it, 0 inside. */
export function outside(pitch: number, low: number, high: number): number {
  return pitch < low ? pitch - low : pitch > high ? pitch - high : 0
}

/** Thousandths. Nothing in the middle third, then with the square of the way to the edge of the range, and no more past it. */
export function offMiddleCost(pitch: number, { low, middleLow, middleHigh, high }: PlayableRange): number {
  const off = outside(pitch, middleLow, middleHigh)
  const wayToEdge = off < 0 ? -off / (middleLow - low) : off / (high - middleHigh)
  return thousandths(NOTE_COSTS.offMiddleAtEdge * Math.min(1, wayToEdge) ** 2)
}

/** Thousandths. */
export function outOfRangeCost(pitch: number, { low, high }: PlayableRange): number {
  const semitones = Math.abs(outside(pitch, low, high))
  return semitones === 0 ? 0 : thousandths(NOTE_COSTS.outOfRange + NOTE_COSTS.outOfRangePerSemitone * semitones)
}

/** Semitones from an interval to the nearest of those asked; 0 when none is. */
export function offAsked(got: number, asked: readonly number[]): number {
  let nearest = Infinity
  for (const each of asked) nearest = Math.min(nearest, Math.abs(got - each))
  return nearest === Infinity ? 0 : nearest
}

/** Thousandths, for an interval counted down. */
export function intervalCost(got: number, asked: readonly number[]): number {
  return thousandths(NOTE_COSTS.intervalPerSemitone * offAsked(got, asked))
}

/** Thousandths, for an interval counted down: the larger drum must not sound higher. */
export function orderCost(got: number): number {
  return got < 0 ? thousandths(NOTE_COSTS.order) : 0
}

/** Thousandths, for two drums so many semitones from each other. */
export function tooCloseCost(semitones: number, apartSemitones: number): number {
  const distance = Math.abs(semitones)
  if (distance >= apartSemitones) return 0
  return thousandths(NOTE_COSTS.tooClose + NOTE_COSTS.tooCloseAtSameNote * (1 - distance / apartSemitones))
}

/** Whether two pitches bear one note name, in whatever octave: within half a semitone. */
function sameName(pitch: number, other: number): boolean {
  const apart = Math.abs(pitch - other) % 12
  return Math.min(apart, 12 - apart) < 0.5
}

/** Thousandths, for a snare and a tom. */
export function sharedNameCost(snarePitch: number, tomPitch: number): number {
  return sameName(snarePitch, tomPitch) ? thousandths(NOTE_COSTS.sharedName) : 0
}
