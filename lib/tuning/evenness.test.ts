import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { LugValue } from './evenness'
import { gaugeEvenness } from './evenness-by-gauge'
import { tapEvenness } from './evenness-by-taps'
import { evenLugAngles, lugsFacing } from './lug-angles'
import { warbleForecast } from './warble-forecast'

/** Lugs of an evenly spaced head, each with what `valueAt` gives for its angle; null for the lugs in `missing`. */
function head(
  lugs: number,
  valueAt: (seenRad: number, lug: number) => number,
  missing: readonly number[] = [],
): LugValue[] {
  return lugsFacing('batter', evenLugAngles(lugs)).map(({ lug, seenRad }) => ({
    ...{ lug, seenRad, value: missing.includes(lug) ? null : valueAt(seenRad, lug) },
  }))
}
const twoFold = (mean: number, warble: number, highRad: number) => (seenRad: number) =>
  mean + (warble / 2) * Math.cos(2 * (seenRad - highRad))
const read = <E extends { kind: string }>(evenness: E): Extract<E, { kind: 'read' }> => {
  if (evenness.kind !== 'read') throw new Error(`Not read: ${evenness.kind}`)
  return evenness as Extract<E, { kind: 'read' }>
}
const halfTurnApart = (a: number, b: number) => Math.abs(Math.sin(a - b))

/** Even random numbers, the same each run (the minimal standard generator, Park and Miller 1988), made normal by Box and Muller. */
function normals(seed: number): () => number {
  let state = seed
  const uniform = () => (state = (state * 48271) % 2147483647) / 2147483647
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform())
}

const anyLugs = fc.integer({ min: 5, max: 12 })
const anyWarble = fc.double({ min: 1, max: 15, noNaN: true })
const anyAngle = fc.double({ min: 0, max: Math.PI, noNaN: true })

