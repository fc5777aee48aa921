/** Cents from the middle that a plan may add up to before they would spill into its cost: 64 drums of 127 semitones stay below. */
const CENTS_ROOM = 2 ** 20

/**
 * The order of plans in one number: by cost, then by how many cents all drums together lie from the middles of their ranges.
 * Both are whole, so sums are exact. Plans equal in it are ordered by their notes (`lowerNotesFirst`).
 */
export function planKey(thousandths: number, centsFromCentre: number): number {
  return thousandths * CENTS_ROOM + centsFromCentre
}

/** The cost part of a key, thousandths. */
export function thousandthsOf(key: number): number {
  return Math.floor(key / CENTS_ROOM)
}

/** The last tie: the plan that is lower at the first drum where two differ (toms from the smallest, kicks, snares). */
export function lowerNotesFirst(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < a.length; i++) {
    const difference = (a[i] ?? 0) - (b[i] ?? 0)
    if (difference !== 0) return difference
  }
  return 0
}

/** Puts an entry in its place in a sorted list. */
export function insertInOrder<T>(sorted: T[], entry: T, compare: (a: T, b: T) => number): void {
  let [from, to] = [0, sorted.length]
  while (from < to) {
    const middle = (from + to) >> 1
    const there = sorted[middle]
    if (there !== undefined && compare(there, entry) <= 0) from = middle + 1
    else to = middle
  }
  sorted.splice(from, 0, entry)
}
