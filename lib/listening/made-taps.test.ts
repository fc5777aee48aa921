import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { goodTap } from '@/tests/bench/listening/good-tap'
import type { GoodTapAsked } from '@/tests/bench/listening/good-tap'
import { pitchOf } from '@/tests/bench/listening/cramer-rao'
import { NON_TAP_RATE_HZ, nonTaps } from '@/tests/bench/listening/non-taps'
import { analyseTap } from './analyse-tap'
import { tapRandom } from './tap-random'
import type { TapReading } from './tap-report'

/**
 * Made at a pitch, a split and a decay, heard back within the errors that the reading states of itself. Seeds are fixed: an error of
 * five standard deviations comes once in two million, but not never.
 */
const RUNS = { seed: 20_261_201, numRuns: 50, endOnFailure: true }
const rest = fc.record({
  seed: fc.nat(),
  decayT60S: fc.double({ min: 0.45, max: 1.6, noNaN: true }),
  offCents: fc.integer({ min: -200, max: 200 }),
})

function hear(
  seed: number,
  asked: GoodTapAsked,
  offCents: number,
): { report: TapReading; truth: ReturnType<typeof goodTap>; pitchHz: number } {
  const truth = goodTap(tapRandom(seed), asked)
  const pitchHz = pitchOf(truth.tap)
  const report = analyseTap(truth.samples, truth.sampleRateHz, { expectHz: pitchHz * 2 ** (offCents / 1200) })
  if (report.outcome === 'refused') throw new Error(`A good tap was refused: ${report.kind}.`)
  return { report, truth, pitchHz }
}

describe('made taps, heard back', () => {
  it('give an even head its pitch and decay within five of the stated errors, and no warble', () => {
    fc.assert(
      fc.property(rest, ({ seed, decayT60S, offCents }) => {
        const { report, pitchHz } = hear(
          seed,
          { decayT60S, splitHz: 0, noise: { colour: 'white', snrDb: 28 } },
          offCents,
        )
        expect(Math.abs(report.pitchHz - pitchHz)).toBeLessThan(5 * report.standardErrorHz)
        expect(report.standardErrorHz).toBeLessThan(0.1)
        expect(Math.abs(report.t60S - decayT60S)).toBeLessThan(5 * report.t60StandardErrorS)
        expect(report.t60StandardErrorS).toBeLessThan(0.05 * decayT60S)
        expect(report.warble).toBeNull()
      }),
      RUNS,
    )
  })

  it('give a split head its pitch and its warble within what is stated', () => {
    const split = fc.record({
      rest,
      splitHz: fc.double({ min: 2, max: 10, noNaN: true }),
      offAxis: fc.double({ min: 0.4, max: 1.1, noNaN: true }),
    })
    fc.assert(
      fc.property(split, ({ rest: { seed, decayT60S, offCents }, splitHz, offAxis }) => {
        const asked = {
          decayT60S: Math.max(0.6, decayT60S),
          splitHz,
          offAxisRad: offAxis,
          noise: { colour: 'white', snrDb: 28 } as const,
        }
        const { report, pitchHz } = hear(seed, asked, offCents)
        expect(Math.abs(report.pitchHz - pitchHz)).toBeLessThan(5 * report.standardErrorHz)
        const { warble } = report
        if (warble === null) throw new Error(`A warble of ${splitHz} Hz was not heard.`)
        // The interval is of 1.96 standard deviations: five are asked for here.
        const halfWidth = (warble.highHz - warble.lowHz) / 2
        expect(Math.abs(warble.differenceHz - splitHz)).toBeLessThan((5 / 1.96) * halfWidth)
        expect(halfWidth).toBeLessThan(0.25 * splitHz)
      }),
      RUNS,
    )
  })

  it('stay within 6 cents in a room with hum, pink noise, a click and a slight glide', () => {
    const random = tapRandom(11)
    const cents = Array.from({ length: 24 }, (_, seed) => {
      const { report, pitchHz } = hear(
        seed,
        {
          decayT60S: 0.5 + random.uniform(),
          splitHz: 0,
          noise: { colour: 'pink', snrDb: 25 },
          hum: { mainsHz: 50, snrDb: 35 },
          room: { reverbT60S: 0.5, share: 0.08 },
          clickDb: -12,
          glideCents: 3,
        },
        0,
      )
      return Math.abs(1200 * Math.log2(report.pitchHz / pitchHz))
    })
    // The glide is 3 cents; a reflection 20 dB down shifts a pitch by up to as much again while it rings.
    expect(Math.max(...cents)).toBeLessThan(6)
  })

  it('are refused when they are no taps: one in forty at most is let through', () => {
    const some = nonTaps(77).filter((_, index) => index % 5 === 0)
    const heard = some.filter(({ samples }) => analyseTap(samples, NON_TAP_RATE_HZ).outcome === 'heard')
    expect(some).toHaveLength(40)
    expect(heard.length).toBeLessThanOrEqual(1)
  })
})
