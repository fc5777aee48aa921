import { describe, expect, it } from 'vitest'
import { drumEstimate } from './drum-estimate'
import { gaugeOfHead, tryCalibration } from './gauge-of-head'
import { startingGauge } from './gauge-prediction'
import { tapOfTensionHz } from './gauge-tension'
import { outsideWords, readingWords, startingBounds, startingWords } from './gauge-words'
import { hundred, sampleGauge, tom12 } from './sample-gauge'

const { calibration } = tryCalibration(sampleGauge)
if (!calibration) throw new Error('the sample gauge has a calibration')
const tap = tapOfTensionHz(tom12, 2100, null)

describe('the gauge beside a head', () => {
  it('is foretold where a calibration and a tap are there, noted or not', () => {
    expect(gaugeOfHead(calibration, tom12, { tapHz: tap, noted: 74 })).toEqual({
      ...{ kind: 'foretold', gauge: 'Brass gauge', scale: hundred },
      start: startingGauge(calibration, tom12, tap),
    })
  })

  it('is as noted without a calibration, without a tap, and where no head sounds the tap', () => {
    const noted = { kind: 'noted', reading: 74 }
    expect(gaugeOfHead(null, tom12, { tapHz: tap, noted: 74 })).toEqual(noted)
    expect(gaugeOfHead(calibration, tom12, { tapHz: null, noted: 74 })).toEqual(noted)
    expect(gaugeOfHead(calibration, tom12, { tapHz: 1999, noted: 74 })).toEqual(noted)
  })

  it('is nothing where nothing is known', () => {
    expect(gaugeOfHead(null, tom12, { tapHz: tap, noted: null })).toBeNull()
    expect(gaugeOfHead(calibration, tom12, { tapHz: null, noted: null })).toBeNull()
  })

  // The same note of a ported kick must not come with two tensions: 1.38 kN/m on its sheet is the head in the open air (`drumTuning`).
  it('takes a ported drum as its sheet does, in the open air', () => {
    const kick = { role: 'kick', diameterIn: 22, depthIn: 16, lugs: 8, ported: true, headRelationCents: 0 } as const
    const film = { plyMils: [10], coatingGPerM2: 0 }
    const made = drumEstimate({ ...kick, batter: film, resonant: film, note: { semitone: 33, cents: 0 } })
    const tapHz = made?.tuning?.batter.tapHz.value ?? Number.NaN
    const gauge = gaugeOfHead(calibration, { ...kick, ...film, openShell: true }, { tapHz, noted: null })
    if (gauge?.kind !== 'foretold') throw new Error('not foretold')
    expect(gauge.start.tensionNPerM / (made?.tuning?.batter.tensionNPerM.value ?? 0)).toBeCloseTo(1, 9)
  })

  it('minds the stage: a warm one has thinner air, and the same tap needs less tension', () => {
    const at = (temperatureC: number) => {
      const gauge = gaugeOfHead(calibration, tom12, { tapHz: tap, noted: null, temperatureC })
      return gauge?.kind === 'foretold' ? gauge.start.reading : Number.NaN
    }
    expect(at(35)).toBeLessThan(at(5))
  })
})

describe('a calibration that cannot be made', () => {
  it('comes with its reason, and what is no gauge fault is thrown on', () => {
    const tried = tryCalibration({ ...sampleGauge, pairs: sampleGauge.pairs.slice(0, 2) })
    expect(tried.calibration).toBeNull()
    expect(tried.refusal?.reason).toBe('too-few')
    const broken = { ...sampleGauge, pairs: null as unknown as typeof sampleGauge.pairs }
    expect(() => tryCalibration(broken)).toThrow(TypeError)
  })
})

describe('a reading in words', () => {
  it.each([
    [72.26, 1, '72.5'],
    [72.2, 1, '72'],
    [-0.1, 1, '0'],
    [7.234, 0.1, '7.25'],
    [7.2, 0.5, '7.25'],
    [148, 5, '147.5'],
  ])('goes to half a division: %d on a dial of %d is %s', (reading, step, words) => {
    expect(readingWords(reading, { min: -10, max: 200, step })).toBe(words)
  })

  it('says which side of the calibrated range it lies, and gives no interval there', () => {
    const within = { reading: 72.1, low: 70.4, high: 73.8, outside: null, tensionNPerM: 2000 }
    expect([startingWords(within, hundred), startingBounds(within, hundred)]).toEqual(['72', '70.5–74'])
    const under = { ...within, outside: 'under' as const }
    expect([startingWords(under, hundred), startingBounds(under, hundred)]).toEqual(['under 72', null])
    expect(outsideWords.over).not.toBe(outsideWords.under)
  })
})
