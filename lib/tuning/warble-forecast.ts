import type { DrumRole, HeadSide } from '@/lib/acoustics/tension-range'
import type { Amount } from './evenness'
import type { GaugeEvenness } from './evenness-by-gauge'
import type { TapEvenness } from './evenness-by-taps'

/** Warble to expect of a head, beats a second, or why there is no forecast. */
export type WarbleForecast =
  | { kind: 'forecast'; beatsPerS: Amount }
  /** Four even lugs show one direction only: it warbles at least so much. `low` is a bound, `high` is not. */
  | { kind: 'at-least'; beatsPerS: Amount }
  /** Snare beds make a snare side uneven on purpose: no advice. */
  | { kind: 'snare-side' }
  | { kind: 'gauge-not-calibrated' }
  | { kind: 'not-enough'; read: number[] }
  | { kind: 'not-sure'; again: number[] }

/** The forecast from the evenness of one head, by taps or by a gauge. */
export function warbleForecast({
  role,
  side,
  evenness,
}: {
  role: DrumRole
  side: HeadSide
  evenness: TapEvenness | GaugeEvenness
}): WarbleForecast {
  if (role === 'snare' && side === 'resonant') return { kind: 'snare-side' }
  if (evenness.kind === 'not-enough') return { kind: 'not-enough', read: evenness.read }
  if (evenness.kind === 'not-sure') return { kind: 'not-sure', again: evenness.again }
  const beatsPerS = 'warble' in evenness ? evenness.warble : evenness.film?.warble
  if (beatsPerS === undefined) return { kind: 'gauge-not-calibrated' }
  return { kind: evenness.phases === 'one' ? 'at-least' : 'forecast', beatsPerS }
}
