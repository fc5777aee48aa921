import { describe, expect, it } from 'vitest'
import { gaussLegendre } from '@/tests/helpers/gauss-legendre'
import { drumTuning } from './drum-tuning'
import type { DrumTuningInput } from './drum-tuning'
import { explainDrumTuning } from './explain-drum-tuning'

const tom: DrumTuningInput = {
  ...{
    role: 'tom',
    lugs: 6,
    diameterM: 0.3048,
    depthM: 0.2032,
    noteHz: 146.8324,
    relationCents: 200,
    temperatureC: 25,
  },
  batter: { plyMils: [7, 7], coatingKgPerM2: 0.02 },
  resonant: { plyMils: [10], coatingKgPerM2: 0 },
}
const kick: DrumTuningInput = { ...tom, role: 'kick', diameterM: 0.5588, ported: true, noteHz: 52 }

type Given = Record<string, number>

/** Bessel's integral (DLMF 10.9.2). */
const bessel = (order: number, x: number) =>
  gaussLegendre(60, 0, Math.PI).reduce(
    (sum, { at, weight }) => sum + weight * Math.cos(order * at - x * Math.sin(at)),
    0,
  ) / Math.PI

/** What the equation of the note leaves over at a frequency, with the inputs shown: 0 at a root. */
function leftOver(g: Given, hz: number): number {
  // λ and g of the 2 × 2 by the quadratic formula and its eigenvectors, not by a rotation.
  const [a, b, c] = [g['s1']! / g['T1']!, g['s2']! / g['T2']!, g['χ']! / Math.sqrt(g['T1']! * g['T2']!)]
  const half = Math.hypot((a - b) / 2, c)
  return [1, -1].reduce((sum, sign) => {
    const lambda = (a + b) / 2 + sign * half
    const [u, v] = [c, lambda - a]
    const drive = (u / Math.sqrt(g['T1']!) - v / Math.sqrt(g['T2']!)) / Math.hypot(u, v)
    const x = 2 * Math.PI * hz * g['a']! * Math.sqrt(lambda)
    return sum + ((g['γP0']! * g['a']! ** 2) / g['L']!) * drive ** 2 * (bessel(2, x) / (x ** 2 * bessel(0, x)))
  }, 1)
}

/** The stated formulas worked out afresh from the stated inputs. */
const BY_HAND: Record<string, (given: Given) => number> = {
  'areal-density': (g) => g['ρ(PET)']! * g['h']! + g['σc']!,
  'air-density': (g) => (1.2041 * 293.15) / (273.15 + g['t']!),
  'tap-density': (g) =>
    'μ1' in g ? g['σ']! + (g['β1']! * g['ρ']! * g['a']!) / 2 + g['μ1']! : g['σ']! + g['β1']! * g['ρ']! * g['a']!,
  tap: (g) => (g['j11']! / (2 * Math.PI * g['a']!)) * Math.sqrt(g['T']! / g['s']!),
  'rod-pull': (g) => (2 * Math.PI * g['a']! * g['T']!) / g['N']!,
  torque: (g) => g['K']! * g['d']! * g['F']!,
  'film-stress': (g) => g['T']! / g['h']!,
  'warm-up': (g) => (240 * g['h']!) / 254e-6 / (10 / g['Δt']!),
  range: (g) => Math.log(g['T']! / g['Tslack']!) / Math.log(g['Tchoked']! / g['Tslack']!),
  'tap-ratio': (g) => g['f11']! / g['f']!,
}
const given = ({ inputs }: { inputs: { symbol: string; value: number }[] }): Given =>
  Object.fromEntries(inputs.map(({ symbol, value }) => [symbol, value]))
const allOf = (input: DrumTuningInput) => {
  const { drum, heads } = explainDrumTuning(input)
  return [...drum, ...heads.flatMap(({ figures }) => figures)]
}
const figureOf = (input: DrumTuningInput, id: string, side?: 'resonant') => {
  const { drum, heads } = explainDrumTuning(input)
  const among = side ? (heads[1]?.figures ?? []) : [...drum, ...(heads[0]?.figures ?? [])]
  const found = among.find((figure) => figure.id === id)
  if (!found) throw new Error(`no figure ${id}`)
  return found
}

describe('why these numbers', () => {
  it.each([
    ['a drum with two heads', tom],
    ['a ported kick', kick],
    ['a measured drum', { ...tom, measuredTapRatio: 1.7 }],
  ])('%s: every plain formula, fed with the inputs shown, gives the value shown', (_, input) => {
    const checked = allOf(input).flatMap((figure) => {
      const byHand = BY_HAND[figure.id]
      if (byHand) expect(byHand(given(figure)) / figure.value).toBeCloseTo(1, 9)
      return byHand ? [figure.id] : []
    })
    expect(new Set(checked)).toEqual(new Set(Object.keys(BY_HAND)))
  })

  it('the equation of the note holds at note and upper partner with the inputs shown, and nowhere beside', () => {
    for (const id of ['note', 'upper-partner']) {
      const figure = figureOf(tom, id)
      expect(Math.abs(leftOver(given(figure), figure.value))).toBeLessThan(1e-6)
      expect(Math.abs(leftOver(given(figure), figure.value * 1.001))).toBeGreaterThan(1e-4)
    }
  })

  it('tensions: the resonant head by the relation of the taps, the single head and the measured one in closed form', () => {
    const resonant = figureOf(tom, 'tension', 'resonant')
    const r = given(resonant)
    expect((r['T1']! * (r['s2']! / r['s1']!) * 2 ** (r['c']! / 600)) / resonant.value).toBeCloseTo(1, 9)
    const single = figureOf(kick, 'tension')
    const s = given(single)
    expect((s['σ0']! * ((2 * Math.PI * s['a']! * s['f']!) / s['j01']!) ** 2) / single.value).toBeCloseTo(1, 9)
    const measured = figureOf({ ...tom, measuredTapRatio: 1.7 }, 'tension')
    const m = given(measured)
    expect((m['s']! * ((2 * Math.PI * m['a']! * m['r']! * m['f']!) / m['j11']!) ** 2) / measured.value).toBeCloseTo(
      1,
      9,
    )
    expect(measured.mark).toBe('measured')
  })

  it('shows the figures of the tuning with their bounds, every one with a source', () => {
    const tuning = drumTuning(tom)
    const { low, high } = tuning.batter.tapHz
    expect(figureOf(tom, 'tap')).toMatchObject({ value: tuning.batter.tapHz.value, bounds: { low, high } })
    expect(figureOf(tom, 'upper-partner').value).toBe(tuning.upperPartnerHz?.value)
    expect(figureOf(tom, 'sustain').value).toBe(tuning.sustain)
    expect(figureOf(tom, 'false-warble').value).toBe(tuning.falseWarbleHz)
    for (const figure of [...allOf(tom), ...allOf(kick)]) expect(figure.source).not.toBe('')
  })

  it('leaves out of a ported kick what only two heads have', () => {
    const { drum, heads } = explainDrumTuning(kick)
    expect(heads.map(({ side }) => side)).toEqual(['batter'])
    expect(drum.map(({ id }) => id)).toEqual(['air-density', 'note', 'tap-ratio'])
  })

  it('marks a head’s own range apart from the default, which is from memory', () => {
    expect(figureOf(tom, 'range').mark).toBe('from memory')
    const own = { ...tom.batter, range: { slackNPerM: 650, chokedNPerM: 4200 } }
    expect(figureOf({ ...tom, batter: own }, 'range').mark).toBe('measured')
  })
})
