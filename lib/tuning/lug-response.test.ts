import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { solveSymmetric } from '../../tests/helpers/symmetric-matrix'
import { gaussLegendre } from '../../tests/helpers/gauss-legendre'
import type { ReadingBasis } from './head-state'
import { evenLugAngles, lugsFacing } from './lug-angles'
import { lugOrder } from './lug-order'
import { edgeStiffness, lugResponse, predictReadings, readingChanges, requireEvenLugs, turnsFor } from './lug-response'

/**
 * Independent solver: the film's strain energy for u_r = U(r)·cos kθ, u_θ = V(r)·sin kθ made least over polynomials in r with
 * U(1) = 1 and V free at the edge (no shear is then the natural condition). Plane stress, E·h = a = 1. No stress function.
 * The edge pull works against U(1), so S_k = 2·energy/∫cos² kθ dθ.
 */
function edgeStiffnessByEnergy(k: number, poisson: number): number {
  const terms = k + 8
  type Shape = {
    u: (r: number) => number
    du: (r: number) => number
    v: (r: number) => number
    dv: (r: number) => number
  }
  const none = () => 0
  const powers = Array.from({ length: terms }, (_, i) => i + 1)
  const shapes: Shape[] = [
    ...powers.map((n): Shape => ({ u: (r) => r ** n, du: (r) => n * r ** (n - 1), v: none, dv: none })),
    ...(k === 0
      ? []
      : powers.map((n): Shape => ({ u: none, du: none, v: (r) => r ** n, dv: (r) => n * r ** (n - 1) }))),
    // A side shift as a whole: needed at k = 1, where it has no strain.
    ...(k === 1 ? [{ u: () => 1, du: none, v: () => -1, dv: none }] : []),
  ]
  const stiffness = shapes.map(() => shapes.map(() => 0))
  for (const { at: r, weight } of gaussLegendre(terms + 4, 0, 1)) {
    const strains = shapes.map(({ u, du, v, dv }) => ({
      radial: du(r),
      hoop: (u(r) + k * v(r)) / r,
      shear: (-k * u(r)) / r + dv(r) - v(r) / r,
    }))
    strains.forEach((p, i) => {
      strains.forEach((q, j) => {
        const pull =
          (p.radial * q.radial + p.hoop * q.hoop + poisson * (p.radial * q.hoop + p.hoop * q.radial)) /
          (1 - poisson ** 2)
        const row = stiffness[i] ?? []
        row[j] = (row[j] ?? 0) + weight * r * (pull + (p.shear * q.shear) / (2 * (1 + poisson)))
      })
    })
  }
  // Least energy with U(1) = 1: E = 1/(c·K⁻¹·c), c the shapes' U at the edge. A trace of stiffness holds the rigid shift in place.
  const held = stiffness.map((row, i) => row.map((value, j) => value + (i === j ? 1e-12 : 0)))
  const edge = shapes.map(({ u }) => u(1))
  const answer = solveSymmetric(held, edge)
  return 1 / edge.reduce((sum, c, i) => sum + c * (answer[i] ?? 0), 0)
}

/**
 * Independent solver: ring on N rods over the film, as one dense set of equations for the ring's Fourier parts up to k = 80, with
 * the rods as point springs. No circulant algebra, no aliasing sums. Answers the film's edge tension at every lug when lug 1 is
 * turned once, over what turning all of them does.
 */
