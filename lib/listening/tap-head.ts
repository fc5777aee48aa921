import { airDensityKgPerM3, ROOM_TEMPERATURE_C } from '@/lib/acoustics/air'
import { besselJZero } from '@/lib/acoustics/bessel-j'
import { AIR_STIFFNESS_PA } from '@/lib/acoustics/coupled-heads'
import { filmArealDensityKgPerM2 } from '@/lib/acoustics/film'
import { cavityHeadRoot } from '@/lib/acoustics/head-on-cavity'
import { principalDirections } from '@/lib/acoustics/head-pair'
import { requireTensionNPerM } from '@/lib/acoustics/require-quantity'
import { loadedPair, twoHeadModes } from '@/lib/acoustics/two-head-drum'
import type { TwoHeadDrum } from '@/lib/acoustics/two-head-drum'
import type { HeadMode, StruckHead } from './tap-partials'
import { within } from './tap-within'

/** A drum about to be tapped. */
export type TappedDrum = {
  drum: TwoHeadDrum
  tension: { batterNPerM: number; resonantNPerM: number }
  struck: 'batter' | 'resonant'
  /** `damped`: a hand or a cushion on the other head; `open`: it rings along. */
  otherHead: 'damped' | 'open'
  /** A fingertip on the centre takes the note and leaves the tap. */
  fingerOnCentre: boolean
  /** Decay of the (1,1) pair, s. A tom's tap rings 0.3 to 2 s (from memory). */
  decayT60S: number
  /** Distance of the (1,1) pair, Hz, 0 when the head is even, and the angle at which the higher is loudest. */
  splitHz: number
  axisRad: number
}

/** Decay beside that of (1,1): round shapes push on the room and fall faster (from memory). */
const DECAY_BESIDE_TAP: readonly { m: number; n: number; share: number }[] = [
  { m: 2, n: 1, share: 0.85 },
  { m: 3, n: 1, share: 0.7 },
  { m: 4, n: 1, share: 0.6 },
  { m: 0, n: 2, share: 0.4 },
  { m: 1, n: 2, share: 0.5 },
]
const NOTE_DECAY_BESIDE_TAP = 0.6
/** What a fingertip on the centre leaves of a shape that moves there (from memory). */
const UNDER_FINGER = { share: 0.05, mostT60S: 0.08 }
/** Squeezing the air, the upper partner dies in no time beside the note (from memory). */
const PARTNER_DECAY_BESIDE_TAP = 0.3

/**
 * The shapes of a drum's head as they sound when it is struck. Other head open: note and upper partner of the coupled drum, and
 * every (m,1) twice, by how much of either belongs to the struck head. Other head damped: the struck head on a closed cavity, and
 * every (m,1) once. (0,2) and (1,2) carry the air of a plane ripple, ρ/k on either face.
 * Frequencies from `lib/acoustics`; decays are from memory. Leaves out the shell's own sound.
 * @throws AcousticsError the drum refused
 * @throws RangeError decay outside 0.02 to 20 s, split outside 0 to 30 Hz
 */
export function struckHead(tapped: TappedDrum): StruckHead {
  within('decayT60S', tapped.decayT60S, 0.02, 20)
  within('splitHz', tapped.splitHz, 0, 30)
  within('axisRad', tapped.axisRad, -1e3, 1e3)
  const higher = DECAY_BESIDE_TAP.flatMap(({ m, n, share }) =>
    shapes(tapped, m, n).map((mode) => ({ ...mode, decay: share })),
  )
  return {
    radiusM: tapped.drum.diameterM / 2,
    modes: [...notes(tapped), ...shapes(tapped, 1, 1), ...higher].map((sounding) => modeOf(tapped, sounding)),
  }
}

type Sounding = { m: number; n: number; hz: number; decay: number; share: number }

function modeOf(tapped: TappedDrum, { m, n, hz, decay, share }: Sounding): HeadMode {
  const fingered = tapped.fingerOnCentre && m === 0
  const decayT60S = tapped.decayT60S * decay
  return {
    m,
    n,
    hz,
    decayT60S: fingered ? Math.min(decayT60S, UNDER_FINGER.mostT60S) : decayT60S,
    splitHz: m === 1 && n === 1 ? tapped.splitHz : 0,
    axisRad: tapped.axisRad,
    share: fingered ? share * UNDER_FINGER.share : share,
  }
}

function notes(tapped: TappedDrum): Sounding[] {
  if (tapped.otherHead === 'open') {
    const { noteHz, upperPartnerHz } = twoHeadModes(tapped.drum, tapped.tension)
    return [
      { m: 0, n: 1, hz: noteHz, decay: NOTE_DECAY_BESIDE_TAP, share: 0.5 },
      { m: 0, n: 1, hz: upperPartnerHz, decay: PARTNER_DECAY_BESIDE_TAP, share: 0.5 },
    ]
  }
  const { radiusM, depthM, massKgPerM2 } = loadedPair(0, tapped.drum)
  const { tensionNPerM, index } = ofStruck(tapped)
  const root = cavityHeadRoot((AIR_STIFFNESS_PA * radiusM ** 2) / (tensionNPerM[index] * depthM))
  const hz = (root / (2 * Math.PI * radiusM)) * Math.sqrt(tensionNPerM[index] / massKgPerM2[index])
  return [{ m: 0, n: 1, hz, decay: PARTNER_DECAY_BESIDE_TAP, share: 1 }]
}

/** Shape (m, n) of the struck head: once, or twice for (m,1) with the other head open. */
function shapes(tapped: TappedDrum, m: number, n: number): Sounding[] {
  const { tensionNPerM, index } = ofStruck(tapped)
  const ripplePerM = (2 * besselJZero(m, n)) / tapped.drum.diameterM
  const sounding = (slowness2: number, share: number): Sounding => ({
    m,
    n,
    hz: ripplePerM / (2 * Math.PI * Math.sqrt(slowness2)),
    decay: 1,
    share,
  })
  if (n > 1) {
    const air = airDensityKgPerM3(tapped.drum.temperatureC ?? ROOM_TEMPERATURE_C)
    const mass = filmArealDensityKgPerM2(tapped.drum[tapped.struck]) + (2 * air) / ripplePerM
    return [sounding(mass / tensionNPerM[index], 1)]
  }
  const pair = loadedPair(m, tapped.drum)
  if (tapped.otherHead === 'damped') return [sounding(pair.massKgPerM2[index] / tensionNPerM[index], 1)]
  return principalDirections({ ...pair, tensionNPerM }).map(({ slowness2, of }) => sounding(slowness2, of[index] ** 2))
}

function ofStruck({ struck, tension }: TappedDrum): { index: 0 | 1; tensionNPerM: readonly [number, number] } {
  return {
    index: struck === 'batter' ? 0 : 1,
    tensionNPerM: [
      requireTensionNPerM(tension.batterNPerM, 'batterNPerM'),
      requireTensionNPerM(tension.resonantNPerM, 'resonantNPerM'),
    ],
  }
}