describe('evenness by taps', () => {
  it('round trip: gives back mean, warble and axis', () => {
    fc.assert(
      fc.property(anyLugs, anyWarble, anyAngle, (lugs, warble, highRad) => {
        const made = read(tapEvenness({ lugs: head(lugs, twoFold(250, warble, highRad)), noiseCents: 0.1 }))
        expect(made.mean).toBeCloseTo(250, 8)
        expect(made.warble.value).toBeCloseTo(warble, 8)
        expect(made.residual).toBeCloseTo(0, 8)
        expect(halfTurnApart(made.axis?.highRad ?? Number.NaN, highRad)).toBeLessThan(1e-7)
      }),
    )
  })

  it('with a lug missing too, five lugs or more', () => {
    fc.assert(
      fc.property(anyLugs, anyWarble, anyAngle, fc.integer({ min: 1, max: 5 }), (lugs, warble, highRad, missing) => {
        const made = read(tapEvenness({ lugs: head(lugs, twoFold(250, warble, highRad), [missing]), noiseCents: 0.1 }))
        expect(made.warble.value).toBeCloseTo(warble, 8)
      }),
    )
  })

  it('turns with the head and mirrors with it', () => {
    const values = fc.array(fc.double({ min: 249, max: 251, noNaN: true }), { minLength: 8, maxLength: 8 })
    fc.assert(
      fc.property(values, fc.integer({ min: 1, max: 7 }), (pitches, by) => {
        const at = (order: (i: number) => number) =>
          read(tapEvenness({ lugs: head(8, (_, lug) => pitches[order(lug - 1)] ?? 0), noiseCents: 20 }))
        const [straight, turned, mirrored] = [at((i) => i), at((i) => (i - by + 8) % 8), at((i) => 7 - i)]
        for (const other of [turned, mirrored]) {
          expect(other.warble.value).toBeCloseTo(straight.warble.value, 9)
          expect(other.mean).toBeCloseTo(straight.mean, 9)
        }
      }),
    )
    const [one, turned, mirrored] = [0.3, 0.3 + Math.PI / 4, -0.3].map(
      (rad) => read(tapEvenness({ lugs: head(8, twoFold(250, 6, rad)) })).axis?.highRad ?? Number.NaN,
    )
    expect(halfTurnApart((one ?? 0) + Math.PI / 4, turned ?? 0)).toBeLessThan(1e-9)
    expect(halfTurnApart(-(one ?? 0), mirrored ?? 0)).toBeLessThan(1e-9)
  })

  it('names the facing pair that is high and the pair across it', () => {
    // Eight lugs from 22.5°, 45° apart: lug 2 stands at 67.5°, lug 6 faces it, 4 and 8 lie across.
    const axis = read(tapEvenness({ lugs: head(8, twoFold(250, 6, (67.5 * Math.PI) / 180)) })).axis
    expect(axis).toMatchObject({ highLugs: [2, 6], lowLugs: [4, 8] })
    // Six lugs, high at the badge, which stands midway between lugs 6 and 1: both count, and so do 3 and 4 that face them.
    expect(read(tapEvenness({ lugs: head(6, twoFold(250, 8, 0)) })).axis?.highLugs).toEqual([1, 3, 4, 6])
  })

  it('cents come out as the same Hz', () => {
    const hz = twoFold(250, 5, 1)
    const cents = head(6, (seenRad) => 1200 * Math.log2(hz(seenRad) / 240))
    const [inCents, inHz] = [tapEvenness({ lugs: cents, zeroHz: 240 }), tapEvenness({ lugs: head(6, hz) })].map(read)
    expect(inCents?.warble.value).toBeCloseTo(inHz?.warble.value ?? Number.NaN, 8)
    expect(inCents?.mean).toBeCloseTo(250, 8)
  })

  it('the interval holds the true warble at least 19 times in 20 (derived: seeded noise of 4 cents)', () => {
    const noise = normals(20261)
    const sizes = [5, 6, 8, 10]
    const trials = 1200
    let [held, squares, errors] = [0, 0, 0]
    for (let trial = 0; trial < trials; trial++) {
      const warble = (trial % 12) + 1
      const exact = twoFold(250, warble, trial)
      const made = tapEvenness({
        lugs: head(sizes[trial % 4] ?? 6, (seenRad) => exact(seenRad) * 2 ** ((4 * noise()) / 1200)),
      })
      if (made.kind !== 'read') continue
      if (made.warble.low <= warble && warble <= made.warble.high) held += 1
      squares += warble < 4 ? 0 : (made.warble.value - warble) ** 2
      errors += warble < 4 ? 0 : made.warble.standardError ** 2
    }
    expect(held / trials).toBeGreaterThan(0.94)
    // The standard error is the spread: variances within a fifth over some 900 trials.
    expect(squares / errors).toBeGreaterThan(0.8)
    expect(squares / errors).toBeLessThan(1.2)
  })

  it('cries "not sure" of good readings no more than 2 times in 100, and of a reading 25 cents wrong nearly always', () => {
    const noise = normals(77)
    const refused = (wrongCents: number) =>
      Array.from({ length: 400 }, (_, trial) => {
        const exact = twoFold(250, 3, trial)
        return tapEvenness({
          lugs: head(8, (seenRad, lug) => exact(seenRad) * 2 ** ((4 * noise() + (lug === 3 ? wrongCents : 0)) / 1200)),
        }).kind
      }).filter((kind) => kind === 'not-sure').length / 400
    expect(refused(0)).toBeLessThan(0.02)
    expect(refused(25)).toBeGreaterThan(0.9)
  })

  it('names the lug to read again, and both of a facing pair where six lugs cannot tell', () => {
    const wrong = (lugs: number, missing: number[] = []) =>
      tapEvenness({
        lugs: head(
          lugs,
          (seenRad, lug) => twoFold(250, 2, 0.5)(seenRad) + (lug === 3 ? 9 : 0) + Math.cos(5 * lug) / 4,
          missing,
        ),
      })
    expect(wrong(7)).toMatchObject({ kind: 'not-sure', again: [3] })
    expect(wrong(6)).toMatchObject({ kind: 'not-sure', again: [3, 6] })
    // Six lugs less two leave one value over: nothing to try without.
    expect(wrong(6, [1, 2])).toMatchObject({ kind: 'not-sure', again: [] })
  })

  it('a doubtful reading weighs less, one not trusted at all counts as missing', () => {
    const exact = twoFold(250, 4, 0.4)
    const at = (trust: number) => {
      const lugs = head(8, (seenRad, lug) => exact(seenRad) + (lug === 2 ? 1.5 : 0))
      return read(tapEvenness({ lugs: lugs.map((lug) => (lug.lug === 2 ? { ...lug, trust } : lug)) })).warble.value
    }
    const off = [1, 0.5, 0.1, 0].map((trust) => Math.abs(at(trust) - 4))
    expect([...off].sort((a, b) => b - a)).toEqual(off)
    expect(off[3]).toBeCloseTo(0, 8)
  })

  it('weighs readings by their trust: two facing lugs count as their weighted mean (derived: equal rows of least squares)', () => {
    const exact = twoFold(250, 4, 0.4)
    const at = (second: number, sixth: number) => {
      const lugs = head(8, (seenRad, lug) => exact(seenRad) + (lug === 2 ? second : lug === 6 ? sixth : 0))
      return read(
        tapEvenness({ lugs: lugs.map((lug) => (lug.lug === 2 ? { ...lug, trust: 0.25 } : lug)), noiseCents: 30 }),
      )
    }
    expect(at(2, -1).warble.value).toBeCloseTo(at(-0.4, -0.4).warble.value, 9)
    expect(at(2, -1).mean).toBeCloseTo(at(-0.4, -0.4).mean, 9)
  })

  it('does not cry "not sure" for a reading that was doubtful from the start', () => {
    const lugs = head(8, (seenRad, lug) => twoFold(250, 4, 0.4)(seenRad) + (lug === 2 ? 6 : 0))
    expect(tapEvenness({ lugs }).kind).toBe('not-sure')
    expect(tapEvenness({ lugs: lugs.map((lug) => (lug.lug === 2 ? { ...lug, trust: 0.02 } : lug)) }).kind).toBe('read')
  })

  it('counts no reading that is not trusted at all', () => {
    const lugs = head(5, twoFold(250, 4, 0.4), [1])
    expect(tapEvenness({ lugs }).kind).toBe('read')
    expect(tapEvenness({ lugs: lugs.map((lug) => (lug.lug === 2 ? { ...lug, trust: 0 } : lug)) })).toEqual({
      kind: 'not-enough',
      read: [3, 4, 5],
    })
  })

  it('has not enough with too few lugs, or with lugs that stand badly', () => {
    const exact = twoFold(250, 4, 0.4)
    expect(tapEvenness({ lugs: head(6, exact, [1, 2, 3]) })).toEqual({ kind: 'not-enough', read: [4, 5, 6] })
    // Lugs 2, 3, 5 and 6 of six are two facing pairs: two directions, three unknowns.
    expect(tapEvenness({ lugs: head(6, exact, [1, 4]) }).kind).toBe('not-enough')
    expect(tapEvenness({ lugs: head(8, exact, [1, 2, 3, 4, 5, 6, 7, 8]) })).toEqual({ kind: 'not-enough', read: [] })
  })

  it('four lugs see one direction: a pair high on the lugs, none high between them (derived)', () => {
    const onLugs = read(tapEvenness({ lugs: head(4, twoFold(250, 6, Math.PI / 4)) }))
    expect(onLugs.warble.value).toBeCloseTo(6, 8)
    expect(onLugs).toMatchObject({ phases: 'one', axis: { highLugs: [1, 3], lowLugs: [2, 4] } })
    expect(read(tapEvenness({ lugs: head(4, twoFold(250, 6, 0)) })).warble.value).toBeCloseTo(0, 8)
    // A lug four degrees off tells no more: noise would swamp it.
    const byHand = head(4, () => 250).map((lug) => ({ ...lug, seenRad: lug.seenRad + (lug.lug === 3 ? 0.07 : 0) }))
    expect(read(tapEvenness({ lugs: byHand })).phases).toBe('one')
  })

  it('an alternate pattern is not taken for warble, k = 3 of six lugs', () => {
    const made = read(tapEvenness({ lugs: head(6, (_, lug) => 250 + (lug % 2 === 0 ? 0.5 : -0.5)) }))
    expect(made.warble.value).toBeCloseTo(0, 8)
    expect(made.axis).toBeNull()
  })
})

