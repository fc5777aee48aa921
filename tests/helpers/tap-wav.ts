import { writeFileSync } from 'node:fs'
import { struckHead } from '@/lib/listening/tap-head'
import type { TappedDrum } from '@/lib/listening/tap-head'
import { tapNoise } from '@/lib/listening/tap-noise'
import { tapRandom } from '@/lib/listening/tap-random'
import { makeTap } from '@/lib/listening/tap-synth'
import { wavFile } from './wav-file'

export type TapWav = {
  drum: TappedDrum
  /** Taps at evenly spaced lugs, lug 1 at angle 0, once round. */
  lugs: number
  /** From one strike to the next, s. */
  everyS?: number
  /** Room noise under full scale, dB. */
  noiseDb?: number
  sampleRateHz?: 44_100 | 48_000
  seed: number
}

export type WrittenTap = { lug: number; atS: number; pitchHz: number }

/**
 * Writes taps once round a head as a 16-bit mono WAV, which Chromium takes for a microphone
 * (`--use-file-for-fake-audio-capture`), and says when each is and what it sounds: the (1,1) pair's mean, weighted by amplitude.
 */
export function writeTapWav(
  path: string,
  { drum, lugs, everyS = 1.8, noiseDb = 60, sampleRateHz = 48_000, seed }: TapWav,
): WrittenTap[] {
  const head = struckHead(drum)
  const count = Math.round((0.5 + lugs * everyS) * sampleRateHz)
  const random = tapRandom(seed)
  const level = 10 ** (-noiseDb / 20)
  const sound = tapNoise('pink', count, sampleRateHz, random).map((value) => level * value)
  const taps = Array.from({ length: lugs }, (_, index) => {
    const angleRad = (2 * Math.PI * index) / lugs
    const made = makeTap({
      head,
      strike: {
        stick: { radiusShare: 0.83, angleRad },
        microphone: { radiusShare: 0.83, angleRad, heightM: 0.1 },
        contactS: 0.002,
      },
      seed: Math.floor(random.uniform() * 2 ** 32),
      sampleRateHz,
      leadS: 0,
      lengthS: everyS,
      clickDb: -15,
      glideCents: 4,
    })
    const at = Math.round((0.5 + index * everyS) * sampleRateHz)
    made.samples.forEach((value, i) => {
      if (at + i < count) sound[at + i] = (sound[at + i] ?? 0) + value
    })
    const pair = made.partials.filter(({ m, n }) => m === 1 && n === 1)
    const weight = pair.reduce((sum, { amplitude }) => sum + amplitude, 0)
    return {
      lug: index + 1,
      atS: at / sampleRateHz,
      pitchHz: pair.reduce((sum, { amplitude, hz }) => sum + amplitude * hz, 0) / weight,
    }
  })
  writeFileSync(path, wavFile(sound, sampleRateHz))
  return taps
}
