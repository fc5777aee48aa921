import { mainsHum, tapNoise } from '@/lib/listening/tap-noise'
import { tapRandom } from '@/lib/listening/tap-random'
import type { TapRandom } from '@/lib/listening/tap-random'
import { addRoom } from '@/lib/listening/tap-room'
import { goodTap } from './good-tap'
import { speech } from './speech'

export const NON_TAP_RATE_HZ = 44_100
const COUNT = Math.round(1.1 * NON_TAP_RATE_HZ)

export type NonTap = { kind: string; samples: Float32Array }

type Maker = (random: TapRandom) => Float32Array

/** What may reach the microphone and is no tap, how many of each and how each is made. Two hundred together. */
const KINDS: readonly { kind: string; many: number; make: Maker }[] = [
  { kind: 'speech, words', many: 20, make: (random) => speech(random, 3, COUNT, NON_TAP_RATE_HZ) },
  { kind: 'speech, one syllable', many: 20, make: (random) => speech(random, 1, COUNT, NON_TAP_RATE_HZ) },
  { kind: 'cymbal', many: 20, make: cymbal },
  { kind: 'double hit', many: 20, make: doubleHit },
  { kind: 'clipped tap', many: 15, make: clipped },
  { kind: 'cut-off tap', many: 10, make: cutOff },
  { kind: 'plucked chord', many: 15, make: (random) => chord(random, true) },
  { kind: 'held chord', many: 10, make: (random) => chord(random, false) },
  { kind: 'sine tone', many: 10, make: sine },
  { kind: 'hum', many: 10, make: hum },
  { kind: 'clap', many: 10, make: clap },
  { kind: 'rim click', many: 10, make: rimClick },
  { kind: 'rattle', many: 10, make: rattle },
  { kind: 'footstep', many: 10, make: footstep },
  { kind: 'room noise', many: 6, make: roomNoise },
  { kind: 'silence', many: 4, make: silence },
]

/** The two hundred, the same for the same seed. */
export function nonTaps(seed: number): NonTap[] {
  const random = tapRandom(seed)
  return KINDS.flatMap(({ kind, many, make }) => Array.from({ length: many }, () => ({ kind, samples: make(random) })))
}

const between = (random: TapRandom, low: number, high: number) => low + (high - low) * random.uniform()

/** Scaled to a chance peak over a little room noise. */
function inRoom(random: TapRandom, sound: Float64Array): Float32Array {
  const peak = sound.reduce((most, value) => Math.max(most, Math.abs(value)), 1e-12)
  const gain = between(random, 0.1, 0.8) / peak
  const floor = 10 ** (-between(random, 50, 70) / 20)
  const noise = tapNoise('pink', sound.length, NON_TAP_RATE_HZ, random)
  return Float32Array.from(sound, (value, i) => gain * value + floor * (noise[i] ?? 0))
}

function startAt(random: TapRandom): number {
  return Math.round(between(random, 0.02, 0.1) * NON_TAP_RATE_HZ)
}

type Ring = { hz: number; decayT60S: number; height: number }

function ringing(sound: Float64Array, from: number, rings: readonly Ring[], riseS: number): Float64Array {
  for (const { hz, decayT60S, height } of rings) {
    for (let i = from; i < sound.length; i++) {
      const t = (i - from) / NON_TAP_RATE_HZ
      const rise = riseS === 0 ? 1 : Math.min(1, t / riseS)
      sound[i] = (sound[i] ?? 0) + rise * height * 10 ** ((-3 * t) / decayT60S) * Math.sin(2 * Math.PI * hz * t)
    }
  }
  return sound
}

/** Some hundred partials with no order in them, 200 to 12 000 Hz, ringing on. */
function cymbal(random: TapRandom): Float32Array {
  const rings = Array.from({ length: 120 }, () => {
    const hz = 200 * 60 ** random.uniform()
    return { hz, decayT60S: between(random, 0.6, 4) * Math.min(1, 1500 / hz) ** 0.4, height: Math.abs(random.normal()) }
  })
  return inRoom(random, ringing(new Float64Array(COUNT), startAt(random), rings, 0.0005))
}

function doubleHit(random: TapRandom): Float32Array {
  const make = () =>
    goodTap(random, {
      decayT60S: between(random, 0.5, 1.4),
      splitHz: 0,
      lengthS: 1.05,
      noise: { colour: 'pink', snrDb: between(random, 25, 40) },
      clickDb: -10,
    })
  const [first, second] = [make(), make()]
  const late = Math.round(between(random, 0.05, 0.3) * NON_TAP_RATE_HZ)
  const again = between(random, 0.5, 1)
  // One drum hit twice: the second hit is the first again, or another lug's.
  const repeated = random.uniform() < 0.5 ? first : second
  return first.samples.map((value, i) => value / 2 + (i < late ? 0 : (again * (repeated.samples[i - late] ?? 0)) / 2))
}

