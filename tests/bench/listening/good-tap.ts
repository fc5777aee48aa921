import { lugTapTensionNPerM } from '@/lib/acoustics/lug-tap'
import { METRE_PER_INCH } from '@/lib/acoustics/require-quantity'
import { loadedPair } from '@/lib/acoustics/two-head-drum'
import type { TwoHeadDrum } from '@/lib/acoustics/two-head-drum'
import { struckHead } from '@/lib/listening/tap-head'
import type { TapPartial } from '@/lib/listening/tap-partials'
import type { TapRandom } from '@/lib/listening/tap-random'
import { makeTap } from '@/lib/listening/tap-synth'
import type { MadeTap, TapToMake } from '@/lib/listening/tap-synth'

/** `offAxisRad`: from the split's axis to the lug that is struck; chance unless given. */
export type GoodTapAsked = { decayT60S: number; splitHz: number; offAxisRad?: number; lengthS?: number } & Pick<
  TapToMake,
  'noise' | 'room' | 'hum' | 'glideCents' | 'clickDb' | 'peak'
>

/** A made tap and what is there to be heard: the (1,1) partials, one when the head is even, else two. */
export type GoodTap = MadeTap & { tap: readonly TapPartial[]; lengthS: number }

const SIZES = [
  { inches: 8, depthInches: 7, lowHz: 240, highHz: 420 },
  { inches: 10, depthInches: 7, lowHz: 200, highHz: 360 },
  { inches: 12, depthInches: 8, lowHz: 165, highHz: 310 },
  { inches: 14, depthInches: 12, lowHz: 130, highHz: 250 },
  { inches: 16, depthInches: 14, lowHz: 105, highHz: 210 },
] as const
const FILMS = [[10], [7.5], [7, 7]] as const
const LUGS = [5, 6, 8, 10] as const

/**
 * A tap as the bench page asks for it: a tom of chance size, film and pitch; other head damped, fingertip on the centre; the stick an inch or so
 * from a lug of chance, the microphone above the same lug.
 */
export function goodTap(random: TapRandom, asked: GoodTapAsked): GoodTap {
  const between = (low: number, high: number) => low + (high - low) * random.uniform()
  const oneOf = <T>(of: readonly T[]) => of[Math.floor(random.uniform() * of.length)] as T
  const size = oneOf(SIZES)
  const film = { plyMils: oneOf(FILMS), coatingKgPerM2: 0 }
  const drum: TwoHeadDrum = {
    diameterM: size.inches * METRE_PER_INCH,
    depthM: size.depthInches * METRE_PER_INCH,
    batter: film,
    resonant: film,
  }
  const { massKgPerM2, radiusM } = loadedPair(1, drum)
  const batterNPerM = lugTapTensionNPerM(between(size.lowHz, size.highHz), massKgPerM2[0], radiusM)
  const angleRad = (2 * Math.PI * Math.floor(8 * random.uniform())) / oneOf(LUGS)
  const head = struckHead({
    drum,
    tension: { batterNPerM, resonantNPerM: batterNPerM * between(0.8, 1.4) },
    struck: 'batter',
    otherHead: 'damped',
    fingerOnCentre: true,
    decayT60S: asked.decayT60S,
    splitHz: asked.splitHz,
    axisRad: angleRad - (asked.offAxisRad ?? between(0, Math.PI)),
  })
  const lengthS = asked.lengthS ?? 1
  const made = makeTap({
    ...asked,
    lengthS,
    head,
    strike: {
      stick: { radiusShare: between(0.78, 0.9), angleRad },
      microphone: { radiusShare: between(0.7, 0.95), angleRad, heightM: between(0.05, 0.15) },
      contactS: between(0.001, 0.003),
    },
    seed: Math.floor(random.uniform() * 2 ** 32),
  })
  const pair = made.partials.filter(({ m, n }) => m === 1 && n === 1)
  return { ...made, lengthS, tap: asked.splitHz === 0 ? [together(pair)] : pair }
}

/** Two partials of one frequency, decay and phase are one. */
function together(pair: readonly TapPartial[]): TapPartial {
  const [first] = pair
  if (first === undefined) throw new Error('A tap beside a lug always has its (1,1) shape.')
  return { ...first, amplitude: pair.reduce((sum, { amplitude }) => sum + amplitude, 0) }
}
