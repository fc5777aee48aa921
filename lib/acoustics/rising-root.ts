/**
 * Where a function that rises through zero does so between `low` and `high`, to the last bit. Only signs count and the ends are
 * never asked: the function may run off to −∞ at `low` and +∞ at `high`, as a secular equation does between two poles. If it is
 * positive all the way the answer is `low`, if negative all the way `high`.
 */
export function risingRoot(f: (x: number) => number, low: number, high: number): number {
  let [below, above] = [low, high]
  for (;;) {
    const mid = (below + above) / 2
    if (!(mid > below && mid < above)) return mid
    if (f(mid) < 0) below = mid
    else above = mid
  }
}
