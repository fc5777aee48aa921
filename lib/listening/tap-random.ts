/** A stream of chance that the same seed repeats, so that a made tap can be made again. */
export type TapRandom = {
  /** Even over 0 (included) to 1 (excluded). */
  uniform(): number
  /** Standard normal: mean 0, variance 1. */
  normal(): number
}

/**
 * Small fast counting generator (sfc32) on four 32-bit words, seeded by one whole number and run in for twelve rounds.
 * Passes the usual batteries; not for secrets. `normal` is Marsaglia's polar method.
 * @throws RangeError the seed is not a whole number from 0 to 2^32 − 1
 * Source: C. Doty-Humphrey, PractRand; G. Marsaglia and T. A. Bray, SIAM Review 6(3), 1964.
 */
export function tapRandom(seed: number): TapRandom {
  if (!Number.isInteger(seed) || seed < 0 || seed > 0xffff_ffff) {
    throw new RangeError(`seed is ${seed}: a whole number from 0 to 4294967295 is needed.`)
  }
  let [a, b, c, counter] = [0x9e3779b9 | 0, 0x243f6a88 | 0, seed | 0, 1]
  const word = () => {
    const sum = (((a + b) | 0) + counter) | 0
    counter = (counter + 1) | 0
    a = b ^ (b >>> 9)
    b = (c + (c << 3)) | 0
    c = (c << 21) | (c >>> 11)
    c = (c + sum) | 0
    return sum >>> 0
  }
  for (let round = 0; round < 12; round++) word()

  const uniform = () => word() / 0x1_0000_0000
  let spare: number | undefined
  const normal = () => {
    if (spare !== undefined) {
      const kept = spare
      spare = undefined
      return kept
    }
    for (;;) {
      const x = 2 * uniform() - 1
      const y = 2 * uniform() - 1
      const square = x * x + y * y
      if (square === 0 || square >= 1) continue
      const scale = Math.sqrt((-2 * Math.log(square)) / square)
      spare = y * scale
      return x * scale
    }
  }
  return { uniform, normal }
}
