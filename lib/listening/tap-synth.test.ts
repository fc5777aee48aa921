import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { makeTap } from './tap-synth'
import type { TapToMake } from './tap-synth'
import type { HeadMode, Strike } from './tap-partials'

const mode = (m: number, n: number, hz: number, more: Partial<HeadMode> = {}): HeadMode => ({
  m,
  n,
  hz,
  decayT60S: 0.9,
  splitHz: 0,
  axisRad: 0,
  share: 1,
  ...more,
})
const strikeAt = (angleRad: number, radiusShare = 0.83): Strike => ({
  stick: { radiusShare, angleRad },
  microphone: { radiusShare, angleRad, heightM: 0.08 },
  contactS: 0.0015,
})
const plain = (more: Partial<TapToMake> = {}): TapToMake => ({
  head: { radiusM: 0.1524, modes: [mode(1, 1, 220), mode(2, 1, 312), mode(3, 1, 405, { decayT60S: 0.6 })] },
  strike: strikeAt(0),
  seed: 7,
  ...more,
})

/** Complex Fourier sum of samples from `from` on, Hann-windowed: written here, no code of the synthesiser's. */
function heightAt(samples: ArrayLike<number>, sampleRateHz: number, from: number, count: number, hz: number): number {
  let [re, im, weight] = [0, 0, 0]
  for (let i = 0; i < count; i++) {
    const window = 0.5 - 0.5 * Math.cos((2 * Math.PI * i) / count)
    const angle = (2 * Math.PI * hz * i) / sampleRateHz
    re += window * (samples[from + i] ?? 0) * Math.cos(angle)
    im += window * (samples[from + i] ?? 0) * Math.sin(angle)
    weight += window
  }
  return (2 * Math.hypot(re, im)) / weight
}

function peakHz(
  samples: ArrayLike<number>,
  sampleRateHz: number,
  from: number,
  count: number,
  near: number,
  reach: number,
): number {
  let [best, most] = [near, 0]
  for (let step = reach / 10, centre = near; step > 0.02; step /= 5) {
    for (let hz = centre - 10 * step; hz <= centre + 10 * step; hz += step) {
      const here = heightAt(samples, sampleRateHz, from, count, hz)
      if (here > most) [best, most] = [hz, here]
    }
    centre = best
  }
  return best
}

const meanSquare = (samples: ArrayLike<number>, from: number, to: number) => {
  let sum = 0
  for (let i = from; i < to; i++) sum += (samples[i] ?? 0) ** 2
  return sum / (to - from)
}

