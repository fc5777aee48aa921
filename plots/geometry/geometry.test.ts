import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { headingDeg, normaliseDeg, turnClockwise } from './angle'
import { boundsOverlap, boundsUnion } from './bounds'
import { footprintBounds, footprintContains, footprintsOverlap, rectCorners, type CircleFootprint } from './footprint'
import { largestScaleThatFits, PAPER_SCALES, paperMm } from './paper'
import { distanceM, plotPoint, screenPoint } from './point'
import { tangentCentre, tangentCentresOfTwo } from './tangent'
import { fitView, toPlot, toScreen, zoomAt } from './view'

const metres = fc.double({ min: -100, max: 100, noNaN: true })
const degrees = fc.double({ min: -1e4, max: 1e4, noNaN: true })
const circle = (xM: number, yM: number, radiusM: number): CircleFootprint => ({
  shape: 'circle',
  centre: plotPoint(xM, yM),
  radiusM,
})

describe('orientation', () => {
  const view = { pxPerM: 100, originXPx: 500, originYPx: 600 }

  it('draws stage left on the right of the sheet and upstage at the top', () => {
    expect(toScreen(view, plotPoint(1, 0))).toEqual({ xPx: 600, yPx: 600 })
    expect(toScreen(view, plotPoint(0, 1))).toEqual({ xPx: 500, yPx: 500 })
  })

  it('turns a piece that faces the audience a quarter clockwise to face stage right', () => {
    const turned = turnClockwise(plotPoint(0, -1), 90)
    expect(turned.xM).toBeCloseTo(-1, 12)
    expect(turned.yM).toBeCloseTo(0, 12)
    expect(headingDeg(plotPoint(0, 0), plotPoint(0, -3))).toBe(0)
    expect(headingDeg(plotPoint(0, 0), plotPoint(-3, 0))).toBeCloseTo(90, 10)
    expect(headingDeg(plotPoint(0, 0), plotPoint(0, 3))).toBeCloseTo(180, 10)
    expect(headingDeg(plotPoint(0, 0), plotPoint(3, 0))).toBeCloseTo(270, 10)
  })

  it('goes from plot to screen and back to the same place', () => {
    fc.assert(
      fc.property(metres, metres, fc.double({ min: 4, max: 1200, noNaN: true }), (x, y, pxPerM) => {
        const there = { ...view, pxPerM }
        const back = toPlot(there, toScreen(there, plotPoint(x, y)))
        expect(back.xM).toBeCloseTo(x, 9)
        expect(back.yM).toBeCloseTo(y, 9)
      }),
    )
  })

  it('keeps the place under the pointer while zooming', () => {
    const at = screenPoint(321, 222)
    const before = toPlot(view, at)
    const after = toPlot(zoomAt(view, at, 1.7), at)
    expect(distanceM(before, after)).toBeLessThan(1e-9)
  })

  it('fits a stage inside the window, margin kept', () => {
    const fitted = fitView({ minXM: -6, maxXM: 6, minYM: 0, maxYM: 8 }, 1000, 700, 50)
    const topLeft = toScreen(fitted, plotPoint(-6, 8))
    const bottomRight = toScreen(fitted, plotPoint(6, 0))
    expect(topLeft.xPx).toBeGreaterThanOrEqual(50 - 1e-9)
    expect(topLeft.yPx).toBeGreaterThanOrEqual(50 - 1e-9)
    expect(bottomRight.xPx).toBeLessThanOrEqual(950 + 1e-9)
    expect(bottomRight.yPx).toBeLessThanOrEqual(650 + 1e-9)
  })
})

