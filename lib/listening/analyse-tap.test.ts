import { readFileSync } from 'node:fs'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { AcousticsError } from '@/lib/acoustics/acoustics-error'
import { analyseTap } from './analyse-tap'
import { readWav } from './read-wav'
import { tapRandom } from './tap-random'
import type { TapReading, TapReport } from './tap-report'

type Ring = { hz: number; t60S: number; amplitude: number; phase?: number }

/** Damped sinusoids from `atS` on, with white noise of a given root mean square. */
function struck(
  rings: Ring[],
  { rateHz = 48_000, atS = 0.05, lengthS = 1.25, noise = 0, seed = 1 } = {},
): Float32Array {
  const random = tapRandom(seed)
  return Float32Array.from({ length: Math.round(lengthS * rateHz) }, (_, i) => {
    const t = i / rateHz - atS
    const rung =
      t < 0
        ? 0
        : rings.reduce(
            (sum, { hz, t60S, amplitude, phase = 0 }) =>
              sum + amplitude * 10 ** ((-3 * t) / t60S) * Math.sin(2 * Math.PI * hz * t + phase),
            0,
          )
    return rung + (noise === 0 ? 0 : noise * random.normal())
  })
}

function heard(report: TapReport): TapReading {
  expect(report).toMatchObject({ outcome: 'heard' })
  return report as TapReading
}

const fixture = (name: string) => readWav(readFileSync(`tests/fixtures/taps/${name}.wav`))
const quiet = { noise: 1e-5 }

describe('derived: a damped sinusoid is known beforehand', () => {
  test.each([
    [60, 0.4],
    [97.3, 1.9],
    [150, 0.5],
    [211.7, 0.12],
    [348.5, 0.9],
    [600, 0.25],
  ])('%f Hz that falls by 60 dB in %f s', (hz, t60S) => {
    for (const rateHz of [44_100, 48_000]) {
      const reading = heard(analyseTap(struck([{ hz, t60S, amplitude: 0.3 }], { rateHz, ...quiet }), rateHz))
      expect(Math.abs(reading.pitchHz - hz)).toBeLessThan(0.02)
      expect(Math.abs(reading.t60S / t60S - 1)).toBeLessThan(0.005)
      expect(reading.warble).toBeNull()
      expect(Math.abs(reading.onsetS - 0.05)).toBeLessThan(0.004)
    }
  })

  test('amplitude is that at the strike, and the signal-to-noise ratio follows from it', () => {
    const reading = heard(analyseTap(struck([{ hz: 180, t60S: 0.6, amplitude: 0.2 }], { noise: 0.002 }), 48_000))
    // The strike is placed to 3 ms, in which this ring falls by 3 %.
    expect(reading.partials[0]?.amplitude).toBeCloseTo(0.2, 1)
    expect(reading.snrDb).toBeCloseTo(10 * Math.log10(0.2 ** 2 / 2 / 0.002 ** 2), 0)
  })

  test('note and cents: 149 Hz is D3 and 25.4 cents (1200·log2(149/146.832))', () => {
    const reading = heard(
      analyseTap(struck([{ hz: 149, t60S: 0.6, amplitude: 0.2 }], quiet), 48_000, { expectHz: 146.8324 }),
    )
    expect(reading.note.semitone).toBe(50)
    expect(reading.note.cents).toBeCloseTo(25.38, 0)
    expect(reading.centsFromTarget).toBeCloseTo(25.38, 0)
  })
})