describe('makeTap', () => {
  it('puts a peak at every shape, by an independent Fourier sum, within 0.2 Hz', () => {
    const { samples, sampleRateHz, strikeAt: at } = makeTap(plain())
    for (const hz of [220, 312, 405]) {
      expect(Math.abs(peakHz(samples, sampleRateHz, at + 100, 22_050, hz, 8) - hz)).toBeLessThan(0.2)
    }
  })

  it('falls by 60 dB in the decay asked for', () => {
    // Derived: two Fourier sums 0.3 s apart fall by 60·0.3/T60 dB.
    const {
      samples,
      sampleRateHz,
      strikeAt: at,
    } = makeTap(plain({ head: { radiusM: 0.15, modes: [mode(1, 1, 200)] } }))
    const shift = Math.round(0.3 * sampleRateHz)
    const [first, later] = [0, shift].map((late) => heightAt(samples, sampleRateHz, at + 441 + late, 8820, 200)) as [
      number,
      number,
    ]
    expect(20 * Math.log10(first / later)).toBeCloseTo((60 * 0.3) / 0.9, 2)
  })

  it('has the amplitudes it says once the stick has left', () => {
    const { samples, sampleRateHz, strikeAt: at, partials } = makeTap(plain())
    const from = at + Math.ceil(0.0015 * sampleRateHz)
    for (let i = from; i < from + 2000; i += 37) {
      const t = (i - at) / sampleRateHz
      const sum = partials.reduce(
        (total, { hz, decayT60S, amplitude, phaseRad }) =>
          total + amplitude * 10 ** ((-3 * t) / decayT60S) * Math.sin(2 * Math.PI * hz * t + phaseRad),
        0,
      )
      expect(samples[i]).toBeCloseTo(sum, 6)
    }
  })

  it.each([
    ['white', 0],
    ['white', 20],
    ['pink', 10],
    ['pink', 40],
  ] as const)('adds %s noise at %i dB as measured against the same tap without it', (colour, snrDb) => {
    const clean = makeTap(plain())
    const noisy = makeTap(plain({ noise: { colour, snrDb } }))
    const noise = noisy.samples.map((value, i) => value - (clean.samples[i] ?? 0))
    const signal = meanSquare(clean.samples, clean.strikeAt, clean.strikeAt + 4410)
    expect(10 * Math.log10(signal / meanSquare(noise, 0, noise.length))).toBeCloseTo(snrDb, 2)
    expect(Math.sqrt(meanSquare(noise, 0, noise.length))).toBeCloseTo(noisy.noiseRms, 5)
  })

  it('makes pink noise fall 3 dB an octave and white noise not at all', () => {
    // Sixty sums an octave: a chance spread of 0.8 dB. Derived: white has the same mean square of Fourier sums in every band, pink halves it an octave up.
    const silentTap = plain({ peak: 1e-6, lengthS: 3 })
    const bandPower = (colour: 'white' | 'pink', low: number) => {
      const { samples, sampleRateHz } = makeTap({ ...silentTap, noise: { colour, snrDb: -40 } })
      let sum = 0
      for (let i = 0; i < 60; i++) sum += heightAt(samples, sampleRateHz, 0, 44_100, low * (1 + i / 60)) ** 2
      return sum
    }
    const dbUp = (colour: 'white' | 'pink') => 10 * Math.log10(bandPower(colour, 800) / bandPower(colour, 200))
    expect(Math.abs(dbUp('white'))).toBeLessThan(2)
    expect(Math.abs(dbUp('pink') + 6.02)).toBeLessThan(2)
  })

  it('hums at the mains and its harmonics at the level asked for', () => {
    const clean = makeTap(plain())
    const humming = makeTap(plain({ hum: { mainsHz: 50, snrDb: 6 } }))
    const hum = humming.samples.map((value, i) => value - (clean.samples[i] ?? 0))
    const signal = meanSquare(clean.samples, clean.strikeAt, clean.strikeAt + 4410)
    expect(10 * Math.log10(signal / meanSquare(hum, 0, 44_100))).toBeCloseTo(6, 1)
    expect(heightAt(hum, 44_100, 0, 44_100, 50)).toBeGreaterThan(20 * heightAt(hum, 44_100, 0, 44_100, 75))
  })

  it('hears the higher of a pair on its axis, the lower across it, both between', () => {
    const head = { radiusM: 0.15, modes: [mode(1, 1, 250, { splitHz: 6, axisRad: 0.4 })] }
    const on = (angle: number) => makeTap(plain({ head, strike: strikeAt(angle) })).partials
    expect(
      on(0.4)
        .filter(({ amplitude }) => amplitude > 1e-9)
        .map(({ hz }) => hz),
    ).toEqual([253])
    expect(
      on(0.4 + Math.PI / 2)
        .filter(({ amplitude }) => amplitude > 1e-9)
        .map(({ hz }) => hz),
    ).toEqual([247])
    const [high, low] = on(0.4 + Math.PI / 4)
    expect(high?.amplitude).toBeCloseTo(low?.amplitude ?? 0, 2)
  })

  it('sets off at p̄ + (Δ/2)·cos 2θ when stick and microphone share a lug (derived: cos² and sin² weights)', () => {
    const head = { radiusM: 0.15, modes: [mode(1, 1, 250, { splitHz: 4, axisRad: 0.3 })] }
    fc.assert(
      fc.property(fc.double({ min: -3, max: 3, noNaN: true }), (angle) => {
        const { partials } = makeTap(plain({ head, strike: { ...strikeAt(angle), contactS: 0 }, lengthS: 0.05 }))
        const weight = partials.reduce((sum, { amplitude }) => sum + amplitude, 0)
        const mean = partials.reduce((sum, { amplitude, hz }) => sum + amplitude * hz, 0) / weight
        expect(mean).toBeCloseTo(250 + 2 * Math.cos(2 * (angle - 0.3)), 6)
      }),
      { numRuns: 50 },
    )
  })

  it('glides down by the cents asked for, and no further than the shape', () => {
    const head = { radiusM: 0.15, modes: [mode(1, 1, 200, { decayT60S: 1.2 })] }
    const { samples, sampleRateHz, strikeAt: at } = makeTap(plain({ head, glideCents: 60 }))
    // Derived: sharp by 60·e^(−6·ln10·t/T60) cents, so 47.5 cents in the middle of the first 40 ms and under 0.2 after half a second.
    const cents = (from: number, count: number) =>
      1200 * Math.log2(peakHz(samples, sampleRateHz, at + from, count, 203, 10) / 200)
    expect(Math.abs(cents(66, 1764) - 47.5)).toBeLessThan(3)
    expect(Math.abs(cents(22_050, 13_230))).toBeLessThan(0.5)
  })

  it('has no (0,1) nor (0,2) where the shape stands still, none at all on the centre for m > 0', () => {
    const centre = strikeAt(0, 0)
    expect(() => makeTap(plain({ strike: centre }))).toThrow(RangeError)
    const head = { radiusM: 0.15, modes: [mode(0, 1, 120), mode(1, 1, 220)] }
    expect(makeTap(plain({ head, strike: centre })).partials.map(({ m }) => m)).toEqual([0])
    // Published: the circle of (0,2) lies at j01/j02 = 2.404826/5.520078 of the radius (Abramowitz & Stegun 9.5).
    const onCircle = strikeAt(0, 2.404825557696 / 5.520078110286)
    const made = makeTap(
      plain({ head: { radiusM: 0.15, modes: [mode(0, 1, 120), mode(0, 2, 275)] }, strike: onCircle }),
    )
    const [note, second] = made.partials
    expect((second?.amplitude ?? 0) / (note?.amplitude ?? 1)).toBeLessThan(1e-12)
  })

  it('dulls the higher partials more the longer the stick stays', () => {
    const brightness = (contactS: number) => {
      const { partials } = makeTap(plain({ strike: { ...strikeAt(0), contactS } }))
      return (partials.find(({ m }) => m === 3)?.amplitude ?? 0) / (partials.find(({ m }) => m === 1)?.amplitude ?? 1)
    }
    expect(brightness(0.001)).toBeGreaterThan(brightness(0.003))
    // Derived: |sin(πfτ)/(πfτ(1 − (fτ)²))| for an undamped partial, here at 405 and 220 Hz for 2 ms.
    const shape = (fT: number) => Math.abs(Math.sin(Math.PI * fT) / (Math.PI * fT * (1 - fT ** 2)))
    expect(brightness(0.002) / brightness(0)).toBeCloseTo(shape(0.81) / shape(0.44), 2)
  })

  it('adds a room whose tail falls at its own rate after the drum has died', () => {
    const dead = plain({ head: { radiusM: 0.15, modes: [mode(1, 1, 220, { decayT60S: 0.1 })] }, lengthS: 1.5 })
    const {
      samples,
      sampleRateHz,
      strikeAt: at,
    } = makeTap({ ...dead, clickDb: 0, room: { reverbT60S: 0.8, share: 0.5 } })
    const level = (from: number) =>
      10 *
      Math.log10(
        meanSquare(samples, at + Math.round(from * sampleRateHz), at + Math.round((from + 0.25) * sampleRateHz)),
      )
    expect(Math.abs(level(0.3) - level(0.8) - (60 * 0.5) / 0.8)).toBeLessThan(3)
    expect(meanSquare(makeTap(dead).samples, at + 22_050, at + 33_075)).toBeLessThan(1e-12)
  })

  it('peaks where asked, begins at the strike and repeats by its seed', () => {
    const tap = plain({
      peak: 0.8,
      leadS: 0.1,
      clickDb: -6,
      room: { reverbT60S: 0.4, share: 0.2 },
      sampleRateHz: 48_000,
    })
    const made = makeTap(tap)
    expect(made.strikeAt).toBe(4800)
    expect(made.samples.subarray(0, 4800).every((value) => value === 0)).toBe(true)
    expect(made.samples.reduce((most, value) => Math.max(most, Math.abs(value)), 0)).toBeCloseTo(0.8, 6)
    expect(makeTap(tap).samples).toEqual(made.samples)
    expect(makeTap({ ...tap, seed: 8 }).samples).not.toEqual(made.samples)
  })

  it.each<[string, Partial<TapToMake>]>([
    ['peak', { peak: 1.5 }],
    ['glideCents', { glideCents: Number.NaN }],
    ['seed', { seed: 0.5 }],
    ['lengthS', { lengthS: Number.POSITIVE_INFINITY }],
    ['radiusShare', { strike: strikeAt(0, 1.2) }],
    ['angleRad', { strike: strikeAt(Number.NaN) }],
    ['contactS', { strike: { ...strikeAt(0), contactS: 1 } }],
    ['snrDb', { noise: { colour: 'white', snrDb: Number.NaN } }],
    ['share', { room: { reverbT60S: 1, share: -1 } }],
    ['reverbT60S', { room: { reverbT60S: 0, share: 0.1 } }],
    ['nothing sounds', { head: { radiusM: 0.15, modes: [] } }],
  ])('refuses a wrong %s by name', (field, wrong) => {
    expect(() => makeTap(plain(wrong))).toThrow(new RegExp(field))
  })
})
