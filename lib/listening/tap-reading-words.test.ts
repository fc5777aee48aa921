import { describe, expect, test } from 'vitest'
import { tapDoubt, tapHertz, tapHertzError, tapNote, tapReadingWords, tapRemarks } from './tap-reading-words'
import type { TapReading } from './tap-report'

const reading: TapReading = {
  outcome: 'heard',
  pitchHz: 146.83,
  standardErrorHz: 0.02,
  note: { semitone: 50, cents: -3.4 },
  centsFromTarget: null,
  confidence: 0.95,
  t60S: 0.8,
  t60StandardErrorS: 0.01,
  partials: [],
  warble: null,
  glide: null,
  snrDb: 30,
  onsetS: 0,
  heardForS: 1,
}

describe('a reading in words', () => {
  test('hertz to the tenth, whole when it is known no better', () => {
    expect([tapHertz(reading), tapHertzError(reading)]).toEqual(['146.8', '± 0.1'])
    expect([
      tapHertz({ ...reading, standardErrorHz: 0.2 }),
      tapHertzError({ ...reading, standardErrorHz: 0.2 }),
    ]).toEqual(['146.8', '± 0.4'])
    expect([
      tapHertz({ ...reading, standardErrorHz: 0.8 }),
      tapHertzError({ ...reading, standardErrorHz: 0.8 }),
    ]).toEqual(['147', '± 2'])
  })

  test('note in the reader’s language', () => {
    expect(tapNote(reading)).toBe('D3 −3 cents')
    expect(tapNote({ ...reading, note: { semitone: 59, cents: 4 } }, 'de')).toBe('H3 +4 cents')
  })

  test('warble and glide are told, a slight glide is not', () => {
    expect(
      tapRemarks({ ...reading, warble: { differenceHz: 3.04, lowHz: 2.9, highHz: 3.2, from: 'partials' } }),
    ).toEqual(['Warbles 3.0 times a second (2.9 to 3.2).'])
    expect(tapRemarks({ ...reading, glide: { cents: 41.2, settledHz: 144.1 } })).toEqual([
      'The pitch fell by 41 cents to 144.1 Hz. Tap softer.',
    ])
    expect(tapRemarks({ ...reading, glide: { cents: 4, settledHz: 146.5 } })).toEqual([])
  })

  test('a doubtful reading asks for another tap', () => {
    expect(tapDoubt(reading)).toBeNull()
    expect(tapReadingWords({ ...reading, confidence: 0.4 })).toBe(
      '146.8 hertz, D3 −3 cents. Not quite sure: tap again to be.',
    )
  })
})
