import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { calibrateGauge } from './gauge-calibration'
import { GaugeError } from './gauge-error'
import { sameReadingOnFilms, startingGauge, tapOfReading } from './gauge-prediction'
import { tapOfTensionHz, tensionOfTapNPerM } from './gauge-tension'
import { floorTom16, sampleGauge, sampleHead, tom12 } from './sample-gauge'

const calibration = calibrateGauge(sampleGauge)
const { lowNPerM, highNPerM } = calibration.range
const within = fc.double({ min: 0, max: 1, noNaN: true }).map((share) => lowNPerM * (highNPerM / lowNPerM) ** share)
const heads = fc.constantFrom(tom12, floorTom16, sampleHead(10, 7, [7, 7]), sampleHead(18, 16, [10], 45))

describe('the starting gauge', () => {
  it('is about 75 for a medium-high 12 in tom (common practice)', () => {
    // A 12 in, 10 mil tom sounds 165 Hz, E3, when medium high; its tap lies near 1.744 times that (derived: 12×8 in shell).
    const { reading, low, high, outside } = startingGauge(calibration, tom12, 1.744 * 164.8)
    expect(outside).toBeNull()
    expect(reading).toBeGreaterThan(73)
    expect(reading).toBeLessThan(77)
    expect(low).toBeLessThan(reading)
    expect(high).toBeGreaterThan(reading)
  })

  it('of a head within ±1 of the middle is even by the trade’s count: under half a semitone of tap (common practice)', () => {
    const tap = (reading: number) => tapOfReading(calibration, tom12, reading).tapHz
    const cents = 1200 * Math.log2(tap(76) / tap(75))
    expect(cents).toBeGreaterThan(15)
    expect(cents).toBeLessThan(60)
  })

  it('rises with the tap, and the way back gives the tap again', () => {
    fc.assert(
      fc.property(within, within, heads, (one, other, head) => {
        const [looser, tighter] = [Math.min(one, other), Math.max(one, other)]
        const tap = tapOfTensionHz(head, looser, null)
        const start = startingGauge(calibration, head, tap)
        expect(start.outside).toBeNull()
        expect(tapOfReading(calibration, head, start.reading).tapHz / tap).toBeCloseTo(1, 9)
        if (tighter > looser * 1.0001) {
          const more = startingGauge(calibration, head, tapOfTensionHz(head, tighter, null))
          expect(more.reading).toBeGreaterThan(start.reading)
          expect(more.low).toBeGreaterThan(start.low)
          expect(more.high).toBeGreaterThan(start.high)
        }
      }),
      { numRuns: 300 },
    )
  })

  it('asks the same of every head at one tension, however it is made', () => {
    fc.assert(
      fc.property(within, heads, heads, (tension, one, other) => {
        const on = (head: typeof one) => startingGauge(calibration, head, tapOfTensionHz(head, tension, null)).reading
        expect(on(one)).toBeCloseTo(on(other), 9)
      }),
      { numRuns: 100 },
    )
  })

  it('says on which side a head lies outside, and gives the end’s figure, no further', () => {
    const at = (tension: number) => startingGauge(calibration, tom12, tapOfTensionHz(tom12, tension, null))
    expect(at(lowNPerM * 0.99)).toMatchObject({ outside: 'under', reading: at(lowNPerM).reading })
    expect(at(lowNPerM * 0.5).reading).toBe(at(lowNPerM).reading)
    expect(at(highNPerM * 1.01)).toMatchObject({ outside: 'over', reading: at(highNPerM).reading })
    expect(at(highNPerM)).toMatchObject({ outside: null })
    expect(tapOfReading(calibration, tom12, 20)).toMatchObject({ outside: 'under' })
    expect(tapOfReading(calibration, tom12, 99)).toMatchObject({ outside: 'over' })
  })

  it('stays on the dial', () => {
    fc.assert(
      fc.property(fc.double({ min: 150, max: 9000, noNaN: true }), (tension) => {
        const start = startingGauge(calibration, tom12, tapOfTensionHz(tom12, tension, null))
        for (const figure of [start.low, start.reading, start.high]) {
          expect(figure).toBeGreaterThanOrEqual(0)
          expect(figure).toBeLessThanOrEqual(100)
        }
      }),
      { numRuns: 100 },
    )
  })

  it.each([[Number.NaN], [0], [-100], [Number.POSITIVE_INFINITY], [10], [1999]])('refuses a tap of %d Hz', (tapHz) => {
    expect(() => startingGauge(calibration, tom12, tapHz)).toThrow(GaugeError)
  })
})

describe('the tap at a reading', () => {
  it('bounds it by the tensions at which that reading is still likely', () => {
    const tap = tapOfReading(calibration, tom12, 70)
    expect(tap.lowHz).toBeLessThan(tap.tapHz)
    expect(tap.highHz).toBeGreaterThan(tap.tapHz)
    expect(startingGauge(calibration, tom12, tap.lowHz).high).toBeCloseTo(70, 9)
    expect(startingGauge(calibration, tom12, tap.highHz).low).toBeCloseTo(70, 9)
  })

  it.each([[Number.NaN], [-1], [101]])('refuses a reading of %d', (reading) => {
    expect(() => tapOfReading(calibration, tom12, reading)).toThrow(GaugeError)
  })
})

describe('two plies against one at the same reading', () => {
  const onePly = { plyMils: [10], coatingGPerM2: 0 }
  const twoPly = { plyMils: [7, 7], coatingGPerM2: 0 }

  it('sound lower (common practice), by the square root of film and air together (derived)', () => {
    const [one, two] = sameReadingOnFilms(calibration, tom12, [onePly, twoPly], 75)
    expect(one?.cents).toBe(0)
    expect(two?.tensionNPerM).toBe(one?.tensionNPerM)
    expect(two?.tapHz).toBeLessThan(one?.tapHz ?? Number.NaN)
    // Bare films alone would differ by 600·log2(0.49428/0.35306) = 291 cents; the air, the same on both, takes off a part.
    expect(two?.cents).toBeLessThan(-150)
    expect(two?.cents).toBeGreaterThan(-291)
  })

  it('sound lower on every drum and at every reading', () => {
    fc.assert(
      fc.property(heads, fc.double({ min: 0, max: 100, noNaN: true }), (drum, reading) => {
        const [one, two] = sameReadingOnFilms(calibration, drum, [onePly, twoPly], reading)
        expect(two?.tapHz).toBeLessThan(one?.tapHz ?? Number.NaN)
      }),
      { numRuns: 100 },
    )
  })
})

describe('the tension of a tap', () => {
  it('is that of shape (1,1) on the shell: 12×8 in, 10 mil, 255.32 Hz at 2000 N/m; 12×5 in 253.93 (derived)', () => {
    expect(tensionOfTapNPerM(tom12, 255.32, 20)).toBeCloseTo(2000, 0)
    expect(tapOfTensionHz(tom12, 2000, null)).toBeCloseTo(255.32, 2)
    expect(tapOfTensionHz(sampleHead(12, 5, [10]), 2000, 20)).toBeCloseTo(253.93, 2)
  })

  it('comes back as the same tap', () => {
    fc.assert(
      fc.property(within, heads, fc.double({ min: -20, max: 45, noNaN: true }), (tension, head, temperatureC) => {
        const tap = tapOfTensionHz(head, tension, temperatureC)
        expect(tensionOfTapNPerM(head, tap, temperatureC) / tension).toBeCloseTo(1, 12)
      }),
      { numRuns: 200 },
    )
  })
})
