import { mainsHum, tapNoise } from './tap-noise'
import type { NoiseColour } from './tap-noise'
import { tapPartials } from './tap-partials'
import type { Strike, StruckHead, TapPartial } from './tap-partials'
import { tapRandom } from './tap-random'
import type { TapRandom } from './tap-random'
import { addRoom } from './tap-room'
import type { TapRoom } from './tap-room'
import { within } from './tap-within'

/** One tap to make. Only the head, the strike and the seed must be said. */
export type TapToMake = {
  head: StruckHead
  strike: Strike
  /** Whole number; the same seed makes the same samples. */
  seed: number
  sampleRateHz?: 44_100 | 48_000
  /** Before the strike, s (0.05). */
  leadS?: number
  /** From the strike on, s (1). */
  lengthS?: number
  /** Loudest sample of the drum and its room before noise and hum, 0 to 1 (0.5). */
  peak?: number
  /** How much sharper the tap starts than it ends, cents (0). Soft taps 5 to 20, hard hits over 100 (from memory). */
  glideCents?: number
  /** Level of the stick's own click, dB beside the drum's loudest (none). */
  clickDb?: number
  room?: TapRoom
  /** `snrDb`: mean square of drum and room in the first 0.1 s from the strike over the noise's mean square, all frequencies. */
  noise?: { colour: NoiseColour; snrDb: number }
  /** `snrDb` as for noise; `mainsHz` 50 or 60. */
  hum?: { mainsHz: 50 | 60; snrDb: number }
}

export type MadeTap = {
  samples: Float32Array
  sampleRateHz: number
  /** Index of the strike in `samples`. */
  strikeAt: number
  /** What sounds, amplitudes as in `samples`. */
  partials: TapPartial[]
  /** Root mean square of the noise in `samples`; 0 without noise. */
  noiseRms: number
}

const SNR_WINDOW_S = 0.1
/** A wooden tip's click is over in some milliseconds (from memory). */
const CLICK_DECAY_S = 0.002
const CLICK_LENGTH_S = 0.02

/**
 * A tap on a head: damped sinusoids risen over the stick's contact, sharp at first by `glideCents` (the film is stretched by the square of
 * its swing, so the glide dies twice as fast as the loudest partial), then click, room, noise and hum.
 * The rise over the contact is the running sum of the push, which is exact from its end on and near enough within.
 * Not clipped: whoever wants a clipped tap asks for a peak and clips.
 * @throws RangeError an input outside what its type says, no partials left to sound
 */
export function makeTap(tap: TapToMake): MadeTap {
  const sampleRateHz = tap.sampleRateHz ?? 44_100
  const leadS = within('leadS', tap.leadS ?? 0.05, 0, 60)
  const lengthS = within('lengthS', tap.lengthS ?? 1, 0.01, 60)
  const peak = within('peak', tap.peak ?? 0.5, 1e-6, 1)
  const glideCents = within('glideCents', tap.glideCents ?? 0, 0, 400)
  const random = tapRandom(tap.seed)

  const partials = tapPartials(tap.head, tap.strike)
  const strikeAt = Math.round(leadS * sampleRateHz)
  const count = strikeAt + Math.round(lengthS * sampleRateHz)
  let drum = ring(partials, { count: count - strikeAt, sampleRateHz, contactS: tap.strike.contactS, glideCents })
  if (tap.clickDb !== undefined) addClick(drum, sampleRateHz, within('clickDb', tap.clickDb, -120, 20), random)
  if (tap.room) drum = addRoom(drum, sampleRateHz, tap.room, random)

  const loudest = loudestOf(drum)
  if (!(loudest > 0))
    throw new RangeError('head: nothing sounds, every partial has a node under the stick or microphone.')
  const gain = peak / loudest
  const samples = new Float64Array(count)
  drum.forEach((value, i) => (samples[strikeAt + i] = gain * value))

  const reference = gain * rootMeanSquare(drum.subarray(0, Math.round(SNR_WINDOW_S * sampleRateHz)))
  const underBy = (snrDb: number) => reference * 10 ** (-within('snrDb', snrDb, -40, 140) / 20)
  let noiseRms = 0
  if (tap.noise) {
    noiseRms = underBy(tap.noise.snrDb)
    addScaled(samples, tapNoise(tap.noise.colour, count, sampleRateHz, random), noiseRms)
  }
  if (tap.hum) addScaled(samples, mainsHum(tap.hum.mainsHz, count, sampleRateHz, random), underBy(tap.hum.snrDb))
  return {
    samples: Float32Array.from(samples),
    sampleRateHz,
    strikeAt,
    partials: partials.map((partial) => ({ ...partial, amplitude: gain * partial.amplitude })),
    noiseRms,
  }
}

type Ringing = { count: number; sampleRateHz: number; contactS: number; glideCents: number }

function ring(partials: readonly TapPartial[], { count, sampleRateHz, contactS, glideCents }: Ringing): Float64Array {
  const signal = new Float64Array(count)
  const loudest = partials.reduce<TapPartial | undefined>(
    (most, here) => (most === undefined || here.amplitude > most.amplitude ? here : most),
    undefined,
  )
  if (loudest === undefined) return signal
  const sharper = 2 ** (glideCents / 1200) - 1
  const glideDecay = (6 * Math.LN10) / loudest.decayT60S
  // Time the partial has run ahead by at each sample: ∫ sharper·e^(−glideDecay·t) dt.
  const times = Float64Array.from({ length: count }, (_, i) => {
    const t = i / sampleRateHz
    return sharper === 0 ? t : t + (sharper * -Math.expm1(-glideDecay * t)) / glideDecay
  })
  for (const { hz, decayT60S, amplitude, phaseRad } of partials) {
    const perSample = Math.exp((-3 * Math.LN10) / (decayT60S * sampleRateHz))
    const turn = 2 * Math.PI * hz
    let height = amplitude
    const inaudible = loudest.amplitude * 1e-9
    for (let i = 0; i < count && height > inaudible; i++) {
      signal[i] = (signal[i] ?? 0) + height * Math.sin(turn * (times[i] ?? 0) + phaseRad)
      height *= perSample
    }
  }
  const contact = Math.min(count, Math.ceil(contactS * sampleRateHz))
  for (let i = 0; i < contact; i++) {
    const done = i / (contactS * sampleRateHz)
    signal[i] = (signal[i] ?? 0) * (done - Math.sin(2 * Math.PI * done) / (2 * Math.PI))
  }
  return signal
}

function addClick(drum: Float64Array, sampleRateHz: number, clickDb: number, random: TapRandom): void {
  const height = loudestOf(drum) * 10 ** (clickDb / 20)
  const length = Math.min(drum.length, Math.round(CLICK_LENGTH_S * sampleRateHz))
  const click = Float64Array.from({ length }, (_, i) => random.normal() * Math.exp(-i / (CLICK_DECAY_S * sampleRateHz)))
  const loudest = loudestOf(click)
  for (let i = 0; i < length; i++) drum[i] = (drum[i] ?? 0) + (height * (click[i] ?? 0)) / loudest
}

function addScaled(signal: Float64Array, added: Float64Array, scale: number): void {
  added.forEach((value, i) => (signal[i] = (signal[i] ?? 0) + scale * value))
}

function loudestOf(signal: Float64Array): number {
  return signal.reduce((most, value) => Math.max(most, Math.abs(value)), 0)
}

function rootMeanSquare(signal: Float64Array): number {
  return Math.sqrt(signal.reduce((sum, value) => sum + value * value, 0) / signal.length)
}
