import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, test } from 'vitest'
import type { TapReading } from '@/lib/listening/tap-report'
import { HeardPitch } from './heard-pitch'
import { LevelBar } from './level-bar'
import { TapEar } from './tap-ear'

const reading: TapReading = {
  outcome: 'heard',
  pitchHz: 255.32,
  standardErrorHz: 0.04,
  note: { semitone: 60, cents: -41.6 },
  centsFromTarget: -12.3,
  confidence: 0.4,
  t60S: 0.62,
  t60StandardErrorS: 0.01,
  partials: [],
  warble: { differenceHz: 2, lowHz: 1.8, highHz: 2.2, from: 'partials' },
  glide: null,
  snrDb: 30,
  onsetS: 0,
  heardForS: 1,
}

describe('the ear', () => {
  test('at rest: one button that says what it does, what is listened for, and a region that will be read out', () => {
    const page = renderToStaticMarkup(<TapEar what="the tap near lug 3" />)
    expect(page).toMatch(/<section aria-label="Listening for the tap near lug 3"/)
    expect(page).toMatch(/<button[^>]*>Listen for a tap<\/button>/)
    expect(page).toMatch(/aria-live="polite"/)
    expect(page).not.toMatch(/role="meter"/)
  })

  test('a heard tap: hertz biggest, how sure, note, side of the target, ring, warble and doubt', () => {
    const page = renderToStaticMarkup(<HeardPitch reading={reading} locale="en" />)
    expect(page).toMatch(/<strong class="text-5xl[^"]*">255\.3<\/strong> Hz/)
    for (const said of [
      '± 0.1',
      'C4 −42 cents',
      '12 cents under the target',
      'rings 0.62 s',
      'Warbles 2.0 times a second',
      'tap again',
    ]) {
      expect(page).toContain(said)
    }
  })

  test('the level says in a word that it is too loud', () => {
    expect(renderToStaticMarkup(<LevelBar peak={0.1} />)).toContain('aria-valuetext="−20 dB of full scale"')
    expect(renderToStaticMarkup(<LevelBar peak={0.99} />)).toContain('too loud')
    expect(renderToStaticMarkup(<LevelBar peak={0} />)).toContain('aria-valuenow="-60"')
  })
})
