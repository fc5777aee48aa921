import type { TapRandom } from '@/lib/listening/tap-random'

/** First three formants of vowels, Hz: means of men's voices (published: Peterson and Barney, J. Acoust. Soc. Am. 24(2), 1952). */
const VOWELS = [
  [270, 2290, 3010],
  [530, 1840, 2480],
  [730, 1090, 2440],
  [570, 840, 2410],
  [300, 870, 2240],
] as const
const BANDWIDTHS_HZ = [60, 90, 120] as const

/**
 * Speech-like sound: syllables of a vowel each, a plosive's burst before some; a pulse train of a voice of chance height (85 to 260 Hz) that
 * falls through three formant resonators, louder and softer with the syllable.
 */
export function speech(random: TapRandom, syllables: number, count: number, sampleRateHz: number): Float32Array {
  const between = (low: number, high: number) => low + (high - low) * random.uniform()
  const sound = new Float64Array(count)
  const voiceHz = between(85, 260)
  let from = Math.round(between(0.03, 0.1) * sampleRateHz)
  for (let syllable = 0; syllable < syllables && from < count; syllable++) {
    const length = Math.round(between(0.1, 0.35) * sampleRateHz)
    if (random.uniform() < 0.6) {
      for (let i = 0; i < 0.012 * sampleRateHz && from + i < count; i++) {
        sound[from + i] = (sound[from + i] ?? 0) + 0.5 * random.normal() * Math.exp(-i / (0.004 * sampleRateHz))
      }
      from += Math.round(between(0.01, 0.03) * sampleRateHz)
    }
    const pulses = voicePulses(random, voiceHz * between(0.85, 1.2), length, sampleRateHz)
    const vowel = VOWELS[Math.floor(random.uniform() * VOWELS.length)] ?? VOWELS[0]
    const spoken = vowel.reduce((wave, hz, k) => resonate(wave, hz, BANDWIDTHS_HZ[k] ?? 100, sampleRateHz), pulses)
    const loudest = spoken.reduce((most, value) => Math.max(most, Math.abs(value)), 1e-12)
    const attack = between(0.005, 0.04) * sampleRateHz
    spoken.forEach((value, i) => {
      const rise = Math.min(1, i / attack)
      const fall = Math.min(1, (length - i) / (0.3 * length))
      if (from + i < count) sound[from + i] = (sound[from + i] ?? 0) + (value / loudest) * rise * fall
    })
    from += length + Math.round(between(0.01, 0.12) * sampleRateHz)
  }
  const loudest = sound.reduce((most, value) => Math.max(most, Math.abs(value)), 1e-12)
  const gain = between(0.1, 0.8) / loudest
  return Float32Array.from(sound, (value) => gain * value + 0.001 * random.normal())
}

/** One impulse a glottal period, the period wavering by a percent and the pitch falling by some, smoothed as a closing glottis does. */
function voicePulses(random: TapRandom, hz: number, length: number, sampleRateHz: number): Float64Array {
  const pulses = new Float64Array(length)
  const fall = 0.05 + 0.2 * random.uniform()
  let next = 0
  while (next < length) {
    pulses[Math.floor(next)] = 1
    const now = hz * (1 - (fall * next) / length)
    next += (sampleRateHz / now) * (1 + 0.01 * random.normal())
  }
  let smooth = 0
  return pulses.map((value) => (smooth = 0.97 * smooth + value))
}

function resonate(wave: Float64Array, hz: number, bandwidthHz: number, sampleRateHz: number): Float64Array {
  const radius = Math.exp((-Math.PI * bandwidthHz) / sampleRateHz)
  const a1 = 2 * radius * Math.cos((2 * Math.PI * hz) / sampleRateHz)
  const gain = 1 - a1 + radius ** 2
  let [before, last] = [0, 0]
  return wave.map((value) => {
    const here = gain * value + a1 * last - radius ** 2 * before
    ;[before, last] = [last, here]
    return here
  })
}
