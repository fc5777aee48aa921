import type { Bench } from './bench-row'
import { pitchCases } from './listening/pitch-cases'
import { pitchRows } from './listening/pitch-rows'
import { refusalRows } from './listening/refusal-rows'
import { timeRows } from './listening/time-rows'
import { warbleRows } from './listening/warble-rows'

/**
 * Hearing a tap: pitch over the Cramér–Rao bound and beside general-purpose pitch packages, what is refused, time, warble.
 * Taps come from the synthesiser. Level is the first 0.1 s of the clean tap over white noise of all frequencies; the
 * bound is that of the (1,1) partials alone (one for an even head, two for a split one) with every amplitude, phase, frequency and decay
 * unknown, over all samples from the strike on. Spread is the median error over 0.6745, the 95th percentile over 1.96, so that
 * 1 meets the bound.
 */
const SEED = 20_261_201

export const rows: Bench = async (say) => {
  say('taps in noise, ours and four detectors')
  const pitch = pitchRows(pitchCases(SEED, 12, 4))
  say('warble')
  const warble = warbleRows(SEED + 1, 4)
  say('non-taps and good taps in a room')
  const refusals = refusalRows(SEED + 2, 120)
  say('time')
  return [...pitch, ...warble, ...refusals, ...(await timeRows(SEED + 3))]
}