describe('angles', () => {
  it('folds every angle into [0, 360) without changing its direction', () => {
    fc.assert(
      fc.property(degrees, (angle) => {
        const folded = normaliseDeg(angle)
        expect(folded).toBeGreaterThanOrEqual(0)
        expect(folded).toBeLessThan(360)
        expect(Math.cos((folded * Math.PI) / 180)).toBeCloseTo(Math.cos((angle * Math.PI) / 180), 8)
      }),
    )
    expect(() => normaliseDeg(Number.NaN)).toThrow(RangeError)
  })

  it('turning keeps distances and turning back returns', () => {
    fc.assert(
      fc.property(metres, metres, degrees, (x, y, angle) => {
        const about = plotPoint(1.5, -2)
        const turned = turnClockwise(plotPoint(x, y), angle, about)
        expect(distanceM(turned, about)).toBeCloseTo(distanceM(plotPoint(x, y), about), 8)
        const back = turnClockwise(turned, -angle, about)
        expect(distanceM(back, plotPoint(x, y))).toBeLessThan(1e-8)
      }),
    )
  })
})

describe('footprints', () => {
  it('a rectangle turned a quarter swaps its sides', () => {
    const box = footprintBounds({ shape: 'rect', centre: plotPoint(1, 2), widthM: 3, depthM: 1, rotationDeg: 90 })
    expect(box.maxXM - box.minXM).toBeCloseTo(1, 12)
    expect(box.maxYM - box.minYM).toBeCloseTo(3, 12)
  })

  it('a unit square turned 45° spans its diagonal, √2', () => {
    const box = footprintBounds({ shape: 'rect', centre: plotPoint(0, 0), widthM: 1, depthM: 1, rotationDeg: 45 })
    expect(box.maxXM - box.minXM).toBeCloseTo(Math.SQRT2, 12)
  })

  it('holds its own corners and centre and nothing a millimetre outside', () => {
    const rect = { shape: 'rect', centre: plotPoint(0, 0), widthM: 2, depthM: 1, rotationDeg: 30 } as const
    for (const corner of rectCorners(rect)) expect(footprintContains(rect, corner, 1e-9)).toBe(true)
    expect(footprintContains(rect, turnClockwise(plotPoint(1.001, 0), 30))).toBe(false)
    expect(footprintContains(rect, turnClockwise(plotPoint(1.001, 0), 30), 0.01)).toBe(true)
    expect(footprintContains(circle(0, 0, 0.5), plotPoint(0.5, 0))).toBe(true)
  })

  it('touching is not overlapping, a millimetre closer is', () => {
    expect(footprintsOverlap(circle(0, 0, 1), circle(2, 0, 1))).toBe(false)
    expect(footprintsOverlap(circle(0, 0, 1), circle(1.999, 0, 1))).toBe(true)
    const riser = { shape: 'rect', centre: plotPoint(0, 0), widthM: 2, depthM: 2, rotationDeg: 0 } as const
    expect(footprintsOverlap(riser, { ...riser, centre: plotPoint(2, 0) })).toBe(false)
    expect(footprintsOverlap(riser, { ...riser, centre: plotPoint(1.999, 0) })).toBe(true)
    expect(footprintsOverlap(riser, circle(1.4, 0, 0.5))).toBe(true)
    expect(footprintsOverlap(circle(1.4, 0, 0.5), riser)).toBe(true)
    // At the corner a circle clears a box by the diagonal, although their upright boxes overlap.
    expect(footprintsOverlap(circle(1.4, 1.4, 0.5), riser)).toBe(false)
    // Two squares corner to corner, one turned 45°: their boxes overlap, they do not.
    expect(footprintsOverlap(riser, { ...riser, centre: plotPoint(2.3, 0.9), rotationDeg: 45 })).toBe(true)
    expect(footprintsOverlap(riser, { ...riser, centre: plotPoint(1.9, 1.9), rotationDeg: 45 })).toBe(false)
  })

  it('overlap does not depend on the order', () => {
    const footprint = fc.record({
      shape: fc.constant('rect' as const),
      centre: fc.record({
        xM: fc.double({ min: -2, max: 2, noNaN: true }),
        yM: fc.double({ min: -2, max: 2, noNaN: true }),
      }),
      widthM: fc.double({ min: 0.1, max: 3, noNaN: true }),
      depthM: fc.double({ min: 0.1, max: 3, noNaN: true }),
      rotationDeg: fc.double({ min: 0, max: 359, noNaN: true }),
    })
    fc.assert(fc.property(footprint, footprint, (a, b) => footprintsOverlap(a, b) === footprintsOverlap(b, a)))
  })

  it('joins and compares boxes', () => {
    const a = { minXM: 0, minYM: 0, maxXM: 1, maxYM: 1 }
    const b = { minXM: 1, minYM: 0, maxXM: 2, maxYM: 3 }
    expect(boundsOverlap(a, b)).toBe(false)
    expect(boundsUnion([a, b])).toEqual({ minXM: 0, minYM: 0, maxXM: 2, maxYM: 3 })
    expect(boundsUnion([])).toBeNull()
  })
})