describe('evenness by the gauge', () => {
  const wave = (seenRad: number, k: number, amplitude: number, highRad: number) =>
    amplitude * Math.cos(k * (seenRad - highRad))

  it('shows every pattern, each with its size and place (derived: closed form)', () => {
    const lugs = head(
      10,
      (seenRad) =>
        75 +
        wave(seenRad, 1, 0.2, 0.7) +
        wave(seenRad, 2, 2, 0.3) +
        wave(seenRad, 3, 1, 1.9) +
        wave(seenRad, 4, 0.5, 0.1),
    )
    const made = read(gaugeEvenness({ lugs }))
    expect(made.mean).toBeCloseTo(75, 9)
    expect(made.parts?.map(({ amplitude }) => amplitude)).toEqual(
      [0.2, 2, 1, 0.5, 0].map((size) => expect.closeTo(size, 9)),
    )
    expect(made.parts?.slice(0, 4).map(({ highRad }) => highRad)).toEqual(
      [0.7, 0.3, 1.9, 0.1].map((rad) => expect.closeTo(rad, 9)),
    )
    expect(made.twoFold.value).toBeCloseTo(2, 9)
    expect(made.oneSided).toBe(false)
  })

  it('the alternate pattern of an even count has one size only', () => {
    const made = read(gaugeEvenness({ lugs: head(6, (_, lug) => 75 + (lug % 2 === 0 ? 1 : -1)) }))
    expect(made.parts?.map(({ amplitude }) => amplitude)).toEqual([0, 0, 1].map((size) => expect.closeTo(size, 9)))
  })

  it('says so when a head leans to one side, which no film in balance does', () => {
    expect(read(gaugeEvenness({ lugs: head(8, (seenRad) => 75 + wave(seenRad, 1, 1.5, 2)) })).oneSided).toBe(true)
  })

  it('gives no film figures without a calibration', () => {
    expect(read(gaugeEvenness({ lugs: head(6, () => 75) })).film).toBeNull()
  })

  it.each([5, 6, 8, 11])(
    '%i lugs: ε is (2/(N·T̄))·|Σ T·e^(−2iθ)|, the warble (ε/2)·f11 (derived: the sum itself)',
    (count) => {
      const tensionAt = (reading: number) => 20 * (reading - 40) ** 1.3
      const lugs = head(count, (seenRad) => 75 + wave(seenRad, 2, 2, 0.9) + wave(seenRad, 3, 0.4, 0.2))
      const tensions = lugs.map(({ value, seenRad }) => ({ tension: tensionAt(value ?? 0), seenRad }))
      const mean = tensions.reduce((sum, { tension }) => sum + tension, 0) / count
      const cos = tensions.reduce((sum, { tension, seenRad }) => sum + tension * Math.cos(2 * seenRad), 0)
      const sin = tensions.reduce((sum, { tension, seenRad }) => sum + tension * Math.sin(2 * seenRad), 0)
      const unevenness = (2 / (count * mean)) * Math.hypot(cos, sin)
      const film = read(gaugeEvenness({ lugs, film: { tensionAt, tapHz: 300 } })).film
      expect(film?.meanNPerM).toBeCloseTo(mean, 6)
      expect(film?.unevenness.value).toBeCloseTo(unevenness, 9)
      expect(film?.warble.value).toBeCloseTo(150 * unevenness, 7)
      // Noise of 0.35 unit, carried through the slope of the calibration: σ·√(2/N) over the mean.
      const slope = 20 * 1.3 * (75 - 40) ** 0.3
      expect(film?.unevenness.standardError).toBeCloseTo((0.35 * slope * Math.sqrt(2 / count)) / mean, 4)
    },
  )

  it('four lugs: a pair ε high is ε, not twice that (derived)', () => {
    const film = read(
      gaugeEvenness({
        lugs: head(4, (_, lug) => (lug % 2 === 1 ? 102 : 98)),
        film: { tensionAt: (reading) => 20 * reading, tapHz: 300 },
      }),
    ).film
    expect(film?.unevenness.value).toBeCloseTo(0.02, 9)
  })

  it('has no film figures where the gauge was not calibrated', () => {
    const tensionAt = (reading: number) => (reading > 75.5 ? null : 20 * reading)
    expect(
      read(gaugeEvenness({ lugs: head(6, (_, lug) => 70 + lug), film: { tensionAt, tapHz: 300 } })).film,
    ).toBeNull()
  })

  it('with lugs missing, other patterns widen the interval', () => {
    const lugs = (missing: number[]) =>
      head(8, (seenRad) => 75 + wave(seenRad, 2, 2, 0.3) + wave(seenRad, 3, 2, 1), missing)
    const [full, gap] = [[], [4]].map((missing) => read(gaugeEvenness({ lugs: lugs(missing) })))
    expect(gap?.parts).toBeNull()
    expect(gap?.twoFold.low).toBeLessThanOrEqual(2)
    expect(gap?.twoFold.high).toBeGreaterThanOrEqual(2)
    expect(gap?.twoFold.standardError).toBeGreaterThan(2 * (full?.twoFold.standardError ?? Number.NaN))
  })
})