describe('derived: a pair beats by the distance of its partials', () => {
  test.each([
    [1.5, 1.2, 'envelope'],
    [4, 1.2, 'partials'],
    [11, 0.8, 'partials'],
  ])('%f Hz apart, T60 %f s', (apartHz, t60S, from) => {
    const rings = [
      { hz: 180, t60S, amplitude: 0.2 },
      { hz: 180 + apartHz, t60S, amplitude: 0.1 },
    ]
    const { pitchHz, warble, partials } = heard(analyseTap(struck(rings, { noise: 2e-4 }), 48_000))
    expect(warble?.from).toBe(from)
    expect(warble?.differenceHz).toBeCloseTo(apartHz, 1)
    expect(warble?.lowHz).toBeLessThan(apartHz)
    expect(warble?.highHz).toBeGreaterThan(apartHz)
    expect(partials).toHaveLength(2)
    // The mean weighted by amplitude: two parts of the lower, one of the higher.
    expect(Math.abs(pitchHz - (180 + apartHz / 3))).toBeLessThan(0.05)
  })

  test('no warble is invented: 30 single partials in noise', () => {
    const warbling = Array.from({ length: 30 }, (_, i) =>
      heard(analyseTap(struck([{ hz: 90 + 9 * i, t60S: 0.5, amplitude: 0.3 }], { noise: 0.005, seed: i + 1 }), 48_000)),
    ).filter(({ warble }) => warble !== null)
    expect(warbling.length).toBeLessThanOrEqual(2)
  })
})

describe('which partial is the pitch', () => {
  const drum = [
    { hz: 110, t60S: 0.3, amplitude: 0.1 },
    { hz: 190, t60S: 0.5, amplitude: 0.3 },
    { hz: 262, t60S: 0.4, amplitude: 0.15 },
  ]

  test('the strongest', () => {
    expect(heard(analyseTap(struck(drum, quiet), 48_000)).pitchHz).toBeCloseTo(190, 1)
  })

  test('the strongest near the target', () => {
    expect(
      heard(analyseTap(struck(drum, quiet), 48_000, { expectHz: 115, expectWithinCents: 200 })).pitchHz,
    ).toBeCloseTo(110, 1)
    expect(
      heard(analyseTap(struck(drum, quiet), 48_000, { expectHz: 255, expectWithinCents: 200 })).pitchHz,
    ).toBeCloseTo(262, 1)
  })

  test('none near the target: no pitch is named', () => {
    expect(analyseTap(struck(drum, quiet), 48_000, { expectHz: 400, expectWithinCents: 200 })).toMatchObject({
      outcome: 'refused',
      kind: 'unclear',
    })
  })
})

describe('a hard hit reads high at first', () => {
  test('derived: a pitch that sets off 30 cents sharp and falls with its energy is told with its glide', () => {
    const [hz, t60S, sharp] = [160, 0.9, 2 ** (30 / 1200) - 1]
    const tau = t60S / Math.log(1000)
    const random = tapRandom(5)
    const samples = Float32Array.from({ length: 60_000 }, (_, i) => {
      const t = i / 48_000 - 0.05
      const noise = 3e-4 * random.normal()
      // ∫ (1 + sharp·e^{−2t/τ}) dt
      const ahead = t + (sharp * tau * (1 - Math.exp((-2 * t) / tau))) / 2
      return noise + (t < 0 ? 0 : 0.3 * Math.exp(-t / tau) * Math.sin(2 * Math.PI * hz * ahead))
    })
    const { glide, warble } = heard(analyseTap(samples, 48_000))
    expect(warble).toBeNull()
    expect(glide?.settledHz).toBeCloseTo(hz, 1)
    expect(glide?.cents).toBeGreaterThan(25)
    expect(glide?.cents).toBeLessThan(35)
  })
})