describe('touching circles', () => {
  it('three equal circles that touch have their centres on an equilateral triangle', () => {
    const points = tangentCentresOfTwo(circle(0, 0, 1), circle(2, 0, 1), 1)
    expect(points).toHaveLength(2)
    const ups = points.map((point) => point.yM).sort((a, b) => a - b)
    expect(ups[0]).toBeCloseTo(-Math.sqrt(3), 12)
    expect(ups[1]).toBeCloseTo(Math.sqrt(3), 12)
  })

  it('sides 3, 4, 5: radii 1, 2 and 3 meet at a right angle', () => {
    const points = tangentCentresOfTwo(circle(0, 0, 1), circle(3, 0, 2), 3)
    expect(points.map((point) => Math.abs(point.yM))).toEqual([expect.closeTo(4, 12), expect.closeTo(4, 12)])
    expect(points.map((point) => point.xM)).toEqual([expect.closeTo(0, 12), expect.closeTo(0, 12)])
  })

  it('every centre it gives touches both circles', () => {
    const radius = fc.double({ min: 0.05, max: 1, noNaN: true })
    fc.assert(
      fc.property(
        metres,
        metres,
        radius,
        radius,
        radius,
        fc.double({ min: 0.01, max: 2, noNaN: true }),
        (x, y, a, b, r, gap) => {
          const first = circle(x, y, a)
          const second = circle(x + a + b + gap, y, b)
          for (const point of tangentCentresOfTwo(first, second, r)) {
            expect(distanceM(point, first.centre)).toBeCloseTo(a + r, 8)
            expect(distanceM(point, second.centre)).toBeCloseTo(b + r, 8)
          }
        },
      ),
    )
  })

  it('gives none when the gap is wider than the circle', () => {
    expect(tangentCentresOfTwo(circle(0, 0, 1), circle(10, 0, 1), 1)).toEqual([])
    expect(tangentCentresOfTwo(circle(0, 0, 1), circle(0, 0, 1), 1)).toEqual([])
  })

  it('touches one circle on the side it comes from', () => {
    expect(tangentCentre(circle(0, 0, 0.2), 0.1, plotPoint(5, 0))).toEqual({ xM: expect.closeTo(0.3, 12), yM: 0 })
    expect(tangentCentre(circle(0, 0, 0.2), 0.1, plotPoint(0, 0)).yM).toBeCloseTo(0.3, 12)
  })
})

describe('paper', () => {
  it('an 8 ft riser (2.4384 m) is 50.8 mm at 1:48 and 48.768 mm at 1:50', () => {
    expect(paperMm(2.4384, 48)).toBeCloseTo(50.8, 9)
    expect(paperMm(2.4384, 50)).toBeCloseTo(48.768, 9)
  })

  it('takes the largest scale that fits the box', () => {
    const a4Landscape = { widthMm: 277, heightMm: 170 }
    expect(largestScaleThatFits({ widthM: 12, depthM: 8 }, a4Landscape, PAPER_SCALES.metric)).toBe(50)
    expect(largestScaleThatFits({ widthM: 16, depthM: 8 }, a4Landscape, PAPER_SCALES.metric)).toBe(100)
    expect(largestScaleThatFits({ widthM: 12, depthM: 8 }, a4Landscape, PAPER_SCALES.imperial)).toBe(48)
    expect(largestScaleThatFits({ widthM: 60, depthM: 8 }, a4Landscape, PAPER_SCALES.metric)).toBeNull()
    expect(() => paperMm(1, 0)).toThrow(RangeError)
  })
})