describe('the warble forecast', () => {
  const taps = tapEvenness({ lugs: head(6, twoFold(250, 4, 1)) })
  it('is the warble with its interval', () => {
    const forecast = warbleForecast({ role: 'tom', side: 'batter', evenness: taps })
    expect(forecast).toMatchObject({ kind: 'forecast', beatsPerS: { value: expect.closeTo(4, 8) } })
  })

  it('keeps silent on a snare side, whose beds make it uneven on purpose', () => {
    expect(warbleForecast({ role: 'snare', side: 'resonant', evenness: taps })).toEqual({ kind: 'snare-side' })
    expect(warbleForecast({ role: 'snare', side: 'batter', evenness: taps }).kind).toBe('forecast')
    expect(warbleForecast({ role: 'tom', side: 'resonant', evenness: taps }).kind).toBe('forecast')
  })

  it('is a lower bound with four lugs', () => {
    const evenness = tapEvenness({ lugs: head(4, twoFold(250, 6, Math.PI / 4)) })
    expect(warbleForecast({ role: 'tom', side: 'batter', evenness }).kind).toBe('at-least')
  })

  it('says why there is none', () => {
    const at = (evenness: Parameters<typeof warbleForecast>[0]['evenness']) =>
      warbleForecast({ role: 'tom', side: 'batter', evenness })
    expect(at(gaugeEvenness({ lugs: head(6, () => 75) }))).toEqual({ kind: 'gauge-not-calibrated' })
    expect(at(tapEvenness({ lugs: head(6, () => 250, [1, 2, 3]) }))).toEqual({ kind: 'not-enough', read: [4, 5, 6] })
    expect(at(tapEvenness({ lugs: head(7, (_, lug) => (lug === 5 ? 270 : 250)) }))).toEqual({
      kind: 'not-sure',
      again: [5],
    })
  })
})