function sharesBySprings(lugs: number, hoop: number): number[] {
  const top = 80
  const waves = [
    (_: number) => 1,
    ...Array.from({ length: top }, (_, i) => (angle: number) => Math.cos((i + 1) * angle)),
    ...Array.from({ length: top }, (_, i) => (angle: number) => Math.sin((i + 1) * angle)),
  ]
  const order = (i: number) => (i <= top ? i : i - top)
  const film = (k: number) => (k === 0 ? 1 / (1 - 0.38) : (k * k - 1) / (2 * k - 1 + 0.38))
  const ring = (k: number) => (hoop * k * k * (k * k - 1) ** 2) / (k * k + 1.3)
  const angles = Array.from({ length: lugs }, (_, i) => ((i + 0.5) * 2 * Math.PI) / lugs)
  const energy = waves.map((a, i) =>
    waves.map((b, j) => {
      const own = i === j ? (ring(order(i)) + 0.025 * film(order(i))) * (i === 0 ? 2 : 1) * Math.PI : 0
      return own + angles.reduce((sum, angle) => sum + ((2 * Math.PI) / lugs) * a(angle) * b(angle), 0)
    }),
  )
  const tensions = (turns: readonly number[]) => {
    const load = waves.map((a) =>
      angles.reduce((sum, angle, i) => sum + ((2 * Math.PI) / lugs) * a(angle) * (turns[i] ?? 0), 0),
    )
    const ringAt = solveSymmetric(energy, load)
    return angles.map((angle) =>
      ringAt.reduce((sum, part, i) => sum + film(order(i)) * part * (waves[i]?.(angle) ?? 0), 0),
    )
  }
  const even = tensions(angles.map(() => 1))[0] ?? Number.NaN
  return tensions(angles.map((_, i) => (i === 0 ? 1 : 0))).map((tension) => tension / even)
}

const anyLugs = fc.integer({ min: 4, max: 12 })
const anyHoop = fc.double({ min: -3, max: 0, noNaN: true }).map((power) => 10 ** power)
const anyBasis = fc.constantFrom<ReadingBasis>('gauge', 'tap')
const anyResponse = fc.record({ lugs: anyLugs, hoop: anyHoop, basis: anyBasis }).map(lugResponse)
const turnsOf = (lugs: number) =>
  fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: lugs, maxLength: lugs })
const responseAndTurns = anyResponse.chain((response) =>
  fc.record({ response: fc.constant(response), turns: turnsOf(response.lugs) }),
)
const rotated = (values: readonly number[], by: number) =>
  values.map((_, i) => values[(i + 12 * values.length - by) % values.length] ?? 0)
const closeTo = (got: readonly number[], wanted: readonly number[], digits = 9) => {
  expect(got).toHaveLength(wanted.length)
  got.forEach((value, i) => expect(value).toBeCloseTo(wanted[i] ?? Number.NaN, digits))
}

describe('edge stiffness', () => {
  it.each([
    [0, 1 / 0.62],
    [1, 0],
    [2, 3 / 3.38],
    [3, 8 / 5.38],
    [6, 35 / 11.38],
  ])('S_%i of PET (derived: closed form)', (k, stiffness) => {
    expect(edgeStiffness(k)).toBeCloseTo(stiffness, 12)
  })

  it.each([0.2, 0.38, 0.45])(
    'agrees with the least strain energy of the disc, ν %f (derived: independent solver)',
    (poisson) => {
      for (const k of [0, 1, 2, 3, 4, 5, 6, 9]) {
        expect(edgeStiffness(k, poisson)).toBeCloseTo(edgeStiffnessByEnergy(k, poisson), 6)
      }
    },
  )

  it('refuses what is no harmonic', () => {
    for (const k of [-1, 1.5, Number.NaN])
      expect(() => edgeStiffness(k)).toThrow(expect.objectContaining({ field: 'k' }))
  })
})

