import { describe, expect, it } from 'vitest'
import type { CircleFootprint, RectFootprint } from './footprint'
import { distanceM, plotPoint } from './point'
import { snapMove } from './snap'

const circle = (xM: number, yM: number, radiusM: number): CircleFootprint => ({
  shape: 'circle',
  centre: plotPoint(xM, yM),
  radiusM,
})
const rect = (xM: number, yM: number, widthM: number, depthM: number): RectFootprint => ({
  shape: 'rect',
  centre: plotPoint(xM, yM),
  widthM,
  depthM,
  rotationDeg: 0,
})

describe('snapping a moved piece', () => {
  it('takes the centre line before a nearer neighbour', () => {
    const snap = snapMove({ moving: rect(0.04, 3, 1, 1), others: [rect(0.05, 6, 0.5, 0.5)], gridM: null, reachM: 0.06 })
    expect(snap.point.xM).toBe(0)
    expect(snap.guides).toContainEqual({ kind: 'upright', xM: 0, why: 'centre line' })
  })

  it('lines up with a neighbour’s centre and edge', () => {
    const other = rect(2, 5, 1, 1)
    const centred = snapMove({ moving: rect(2.03, 3, 0.4, 0.4), others: [other], gridM: null, reachM: 0.05 })
    expect(centred.point).toEqual({ xM: 2, yM: 3 })
    const edged = snapMove({ moving: rect(2.72, 3, 0.4, 0.4), others: [other], gridM: null, reachM: 0.05 })
    expect(edged.point.xM).toBeCloseTo(2.7, 12)
    expect(edged.guides).toEqual([{ kind: 'upright', xM: 2.5, why: 'edge' }])
  })

  it('a drum near another comes to touch it', () => {
    const snap = snapMove({ moving: circle(0.34, 2, 0.15), others: [circle(0, 2, 0.17)], gridM: 0.25, reachM: 0.05 })
    expect(distanceM(snap.point, plotPoint(0, 2))).toBeCloseTo(0.32, 12)
    expect(snap.guides).toHaveLength(1)
  })

  it('a drum near two others comes to touch both', () => {
    const left = circle(-0.2, 2, 0.2)
    const right = circle(0.2, 2, 0.2)
    const snap = snapMove({ moving: circle(0.01, 2.33, 0.2), others: [left, right], gridM: null, reachM: 0.05 })
    expect(snap.point.xM).toBeCloseTo(0, 12)
    expect(snap.point.yM).toBeCloseTo(2 + 0.2 * Math.sqrt(3), 12)
    expect(snap.guides).toHaveLength(2)
  })

  it('falls back on the grid, and stands free without one', () => {
    const moving = rect(3.11, 4.09, 1, 1)
    expect(snapMove({ moving, others: [], gridM: 0.25, reachM: 0.02 }).point).toEqual({ xM: 3, yM: 4 })
    expect(snapMove({ moving, others: [], gridM: null, reachM: 0.02 })).toEqual({
      point: { xM: 3.11, yM: 4.09 },
      guides: [],
    })
  })

  it('puts a piece’s downstage side on the edge of the stage', () => {
    const snap = snapMove({ moving: rect(3, 0.28, 0.6, 0.5), others: [], gridM: null, reachM: 0.05 })
    expect(snap.point.yM).toBeCloseTo(0.25, 12)
  })
})
