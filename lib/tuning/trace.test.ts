import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evenLugAngles, lugsFacing } from './lug-angles'
import { traceOutline } from './trace'
import type { TracePoint } from './trace'

function lugs(deviations: (number | null)[]) {
  const faced = lugsFacing('batter', evenLugAngles(deviations.length))
  return faced.map(({ lug, seenRad }, i) => ({ lug, seenRad, deviation: deviations[i] ?? null }))
}
const radius = ({ x, y }: TracePoint) => Math.hypot(x, y)
const options = { circleRadius: 100, radiusPerUnit: 0.5 }

describe('trace', () => {
  it('round is even: equal deviations draw a circle', () => {
    fc.assert(
      fc.property(fc.integer({ min: 4, max: 12 }), fc.double({ min: -40, max: 40, noNaN: true }), (count, off) => {
        const { segments, closed } = traceOutline(lugs(Array.from({ length: count }, () => off)), options)
        expect(closed).toBe(true)
        for (const point of segments[0] ?? []) expect(radius(point)).toBeCloseTo(100 + 0.5 * off, 9)
      }),
    )
  })

  it('runs through every lug that was read, and closes on itself', () => {
    const trace = traceOutline(lugs([10, -20, 0, 30, 5, -5]), { ...options, pointsPerSpan: 8 })
    const [outline = []] = trace.segments
    expect(outline).toHaveLength(6 * 8 + 1)
    expect(outline.at(-1)).toEqual(outline[0])
    trace.lugs.forEach(({ x, y, deviation }, i) => {
      expect(outline[i * 8]?.x).toBeCloseTo(x, 9)
      expect(outline[i * 8]?.y).toBeCloseTo(y, 9)
      expect(Math.hypot(x, y)).toBeCloseTo(100 + 0.5 * deviation, 9)
    })
  })

  it('a high lug pushes outwards where it stands: lug 1 of six is right of the badge at the top', () => {
    const [first] = traceOutline(lugs([20, 0, 0, 0, 0, 0]), options).lugs
    expect(first?.x).toBeCloseTo(110 * 0.5, 9)
    expect(first?.y).toBeCloseTo(-110 * (Math.sqrt(3) / 2), 9)
  })

  it('never leaves the span of the two readings it joins: no bump that nobody measured', () => {
    const off = fc.double({ min: -45, max: 45, noNaN: true })
    fc.assert(
      fc.property(fc.array(off, { minLength: 4, maxLength: 12 }), (deviations) => {
        const [outline = []] = traceOutline(lugs(deviations), { ...options, pointsPerSpan: 10 }).segments
        outline.slice(0, -1).forEach((point, p) => {
          const from = deviations[Math.floor(p / 10)] ?? 0
          const to = deviations[(Math.floor(p / 10) + 1) % deviations.length] ?? 0
          expect(radius(point)).toBeGreaterThanOrEqual(100 + 0.5 * Math.min(from, to) - 1e-9)
          expect(radius(point)).toBeLessThanOrEqual(100 + 0.5 * Math.max(from, to) + 1e-9)
        })
      }),
    )
  })

  it('is smooth: the outline has no corner at a lug, nor at the join', () => {
    const fine = 64
    const [outline = []] = traceOutline(lugs([10, 4, -12, 0, 18, 14]), { ...options, pointsPerSpan: fine }).segments
    const ring = outline.slice(0, -1)
    const heading = (i: number) => {
      const [from, to] = [ring[i % ring.length], ring[(i + 1) % ring.length]]
      return Math.atan2((to?.y ?? 0) - (from?.y ?? 0), (to?.x ?? 0) - (from?.x ?? 0))
    }
    ring.forEach((_, i) => {
      const turn = Math.atan2(Math.sin(heading(i + 1) - heading(i)), Math.cos(heading(i + 1) - heading(i)))
      // A circle turns 2π/(6·64) = 0.016 rad a step; a corner of a polygon through these lugs would turn by 1 rad.
      expect(Math.abs(turn)).toBeLessThan(0.06)
    })
  })

  it('turning the head turns the outline: it depends on no lug being the first', () => {
    const deviations = [10, -20, 3, 30, 5, -5]
    const [outline = []] = traceOutline(lugs(deviations), options).segments
    const [turned = []] = traceOutline(lugs([...deviations.slice(1), 10]), options).segments
    const radii = (points: TracePoint[]) => points.slice(0, -1).map(radius)
    const expected = [...radii(outline).slice(12), ...radii(outline).slice(0, 12)]
    expect(turned).toHaveLength(outline.length)
    radii(turned).forEach((value, i) => expect(value).toBeCloseTo(expected[i] ?? Number.NaN, 9))
  })

  it('a mirror head draws the mirror outline', () => {
    const deviations = [10, -20, 3, 30, 5, -5]
    const [outline = []] = traceOutline(lugs(deviations), options).segments
    const [mirrored = []] = traceOutline(lugs([...deviations].reverse()), options).segments
    for (const { x, y } of outline) {
      const nearest = Math.min(...mirrored.map((point) => Math.hypot(point.x + x, point.y - y)))
      expect(nearest).toBeLessThan(1e-9)
    }
  })

  it('a missing lug leaves a gap from the lug before to the lug after', () => {
    const trace = traceOutline(lugs([0, 0, null, 0, 0, 0]), { ...options, pointsPerSpan: 4 })
    expect(trace).toMatchObject({ closed: false, missing: [3] })
    expect(trace.segments).toHaveLength(1)
    const [outline = []] = trace.segments
    // Round from lug 4 over 5, 6, 1 to lug 2: four spans.
    expect(outline).toHaveLength(4 * 4 + 1)
    const [, second, fourth] = trace.lugs
    expect(outline[0]?.x).toBeCloseTo(fourth?.x ?? Number.NaN, 9)
    expect(outline.at(-1)?.x).toBeCloseTo(second?.x ?? Number.NaN, 9)
    expect(outline.at(-1)?.y).toBeCloseTo(second?.y ?? Number.NaN, 9)
  })

  it('a lone lug among missing ones is a mark without an outline; none read draws nothing', () => {
    const lone = traceOutline(lugs([null, 5, null, 5, 6, null]), options)
    expect(lone.segments).toHaveLength(1)
    expect(lone.lugs.map(({ lug }) => lug)).toEqual([2, 4, 5])
    expect(traceOutline(lugs([null, null, null, null]), options)).toMatchObject({
      closed: false,
      segments: [],
      lugs: [],
    })
  })

  it('clamps what is far off, and says so', () => {
    const trace = traceOutline(lugs([1000, -1000, 0, 0]), { ...options, clampShare: 0.2 })
    expect(trace.lugs.map(({ clamped }) => clamped)).toEqual([true, true, false, false])
    for (const point of trace.segments[0] ?? []) {
      expect(radius(point)).toBeGreaterThanOrEqual(80 - 1e-9)
      expect(radius(point)).toBeLessThanOrEqual(120 + 1e-9)
    }
  })

  it.each<[string, () => unknown]>([
    ['lugs', () => traceOutline(lugs([0, 0, 0, 0]).slice(2), options)],
    ['seenRad', () => traceOutline(lugs([0, 0, 0, 0]).reverse(), options)],
    [
      'seenRad',
      () =>
        traceOutline(
          [0, 1, 2, 7].map((seenRad, i) => ({ lug: i + 1, seenRad, deviation: 0 })),
          options,
        ),
    ],
    ['deviation', () => traceOutline(lugs([0, Number.NaN, 0, 0]), options)],
    ['radiusPerUnit', () => traceOutline(lugs([0, 0, 0, 0]), { radiusPerUnit: -1 })],
    ['clampShare', () => traceOutline(lugs([0, 0, 0, 0]), { radiusPerUnit: 1, clampShare: 1 })],
  ])('refuses nonsense, naming %s', (field, act) => {
    expect(act).toThrow(expect.objectContaining({ field }))
  })
})