describe('properties', () => {
  const ring = fc.record({
    hz: fc.double({ min: 70, max: 500, noNaN: true }),
    t60S: fc.double({ min: 0.2, max: 1.5, noNaN: true }),
  })
  // Five standard errors: each reading has its own noise.
  const agree = (a: TapReading, b: TapReading) =>
    expect(Math.abs(a.pitchHz - b.pitchHz)).toBeLessThan(5 * Math.hypot(a.standardErrorHz, b.standardErrorHz) + 1e-4)

  test('louder or softer, earlier or later, at either rate: the same pitch within its error', () => {
    fc.assert(
      fc.property(
        ring,
        fc.double({ min: 0.03, max: 0.9, noNaN: true }),
        fc.double({ min: 0.01, max: 0.2, noNaN: true }),
        fc.nat(1000),
        ({ hz, t60S }, size, atS, seed) => {
          const plain = heard(analyseTap(struck([{ hz, t60S, amplitude: 0.3 }], { noise: 0.003 }), 48_000))
          const scaled = struck([{ hz, t60S, amplitude: size }], { noise: 0.01 * size, seed: seed + 2 })
          agree(plain, heard(analyseTap(scaled, 48_000)))
          agree(
            plain,
            heard(
              analyseTap(
                struck([{ hz, t60S, amplitude: 0.3 }], { noise: 0.003, atS, lengthS: 1.4, seed: seed + 3 }),
                48_000,
              ),
            ),
          )
          agree(
            plain,
            heard(
              analyseTap(
                struck([{ hz, t60S, amplitude: 0.3 }], { noise: 0.003, rateHz: 44_100, seed: seed + 4 }),
                44_100,
              ),
            ),
          )
        },
      ),
      { numRuns: 25, seed: 7 },
    )
  })

  test('the same samples at another scale give the same pitch to the last digits', () => {
    const samples = struck([{ hz: 173, t60S: 0.7, amplitude: 0.2 }], { noise: 0.002 })
    const [a, b] = [samples, samples.map((value) => value / 4)].map((sound) => heard(analyseTap(sound, 48_000)))
    expect(b?.pitchHz).toBeCloseTo(a?.pitchHz ?? 0, 6)
  })
})

describe('recorded strikes (CC0, Debian package sonic-pi-samples)', () => {
  // Derived: peak of the plain Fourier transform of the 0.6 s from 50 ms on, Hann-windowed.
  test.each([
    ['tom-hi', 153.4, 153.4],
    ['tom-mid', 121.9, 122.3],
    ['tom-lo', 92.3, 92.7],
  ])(
    '%s: soft and hard within 0.5 Hz of the plain transform and within 10 cents of each other',
    (name, softHz, hardHz) => {
      const [soft, hard] = ['soft', 'hard'].map((how) => {
        const { samples, sampleRateHz } = fixture(`${name}-${how}`)
        return heard(analyseTap(samples, sampleRateHz)).pitchHz
      })
      expect(Math.abs((soft ?? 0) - softHz)).toBeLessThan(0.5)
      expect(Math.abs((hard ?? 0) - hardHz)).toBeLessThan(0.5)
      expect(Math.abs(1200 * Math.log2((hard ?? 0) / (soft ?? 1)))).toBeLessThan(10)
    },
  )

  test.each(['cymbal-hard', 'cymbal-open', 'cymbal-soft', 'splash-hard', 'splash-soft'])('%s is no tap', (name) => {
    const { samples, sampleRateHz } = fixture(name)
    expect(analyseTap(samples, sampleRateHz)).toMatchObject({ outcome: 'refused', kind: 'not-a-tap' })
  })

  test.each(['bass-hard', 'snare-hard', 'snare-soft'])('%s, clipped or with its wires, is refused', (name) => {
    const { samples, sampleRateHz } = fixture(name)
    expect(analyseTap(samples, sampleRateHz)).toMatchObject({ outcome: 'refused' })
  })

  // Derived: highest peak of the plain Fourier transform of its first half second, 44.9 Hz.
  test('bass-soft, a kick of two heads: its lowest, or nothing', () => {
    const { samples, sampleRateHz } = fixture('bass-soft')
    const report = analyseTap(samples, sampleRateHz)
    if (report.outcome === 'heard') expect(Math.abs(report.pitchHz - 44.9)).toBeLessThan(1)
  })
})

