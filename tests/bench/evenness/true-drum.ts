import { seededRandom } from './seeded-random'
import type { SeededRandom } from './seeded-random'

/** What a simulated drum does that the advice's model does not know of; 'plain' only differs from it in its figures. */
export type DrumKind = 'plain' | 'friction' | 'sticking rod' | 'side leak' | 'bent hoop'

export type TrueDrum = {
  lugs: number
  /** Readings without noise, gauge units, lug 1 first; what evenness is judged by. */
  readings: () => number[]
  /** A stroke of the key at one lug, in turns, from below when down; hand error and friction are added here. */
  turn: (lug: number, turns: number) => void
  /** A gauge reading, with noise. */
  read: (lug: number) => number
  /** Gauge units at each lug for one turn at each other: `response[to][from]`. */
  response: readonly (readonly number[])[]
}

export type DrumOf = { lugs: number; kind: DrumKind; noise?: number; fingerTight?: number }

/** Common practice: relative error of a key turn by hand, and one deviation of a gauge reading, units. */
const HAND_ERROR = 0.2
const GAUGE_NOISE = 0.35
/** Reading wanted, units: common practice for a medium-high 12 in tom. */
export const WANTED_READING = 75

/**
 * A seeded drum as its bring-up left it. Its response to a turn comes from the least energy of film, hoop and rods together
 * (below), not from the circulant the advice uses. `noise` is one deviation of a reading, gauge units; `fingerTight` the turns by
 * which finger-tight rods differ from their mean at most.
 */
export function trueDrum(
  seed: number,
  { lugs, kind, noise = GAUGE_NOISE, fingerTight = FINGER_TIGHT }: DrumOf,
): TrueDrum {
  const random = seededRandom(seed, lugs, KINDS.indexOf(kind))
  const hand = seededRandom(seed, lugs, 101)
  const ear = seededRandom(seed, lugs, 102)
  const response = trueResponse(random, lugs, kind)
  const rods = broughtUp(random, lugs, fingerTight)
  const seat = seating(random, lugs, kind)
  const meanOff = random.between(0, 1) < 0.75 ? random.between(-6, -1) : random.between(0, 4)
  const offset = WANTED_READING + meanOff - mean(response.map((row) => dot(row, rods)))
  const bent = kind === 'bent hoop' ? random.whole(lugs) : -1
  const bentBy = bent < 0 ? 0 : random.between(0.8, 2) * (random.between(0, 1) < 0.5 ? -1 : 1)
  const sticking = kind === 'sticking rod' ? random.whole(lugs) : -1
  const stick = random.between(0.06, 0.12)
  const passes = random.between(0.5, 0.7)
  const friction = kind === 'friction' ? random.between(0.02, 0.05) : 0

  const stroke = (rod: number, turns: number) => {
    const hold = rod === sticking ? stick : friction
    if (hold === 0) return turns
    if (Math.abs(turns) < hold) return 0
    return (turns + hold * hand.between(-0.5, 0.5)) * (rod === sticking ? passes : 1)
  }
  const readings = () => response.map((row, i) => offset + (seat[i] ?? 0) + dot(row, rods) + (i === bent ? bentBy : 0))
  return {
    lugs,
    readings,
    response,
    turn: (lug, turns) => {
      const rod = lug - 1
      const meant = turns * (1 + HAND_ERROR * hand.normal())
      const moved = turns < 0 ? stroke(rod, meant - GO_UNDER) + stroke(rod, GO_UNDER) : stroke(rod, meant)
      rods[rod] = (rods[rod] ?? 0) + moved
    },
    read: (lug) => (readings()[lug - 1] ?? Number.NaN) + noise * ear.normal(),
  }
}

const KINDS: readonly DrumKind[] = ['plain', 'friction', 'sticking rod', 'side leak', 'bent hoop']
/** Turns by which finger-tight rods differ from their mean at most, by a usual hand and a gentle one; from memory. */
const FINGER_TIGHT = 1 / 3
export const GENTLE = 1 / 6
/** Relative spread of what a turn does at one rod and another. */
const ROD_SPREAD = 0.05
/** Turns below the wanted place from which the key comes up again. */
const GO_UNDER = 0.125

