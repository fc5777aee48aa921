import { MOST_WARBLE_HZ } from '@/lib/acoustics/drum-tuning'
import type { SheetFigures, SheetHead, SheetNote, TuningSheet } from './tuning-sheet'

/** What is in a sheet in words, the same on paper and on the page. */

export const headSideWords = { batter: 'Batter head', resonant: 'Resonant head' } as const

/** "D3", "D3 +12 cents". */
export function sheetNoteWords({ name, cents }: SheetNote): string {
  return cents === 0 ? name : `${name} ${cents > 0 ? '+' : '−'}${Math.abs(cents)} cents`
}

/** Snare beds make this side uneven on purpose: nothing is said of its warble (common practice). */
export function warbles(sheet: Pick<TuningSheet, 'role'>, side: SheetHead['side']): boolean {
  return !(sheet.role === 'snare' && side === 'resonant')
}

/** How far a lug may stand off: "±10 cents, ±1.5 Hz". */
export function toleranceWords(
  sheet: Pick<TuningSheet, 'toleranceCents'>,
  head: Pick<SheetHead, 'toleranceHz'>,
): string {
  const cents = `±${sheet.toleranceCents} cents`
  return head.toleranceHz === null ? cents : `${cents}, ±${head.toleranceHz.toFixed(1)} Hz`
}

/** What warble is let pass on this head. */
export function warbleLimitWords(sheet: Pick<TuningSheet, 'role' | 'warbleLimitHz'>, side: SheetHead['side']): string {
  return warbles(sheet, side) ? `under ${sheet.warbleLimitHz} a second` : 'not judged: snare beds are uneven on purpose'
}

/** The gauge's starting reading and what it is worth. */
export function sheetGaugeWords(gauge: SheetHead['gauge']): { reading: string; bounds: string | null; worth: string } {
  if (gauge === null) return { reading: '–', bounds: null, worth: 'none noted' }
  if (gauge.kind === 'noted') {
    return { reading: gauge.reading, bounds: null, worth: 'as noted, relative to that gauge' }
  }
  const { reading, bounds, outside } = gauge
  return { reading, bounds, worth: outside ?? `on ${gauge.gauge}; others differ` }
}

export const sheetCautionWords: Record<SheetHead['cautions'][number], string> = {
  slack: 'slack at this note: the head may die',
  choked: 'tight at this note: the head may choke',
  'film-stress': 'the film is pulled hard: keep faces clear and ease down if it creaks',
}

/** Why the other head is damped, with this drum's figure; null for one head. */
export function openHeadWords({ falseWarbleHz }: SheetFigures): string | null {
  if (falseWarbleHz === null) return null
  return falseWarbleHz > MOST_WARBLE_HZ
    ? 'Left to ring, the other head puts a second pitch into every tap.'
    : `Left to ring, the other head feigns a warble of ${falseWarbleHz.toFixed(1)} a second on even heads.`
}

/** Tap over note, partner and sustain in a line. */
export function figureLine({ tapRatio, tapRatioMeasured, upperPartner, sustain }: SheetFigures): string {
  const ratio = (value: number) => value.toFixed(2)
  return [
    `Tap over note ${ratio(tapRatio.value)}, ${tapRatioMeasured ? 'measured' : `${ratio(tapRatio.low)} to ${ratio(tapRatio.high)}`}`,
    ...(upperPartner
      ? [
          `upper partner ${upperPartner.hz.toFixed(0)} Hz, ${upperPartner.lowHz.toFixed(0)} to ${upperPartner.highHz.toFixed(0)}`,
        ]
      : []),
    ...(sustain === null ? [] : [`sustain share ${sustain.toFixed(2)} (1: heads matched; no seconds)`]),
  ].join('; ')
}