describe('refusals', () => {
  const tap = { hz: 150, t60S: 0.7, amplitude: 0.3 }
  const refused = (samples: Float32Array, rateHz = 48_000) => {
    const report = analyseTap(samples, rateHz)
    return report.outcome === 'refused' ? report.kind : `${report.pitchHz} Hz`
  }

  test('silent: nothing, and next to nothing', () => {
    expect(refused(new Float32Array(48_000))).toBe('silent')
    expect(refused(struck([{ ...tap, amplitude: 1e-4 }]))).toBe('silent')
    expect(refused(new Float32Array(0))).toBe('silent')
  })

  test('clipped: at full scale, and by an amplifier below it', () => {
    const loud = struck([{ ...tap, amplitude: 4 }], quiet)
    expect(refused(loud.map((value) => Math.max(-1, Math.min(1, value))))).toBe('clipped')
    expect(refused(loud.map((value) => 0.6 * Math.max(-1, Math.min(1, value))))).toBe('clipped')
  })

  test('too short', () => {
    expect(refused(struck([tap], { ...quiet, lengthS: 0.09 }))).toBe('too-short')
  })

  test('double hit: 60 to 400 ms apart', () => {
    for (const apartS of [0.06, 0.12, 0.25, 0.4]) {
      const first = struck([tap], quiet)
      const second = struck([tap], { atS: 0.05 + apartS, ...quiet })
      expect(refused(first.map((value, i) => value + 0.8 * (second[i] ?? 0)))).toBe('double-hit')
    }
  })

  test('not a tap: a held tone, hum, hiss, a burst of noise, a voice', () => {
    const random = tapRandom(3)
    expect(refused(struck([{ hz: 220, t60S: 1000, amplitude: 0.3 }], quiet))).toBe('not-a-tap')
    expect(refused(struck([{ hz: 50, t60S: 1e6, amplitude: 0.3 }], { ...quiet, atS: 0 }))).toBe('not-a-tap')
    expect(refused(Float32Array.from({ length: 48_000 }, () => 0.1 * random.normal()))).toBe('not-a-tap')
    const burst = Float32Array.from(
      { length: 48_000 },
      (_, i) => (i < 4800 ? 1e-5 : 0.3 * Math.exp((4800 - i) / 3000)) * random.normal(),
    )
    expect(refused(burst)).toBe('not-a-tap')
    const voice = Array.from({ length: 7 }, (_, k) => ({ hz: 130 * (k + 1), t60S: 1.2, amplitude: 0.2 / (k + 1) }))
    expect(refused(struck(voice, quiet))).toBe('not-a-tap')
  })

  test('too noisy or no strike to be found, never a wrong pitch, when noise is as strong as the tap', () => {
    for (let seed = 1; seed <= 20; seed++) {
      const report = analyseTap(struck([{ hz: 150, t60S: 0.12, amplitude: 0.1 }], { noise: 0.1, seed }), 48_000)
      if (report.outcome === 'heard') expect(Math.abs(1200 * Math.log2(report.pitchHz / 150))).toBeLessThan(60)
    }
  })

  test('unclear: two pitches of one strength', () => {
    const two = [tap, { hz: 230, t60S: 0.7, amplitude: 0.3 }]
    expect(refused(struck(two, quiet))).toBe('unclear')
    // The louder one above at 6 dB could be the next shape of the head, the one below it the tap.
    const shapes = [tap, { hz: 201, t60S: 0.7, amplitude: 0.6 }]
    expect(refused(struck(shapes, quiet))).toBe('unclear')
    const told = heard(analyseTap(struck(shapes, quiet), 48_000, { expectHz: 160 }))
    expect(told.pitchHz).toBeCloseTo(150, 1)
  })

  test('what cannot be judged is an error that names its field', () => {
    const clip = struck([tap], quiet)
    const field = (call: () => unknown) => {
      try {
        call()
      } catch (error) {
        if (error instanceof AcousticsError) return error.field
      }
      return 'no error'
    }
    for (const rate of [8000, 22_050, 96_000, 0, Number.NaN])
      expect(field(() => analyseTap(clip, rate))).toBe('sampleRateHz')
    for (const bad of [Number.NaN, Infinity]) {
      const broken = Float32Array.from(clip)
      broken[777] = bad
      expect(field(() => analyseTap(broken, 48_000))).toBe('samples')
    }
    for (const expectHz of [0, -5, Number.NaN, 12_000])
      expect(field(() => analyseTap(clip, 48_000, { expectHz }))).toBe('expectHz')
    expect(field(() => analyseTap(clip, 48_000, { referenceHz: 300 }))).toBe('referenceHz')
    expect(field(() => analyseTap(clip, 48_000, { expectWithinCents: 0 }))).toBe('expectWithinCents')
  })
})
