/**
 * A curve that rises everywhere, as points joined by straight lines: readings (or a bound of them) over ln tension, so that
 * it can be read both ways.
 */
export type GaugeCurve = { readonly lnTensions: readonly number[]; readonly readings: readonly number[] }

/**
 * The rising curve nearest to what was foretold, by least squares (pool adjacent violators, Barlow et al. 1972). Nowhere is it
 * flatter than `leastSlope`, readings per e-fold. Made rising, the bounds of an interval cover no less than before
 * (Chernozhukov, Fernández-Val & Galichon, Biometrika 96, 2009), and bounds that did not cross still do not.
 */
export function risingCurve(
  lnTensions: readonly number[],
  foretold: readonly number[],
  leastSlope: number,
): GaugeCurve {
  const tilted = foretold.map((reading, i) => reading - leastSlope * at(lnTensions, i))
  const level = pool(tilted)
  return { lnTensions, readings: level.map((reading, i) => reading + leastSlope * at(lnTensions, i)) }
}

/** Reading at a tension; past an end it is the end's. */
export function readingAt({ lnTensions, readings }: GaugeCurve, lnTension: number): number {
  return along(lnTensions, readings, lnTension)
}

/** ln tension at a reading; past an end it is the end's. */
export function lnTensionAt({ lnTensions, readings }: GaugeCurve, reading: number): number {
  return along(readings, lnTensions, reading)
}

function pool(values: readonly number[]): number[] {
  const blocks: { sum: number; count: number }[] = []
  for (const value of values) {
    let block = { sum: value, count: 1 }
    for (let last = blocks.at(-1); last && last.sum / last.count >= block.sum / block.count; last = blocks.at(-1)) {
      block = { sum: last.sum + block.sum, count: last.count + block.count }
      blocks.pop()
    }
    blocks.push(block)
  }
  return blocks.flatMap(({ sum, count }) => Array.from({ length: count }, () => sum / count))
}

/** Straight between the points of a rising list. */
function along(from: readonly number[], to: readonly number[], value: number): number {
  if (value <= at(from, 0)) return at(to, 0)
  const last = from.length - 1
  if (value >= at(from, last)) return at(to, last)
  let low = 0
  let high = last
  while (high - low > 1) {
    const half = (low + high) >> 1
    if (at(from, half) <= value) low = half
    else high = half
  }
  const part = (value - at(from, low)) / (at(from, high) - at(from, low))
  return at(to, low) + part * (at(to, high) - at(to, low))
}

function at(values: readonly number[], index: number): number {
  return values[index] ?? Number.NaN
}