describe('what a turn does', () => {
  it.each([
    [4, 0.02],
    [5, 0.02],
    [6, 0.004],
    [7, 0.1],
    [8, 0.02],
    [10, 0.02],
    [12, 0.02],
  ])('agrees with a ring on point springs: %i lugs, hoop %f (derived: independent solver)', (lugs, hoop) => {
    closeTo(lugResponse({ lugs, hoop, basis: 'gauge' }).shares, sharesBySprings(lugs, hoop), 3)
  })

  // Common practice: "the opposite lug moves with the turned one, neighbours hardly, and everything a little".
  it.each([6, 8, 10])(
    '%i lugs: the opposite moves with the turned one, the neighbours hardly (common practice)',
    (lugs) => {
      const { shares } = lugResponse({ lugs, basis: 'gauge' })
      const [own = 0, next = 0] = shares
      const opposite = shares[lugs / 2] ?? 0
      expect(own).toBe(Math.max(...shares))
      expect(opposite / own).toBeGreaterThan(1 / 3)
      expect(opposite / own).toBeLessThan(2 / 3)
      expect(Math.abs(next) / own).toBeLessThan(0.1)
      for (const share of shares) expect(share / own).toBeGreaterThan(-0.1)
    },
  )

  it('a stiffer hoop spreads a turn further', () => {
    for (const lugs of [6, 8, 10]) {
      const own = [0.002, 0.02, 0.2].map((hoop) => lugResponse({ lugs, hoop, basis: 'gauge' }).shares[0] ?? 0)
      expect([...own].sort((a, b) => b - a)).toEqual(own)
    }
  })

  it('every lug turned alike moves every reading by the gain; a tilt moves none', () => {
    fc.assert(
      fc.property(
        anyResponse,
        fc.double({ min: 0.1, max: 1000, noNaN: true }),
        fc.double({ min: 0, max: 7, noNaN: true }),
        (response, gain, phase) => {
          const angles = evenLugAngles(response.lugs)
          closeTo(
            readingChanges(
              response,
              angles.map(() => 1),
              gain,
            ).map((change) => change / gain),
            angles.map(() => 1),
          )
          const tilt = readingChanges(
            response,
            angles.map((angle) => Math.cos(angle - phase)),
            gain,
          )
          closeTo(
            tilt.map((change) => change / gain),
            angles.map(() => 0),
          )
        },
      ),
    )
  })

  it('taps see an alternate pattern not at all, and a facing pattern less than the gauge does', () => {
    const alternate = [1, -1, 1, -1, 1, -1]
    closeTo(
      readingChanges(lugResponse({ lugs: 6, basis: 'tap' }), alternate, 1),
      alternate.map(() => 0),
    )
    const [gauge, tap] = (['gauge', 'tap'] as const).map((basis) => lugResponse({ lugs: 6, basis }))
    // Far from aliasing a facing pattern of film tension ε is ε/4 of pitch where an even ε is ε/2 (derived).
    expect((tap?.patterns[2] ?? 0) / (gauge?.patterns[2] ?? 1)).toBeGreaterThan(0.4)
    expect((tap?.patterns[2] ?? 0) / (gauge?.patterns[2] ?? 1)).toBeLessThan(0.55)
  })

  it('adds up, scales, turns with the head and mirrors with it', () => {
    fc.assert(
      fc.property(
        responseAndTurns,
        fc.integer({ min: 0, max: 11 }),
        fc.double({ min: -3, max: 3, noNaN: true }),
        ({ response, turns }, by, factor) => {
          const changes = readingChanges(response, turns, 20)
          closeTo(readingChanges(response, rotated(turns, by), 20), rotated(changes, by))
          closeTo(readingChanges(response, [...turns].reverse(), 20), [...changes].reverse())
          const other = rotated(turns, 1).map((turn) => turn * factor)
          const sum = turns.map((turn, i) => turn + (other[i] ?? 0))
          const others = readingChanges(response, other, 20)
          closeTo(
            readingChanges(response, sum, 20),
            changes.map((change, i) => change + (others[i] ?? 0)),
          )
        },
      ),
    )
  })

  it('predicts readings, and none where none was read', () => {
    const response = lugResponse({ lugs: 4, basis: 'gauge' })
    const [own = 0, next = 0, opposite = 0] = response.shares
    const predicted = predictReadings(response, { readings: [70, null, 71, 72], turns: [0.5, 0, 0, 0], gain: 20 })
    expect(predicted[1]).toBeNull()
    closeTo(
      predicted.filter((value) => value !== null),
      [70 + 10 * own, 71 + 10 * opposite, 72 + 10 * next],
    )
  })
})