/** Rods after seating finger-tight and four to six quarter turns by hand, in turns. */
function broughtUp(random: SeededRandom, lugs: number, fingerTight: number): number[] {
  const quarters = 4 + random.whole(3)
  return Array.from({ length: lugs }, () => {
    let turns = random.between(-fingerTight, fingerTight)
    for (let i = 0; i < quarters; i++) turns += 0.25 * (1 + HAND_ERROR * random.normal())
    return turns
  })
}

/** Unevenness of the film's own seat, gauge units: two-fold and three-fold, and on a leaking edge a lean to one side. */
function seating(random: SeededRandom, lugs: number, kind: DrumKind): number[] {
  const waves = [
    { fold: 1, size: kind === 'side leak' ? 0.8 : 0 },
    { fold: 2, size: 0.6 },
    { fold: 3, size: 0.3 },
  ].map(({ fold, size }) => ({ fold, c: size * random.normal(), s: size * random.normal() }))
  return Array.from({ length: lugs }, (_, i) => {
    const angle = (2 * Math.PI * i) / lugs
    return waves.reduce((sum, { fold, c, s }) => sum + c * Math.cos(fold * angle) + s * Math.sin(fold * angle), 0)
  })
}

/**
 * Least energy of ½Σ(S_k + H_k)u_k² over the edge's harmonics k and ½K Σ(w(θ_i) − δ_i)² over the rods: film in plane stress
 * (S_0 = 1/(1−ν), S_1 = 0, S_k = (k²−1)/(2k−1+ν)), a hoop that bends and twists (H_k = κk²(k²−1)²/(k²+χ)), rods of stiffness K
 * turned by δ. A turn of lug harmonic m moves every edge harmonic k ≡ m (mod N). Film over rods 0.012 to 0.06 and hoop over rods
 * 0.003 to 0.15 span thin pressed steel to cast on 10 to 16 in (derived from E·h/a, EI/a³ and the rods' EA/L). Gain is then set
 * so that a turn at every lug raises the readings by 16 to 45 units (from memory), and each rod answers a little differently.
 */
function trueResponse(random: SeededRandom, lugs: number, kind: DrumKind): number[][] {
  const nu = random.between(0.33, 0.43)
  const filmOverRods = random.around(0.012, 0.06)
  const hoop = random.around(0.003, 0.15) / filmOverRods
  const rod = (2 * Math.PI) / lugs / filmOverRods
  const twist = random.between(1, 2)
  const side = kind === 'side leak' ? random.between(0.15, 0.5) : 1e-9
  const wholeGain = random.around(16, 45)

  const filmStiffness = (k: number) => (k === 0 ? 1 / (1 - nu) : k === 1 ? side : (k * k - 1) / (2 * k - 1 + nu))
  const hoopStiffness = (k: number) => (hoop * k ** 2 * (k ** 2 - 1) ** 2) / (k ** 2 + twist)
  const gains = Array.from({ length: lugs }, (_, m) => {
    let give = 0
    let pull = 0
    for (let fold = -6; fold <= 6; fold++) {
      const k = Math.abs(m + fold * lugs)
      const share = lugs / (2 * Math.PI) / (filmStiffness(k) + hoopStiffness(k))
      give += share
      pull += filmStiffness(k) * share
    }
    return (rod * pull) / (1 + rod * give)
  })
  const scale = wholeGain / gains[0]!
  const rods = gains.map(() => 1 + ROD_SPREAD * random.normal())
  return Array.from({ length: lugs }, (_, to) =>
    Array.from(
      { length: lugs },
      (_, from) =>
        ((scale * rods[from]!) / lugs) *
        gains.reduce((sum, g, m) => sum + g * Math.cos((2 * Math.PI * m * (to - from)) / lugs), 0),
    ),
  )
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length
}

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, value, i) => sum + value * (b[i] ?? 0), 0)
}