function clipped(random: TapRandom): Float32Array {
  const tap = goodTap(random, {
    decayT60S: between(random, 0.6, 1.6),
    splitHz: 0,
    peak: 1,
    noise: { colour: 'pink', snrDb: 40 },
  })
  const gain = between(random, 4, 12)
  return tap.samples.map((value) => Math.max(-1, Math.min(1, gain * value)))
}

/** A hand on the head, or the recording stopped, 20 to 60 ms after the strike. */
function cutOff(random: TapRandom): Float32Array {
  const tap = goodTap(random, { decayT60S: 0.9, splitHz: 0, noise: { colour: 'pink', snrDb: 35 } })
  const end = tap.strikeAt + Math.round(between(random, 0.02, 0.06) * NON_TAP_RATE_HZ)
  return random.uniform() < 0.5
    ? tap.samples.slice(0, end)
    : tap.samples.map((value, i) => (i < end ? value : 0.0005 * random.normal()))
}

const SEMITONES = [
  [0, 4, 7],
  [0, 3, 7],
  [0, 4, 7, 10],
  [0, 5, 9],
] as const

/** Three or four strings with their harmonics, plucked, or blown and held. */
function chord(random: TapRandom, plucked: boolean): Float32Array {
  const root = between(random, 90, 260)
  const steps = SEMITONES[Math.floor(random.uniform() * SEMITONES.length)] ?? SEMITONES[0]
  const rings = steps.flatMap((step) =>
    Array.from({ length: 8 }, (_, k) => ({
      hz: root * 2 ** (step / 12) * (k + 1),
      decayT60S: plucked ? between(random, 1.5, 4) / (1 + 0.3 * k) : 60,
      height: between(random, 0.5, 1) / (k + 1),
    })),
  )
  return inRoom(random, ringing(new Float64Array(COUNT), startAt(random), rings, plucked ? 0.002 : 0.05))
}

function sine(random: TapRandom): Float32Array {
  const ring = { hz: between(random, 80, 600), decayT60S: 200, height: 1 }
  const begins = random.uniform() < 0.5 ? 0 : startAt(random)
  return inRoom(random, ringing(new Float64Array(COUNT), begins, [ring], between(random, 0.002, 0.05)))
}

function hum(random: TapRandom): Float32Array {
  return inRoom(random, mainsHum(random.uniform() < 0.5 ? 50 : 60, COUNT, NON_TAP_RATE_HZ, random))
}

/** Three or four bursts of noise within 30 ms, in a room. */
function clap(random: TapRandom): Float32Array {
  const sound = new Float64Array(COUNT)
  let from = startAt(random)
  for (let burst = 0; burst < 4; burst++) {
    const decay = between(random, 0.002, 0.006) * NON_TAP_RATE_HZ
    for (let i = 0; i < 8 * decay; i++)
      sound[from + i] = (sound[from + i] ?? 0) + random.normal() * Math.exp(-i / decay)
    from += Math.round(between(random, 0.005, 0.012) * NON_TAP_RATE_HZ)
  }
  return inRoom(random, addRoom(sound, NON_TAP_RATE_HZ, { reverbT60S: between(random, 0.3, 1), share: 0.3 }, random))
}

/** A stick on the hoop: high, short partials. */
function rimClick(random: TapRandom): Float32Array {
  const rings = Array.from({ length: 5 }, () => ({
    hz: between(random, 900, 5000),
    decayT60S: between(random, 0.03, 0.12),
    height: between(random, 0.3, 1),
  }))
  return inRoom(random, ringing(new Float64Array(COUNT), startAt(random), rings, 0.0003))
}

/** Snare wires, keys: bright noise that dies in a fifth of a second. */
function rattle(random: TapRandom): Float32Array {
  const sound = new Float64Array(COUNT)
  const from = startAt(random)
  const decay = between(random, 0.03, 0.12) * NON_TAP_RATE_HZ
  let last = 0
  for (let i = from; i < COUNT; i++) {
    const value = random.normal() * Math.exp(-(i - from) / decay)
    sound[i] = value - 0.7 * last
    last = value
  }
  return inRoom(random, sound)
}

/** A heel on a stage: low thumps that are gone in a tenth of a second. */
function footstep(random: TapRandom): Float32Array {
  const rings = Array.from({ length: 3 }, () => ({
    hz: between(random, 40, 130),
    decayT60S: between(random, 0.05, 0.12),
    height: between(random, 0.5, 1),
  }))
  const sound = ringing(new Float64Array(COUNT), startAt(random), rings, 0.004)
  return inRoom(random, addRoom(sound, NON_TAP_RATE_HZ, { reverbT60S: 0.6, share: 0.1 }, random))
}

function roomNoise(random: TapRandom): Float32Array {
  const level = 10 ** (-between(random, 20, 60) / 20)
  return Float32Array.from(
    tapNoise(random.uniform() < 0.5 ? 'pink' : 'white', COUNT, NON_TAP_RATE_HZ, random),
    (value) => level * value,
  )
}

function silence(random: TapRandom): Float32Array {
  const level = random.uniform() < 0.5 ? 0 : 1e-5
  return Float32Array.from({ length: COUNT }, () => level * random.normal())
}