describe('bad input', () => {
  const good = head(6, () => 250)
  const spoilt = (change: Partial<LugValue>) => good.map((lug, i) => (i === 2 ? { ...lug, ...change } : lug))
  it.each([
    ['lugs', () => tapEvenness({ lugs: good.slice(0, 3) })],
    ['seenRad', () => tapEvenness({ lugs: [...good].reverse() })],
    ['seenRad', () => tapEvenness({ lugs: spoilt({ seenRad: Number.NaN }) })],
    ['value', () => tapEvenness({ lugs: spoilt({ value: Number.NaN }) })],
    ['value', () => tapEvenness({ lugs: spoilt({ value: 0 }) })],
    ['value', () => tapEvenness({ lugs: spoilt({ value: 9000 }), zeroHz: 250 })],
    ['trust', () => tapEvenness({ lugs: spoilt({ trust: 2 }) })],
    ['zeroHz', () => tapEvenness({ lugs: head(6, () => 5), zeroHz: -250 })],
    ['noiseCents', () => tapEvenness({ lugs: good, noiseCents: 0 })],
    ['value', () => gaugeEvenness({ lugs: spoilt({ value: -1 }) })],
    ['noise', () => gaugeEvenness({ lugs: good, noise: Number.POSITIVE_INFINITY })],
    ['tapHz', () => gaugeEvenness({ lugs: good, film: { tensionAt: (reading) => reading, tapHz: 0 } })],
  ])('is refused, naming %s', (field, call) => {
    expect(call).toThrow(expect.objectContaining({ name: 'AcousticsError', field }))
  })
})
