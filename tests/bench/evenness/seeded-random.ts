/** A stream of pseudo-random numbers that a seed repeats exactly. */
export type SeededRandom = {
  /** Evenly in [low, high). */
  between: (low: number, high: number) => number
  /** Evenly in the logarithm, so that a half and a double are as likely; both ends above 0. */
  around: (low: number, high: number) => number
  /** Whole number 0 … below. */
  whole: (below: number) => number
  /** Gaussian of mean 0 and deviation 1 (Box and Muller, 1958). */
  normal: () => number
}

/** Mulberry32 on a seed mixed from all the given numbers, so that neighbouring seeds do not run alike. */
export function seededRandom(...seeds: readonly number[]): SeededRandom {
  let state = seeds.reduce(
    (mixed, seed) => Math.imul(mixed ^ (seed + 0x9e3779b9), 0x85ebca6b) ^ (mixed >>> 13),
    0x2545f491,
  )
  const next = () => {
    state = (state + 0x6d2b79f5) | 0
    let bits = Math.imul(state ^ (state >>> 15), 1 | state)
    bits = (bits + Math.imul(bits ^ (bits >>> 7), 61 | bits)) ^ bits
    return ((bits ^ (bits >>> 14)) >>> 0) / 4294967296
  }
  return {
    between: (low, high) => low + (high - low) * next(),
    around: (low, high) => low * (high / low) ** next(),
    whole: (below) => Math.floor(next() * below),
    normal: () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next()),
  }
}