describe('turns for a wanted change', () => {
  it('round trip: turns without a tilt come back from the change they make', () => {
    fc.assert(
      fc.property(responseAndTurns, ({ response, turns }) => {
        const change = readingChanges(response, turns, 15)
        const made = turnsFor(response, { change, gain: 15, floor: 1e-3 })
        closeTo(made.reached, change)
        closeTo(
          made.leftover,
          change.map(() => 0),
        )
        // The least turns that do it: no more than those that did.
        const square = (values: readonly number[]) => values.reduce((sum, value) => sum + value ** 2, 0)
        expect(square(made.turns)).toBeLessThanOrEqual(square(turns) + 1e-9)
        closeTo(readingChanges(response, made.turns, 15), change)
      }),
    )
  })

  it('leaves the tilt alone, and says what no turn can do', () => {
    const response = lugResponse({ lugs: 8, basis: 'gauge' })
    const tilt = evenLugAngles(8).map((angle) => 3 * Math.sin(angle))
    const made = turnsFor(response, { change: tilt, gain: 20 })
    closeTo(
      made.turns,
      tilt.map(() => 0),
    )
    closeTo(made.leftover, tilt)
    expect(made.leftAlone).toEqual([1])
  })

  it('by taps only the whole head and facing pairs can be worked on', () => {
    expect(
      turnsFor(lugResponse({ lugs: 10, basis: 'tap' }), { change: Array(10).fill(1), gain: 700 }).leftAlone,
    ).toEqual([1, 3, 4, 5])
  })

  it('never answers with more turns than the floor allows', () => {
    fc.assert(
      fc.property(
        responseAndTurns,
        fc.double({ min: 0.01, max: 1, noNaN: true }),
        ({ response, turns: change }, floor) => {
          const size = (values: readonly number[]) => Math.hypot(...values)
          expect(size(turnsFor(response, { change, gain: 1, floor }).turns)).toBeLessThanOrEqual(
            size(change) / floor + 1e-9,
          )
        },
      ),
    )
  })
})

describe('bad input', () => {
  const response = lugResponse({ lugs: 6, basis: 'gauge' })
  it.each([
    ['lugs', () => lugResponse({ lugs: 3, basis: 'gauge' })],
    ['hoop', () => lugResponse({ lugs: 6, basis: 'gauge', hoop: 0 })],
    ['turns', () => readingChanges(response, [1, 0, 0], 20)],
    ['turns', () => readingChanges(response, [Number.NaN, 0, 0, 0, 0, 0], 20)],
    ['gain', () => readingChanges(response, [1, 0, 0, 0, 0, 0], 0)],
    ['readings', () => predictReadings(response, { readings: [1], turns: [0, 0, 0, 0, 0, 0], gain: 1 })],
    ['change', () => turnsFor(response, { change: [1], gain: 20 })],
    ['floor', () => turnsFor(response, { change: [1, 0, 0, 0, 0, 0], gain: 20, floor: 0 })],
  ])('is refused, naming %s', (field, call) => {
    expect(call).toThrow(expect.objectContaining({ name: 'AcousticsError', field }))
  })

  it('takes evenly spaced lugs on either head, and refuses uneven ones', () => {
    for (const lugs of [4, 5, 8]) {
      for (const side of ['batter', 'resonant'] as const) {
        const seen = lugsFacing(side, evenLugAngles(lugs)).map(({ seenRad }) => seenRad)
        expect(requireEvenLugs(seen)).toBe(lugOrder(lugs).length)
      }
    }
    expect(() => requireEvenLugs([0, 1, 2, 3, 4, 5])).toThrow(expect.objectContaining({ field: 'seenRad' }))
  })
})
