import { analyseTap } from '@/lib/listening/analyse-tap'
import { hearRecording } from '@/lib/listening/hear-recording'
import { readWav } from '@/lib/listening/read-wav'
import { struckHead } from '@/lib/listening/tap-head'
import type { TappedDrum } from '@/lib/listening/tap-head'
import { TapListener } from '@/lib/listening/tap-listener'
import { tapRandom } from '@/lib/listening/tap-random'
import type { TapOptions } from '@/lib/listening/tap-report'
import { makeTap } from '@/lib/listening/tap-synth'
import type { TapToMake } from '@/lib/listening/tap-synth'
import { tapsTogether } from '@/lib/listening/taps-together'
import { row } from './refusal-table'
import type { Bad } from './refusal-table'

const tapped: TappedDrum = {
  drum: {
    ...{ diameterM: 0.3048, depthM: 0.2032, temperatureC: 20 },
    ...{ batter: { plyMils: [10], coatingKgPerM2: 0 }, resonant: { plyMils: [10], coatingKgPerM2: 0 } },
  },
  tension: { batterNPerM: 2000, resonantNPerM: 2000 },
  ...{ struck: 'batter', otherHead: 'damped', fingerOnCentre: true, decayT60S: 1, splitHz: 2, axisRad: 0 },
}
const tap: TapToMake = {
  head: struckHead(tapped),
  strike: {
    stick: { radiusShare: 0.8, angleRad: 0.3 },
    microphone: { radiusShare: 0.7, angleRad: 0.3, heightM: 0.05 },
    contactS: 0.002,
  },
  ...{ seed: 7, leadS: 0.05, lengthS: 0.6, peak: 0.5, glideCents: 5, clickDb: -20 },
  ...{ room: { reverbT60S: 0.4, share: 0.1 }, noise: { colour: 'pink', snrDb: 40 }, hum: { mainsHz: 50, snrDb: 50 } },
}
/** What is said of the tap; the head is `struckHead`'s own. */
const { head, ...toldOfTap } = tap

const made = makeTap(tap)
const second = made.samples
const rate = made.sampleRateHz
const changed = (change: (samples: Float32Array) => void) => {
  const samples = second.slice()
  change(samples)
  return samples
}
const silence = new Float32Array(second.length)
/** Ten times too loud for the microphone. */
const clipped = second.map((value) => Math.max(-0.5, Math.min(0.5, 10 * value)))
const SOUNDS: Bad = [
  'samples',
  changed((samples) => (samples[5000] = Number.NaN)),
  changed((samples) => (samples[5000] = Infinity)),
  ...[new Float32Array(0), silence, silence.map(() => 1), clipped, second.slice(0, Math.round(0.07 * rate))],
  // A held tone, which nobody struck.
  silence.map((_, i) => 0.3 * Math.sin((2 * Math.PI * 250 * i) / rate)),
]
const RATES: Bad = ['rate', 0, -44_100, 44.1, 8000, 96_000]
const TARGETS: Bad[] = [
  ['options.expectHz', 0, -255, 0.255, 50_000],
  ['options.expectWithinCents', 0, -100, 5000],
  ['options.referenceHz', 0, -440, 44],
]
const options: Required<TapOptions> = { expectHz: 255, expectWithinCents: 500, referenceHz: 440 }
const heard = { samples: second, rate, options }
const isRefused = (answer: unknown) => (answer as { outcome: string }).outcome === 'refused'
const areRefused = (answer: unknown) => (answer as { report: unknown }[]).every(({ report }) => isRefused(report))

/** A WAV file of four samples, as its 48 bytes. */
const wav = [
  ...[0x52, 0x49, 0x46, 0x46, 44, 0, 0, 0, 0x57, 0x41, 0x56, 0x45, 0x66, 0x6d, 0x74, 0x20, 16, 0, 0, 0, 1, 0, 1, 0],
  ...[0x44, 0xac, 0, 0, 0x88, 0x58, 1, 0, 2, 0, 16, 0, 0x64, 0x61, 0x74, 0x61, 8, 0, 0, 0, 0, 0, 1, 0, 2, 0, 3, 0],
]
const wavWith = (at: number, ...bytes: number[]) => Uint8Array.from(wav.map((byte, i) => bytes[i - at] ?? byte))

export const listeningRows = [
  row(
    'analyseTap',
    (of: typeof heard) => analyseTap(of.samples, of.rate, of.options),
    heard,
    [SOUNDS, RATES, ...TARGETS],
    isRefused,
  ),
  row(
    'hearRecording',
    (of: typeof heard) => hearRecording(of.samples, of.rate, of.options),
    heard,
    [SOUNDS, RATES, ...TARGETS],
    areRefused,
  ),
  row(
    'TapListener',
    (of: typeof heard) => {
      const listener = new TapListener(of.rate, of.options)
      return [...listener.push(of.samples), ...listener.end()]
    },
    heard,
    [SOUNDS, RATES, ...TARGETS],
    areRefused,
  ),
  row('readWav', ({ file }) => readWav(file), { file: Uint8Array.from(wav) }, [
    // Nothing, another kind, cut short, too many channels, an odd rate, 8 bits, sizes that contradict each other.
    ['file', new Uint8Array(0), wavWith(0, 0x00), wavWith(8, 0x58), Uint8Array.from(wav.slice(0, 30))],
    ['file', wavWith(22, 3), wavWith(24, 1, 0), wavWith(34, 8), wavWith(32, 4), wavWith(40, 200), wavWith(20, 7)],
  ]),
  row('struckHead', struckHead, tapped, [
    ['drum.diameterM', 12, 304.8],
    ['drum.depthM', 8, 203.2],
    ['tension.batterNPerM', 0, -2000],
    ['tension.resonantNPerM', 0, -2000],
    ['decayT60S', 0, -1, 100],
    ['splitHz', -1, 31],
  ]),
  row('makeTap', (of: typeof toldOfTap) => makeTap({ ...of, head }), toldOfTap, [
    ['seed', -1, 0.5],
    ['lengthS', 0, -1, 3600],
    ['leadS', -1],
    ['peak', 0, -0.5, 2],
    ['glideCents', -1, 1200],
    ['room.share', -0.1, 2],
    ['room.reverbT60S', 0, -1],
    ['strike.stick.radiusShare', -0.1, 1.1],
    ['strike.contactS', -1, 2],
  ]),
  row('tapRandom', ({ seed }) => tapRandom(seed).uniform(), { seed: 1 }, [['seed', -1, 0.5, 2 ** 32]]),
  row(
    'tapsTogether',
    ({ taps }) => tapsTogether(taps),
    { taps: [255, 255.4, 254.9].map((pitchHz) => ({ pitchHz, standardErrorHz: 0.1 })) },
    [
      ['taps.1.pitchHz', 0, -255],
      ['taps.1.standardErrorHz', -0.1],
    ],
  ),
]
