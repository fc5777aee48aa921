import { describe, expect, it } from 'vitest'
import { figureLine, openHeadWords, sheetGaugeWords, toleranceWords, warbleLimitWords } from './sheet-words'
import type { SheetFigures } from './tuning-sheet'

const figures: SheetFigures = {
  model: 'two-heads',
  tapRatio: { value: 1.744, low: 1.7, high: 1.79 },
  tapRatioMeasured: false,
  upperPartner: { hz: 300.4, lowHz: 293.6, highHz: 308.2, name: 'D4' },
  sustain: 1,
  falseWarbleHz: 5.86,
}

describe('the words of a sheet', () => {
  it('say a tolerance in cents and Hz, or in cents alone where there is no tap', () => {
    expect(toleranceWords({ toleranceCents: 8 }, { toleranceHz: 1.19 })).toBe('±8 cents, ±1.2 Hz')
    expect(toleranceWords({ toleranceCents: 8 }, { toleranceHz: null })).toBe('±8 cents')
  })

  it('give no warble advice on a snare side', () => {
    const snare = { role: 'snare', warbleLimitHz: 1 } as const
    expect(warbleLimitWords(snare, 'batter')).toBe('under 1 a second')
    expect(warbleLimitWords(snare, 'resonant')).toBe('not judged: snare beds are uneven on purpose')
  })

  it('say what a gauge reading is worth', () => {
    expect(sheetGaugeWords({ kind: 'noted', reading: '75' }).worth).toBe('as noted, relative to that gauge')
    const foretold = { kind: 'foretold', gauge: 'Maren’s dial', reading: '72', bounds: '70–74', outside: null } as const
    expect(sheetGaugeWords(foretold)).toMatchObject({ reading: '72', bounds: '70–74' })
    expect(sheetGaugeWords(foretold).worth).toContain('Maren’s dial')
    expect(sheetGaugeWords({ ...foretold, bounds: null, outside: 'Looser than any.' }).worth).toBe('Looser than any.')
    expect(sheetGaugeWords(null)).toEqual({ reading: '–', bounds: null, worth: 'none noted' })
  })

  it('say why the other head is damped, with this drum’s figure', () => {
    expect(openHeadWords(figures)).toContain('5.9 a second')
    expect(openHeadWords({ ...figures, falseWarbleHz: 40 })).toContain('second pitch')
    expect(openHeadWords({ ...figures, falseWarbleHz: null })).toBeNull()
  })

  it('stand every figure beside its bounds', () => {
    expect(figureLine(figures)).toBe(
      'Tap over note 1.74, 1.70 to 1.79; upper partner 300 Hz, 294 to 308; sustain share 1.00 (1: heads matched; no seconds)',
    )
    expect(figureLine({ ...figures, tapRatioMeasured: true, upperPartner: null, sustain: null })).toBe(
      'Tap over note 1.74, measured',
    )
  })
})
