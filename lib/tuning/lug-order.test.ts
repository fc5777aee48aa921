import { describe, expect, it } from 'vitest'
import { lugOrder } from './lug-order'

const COUNTS = [4, 5, 6, 7, 8, 9, 10, 11, 12]

describe('lug order (common practice)', () => {
  it.each([
    [4, [1, 3, 2, 4]],
    [5, [1, 3, 5, 2, 4]],
    [6, [1, 4, 2, 5, 3, 6]],
    [8, [1, 5, 2, 6, 3, 7, 4, 8]],
    [10, [1, 6, 2, 7, 3, 8, 4, 9, 5, 10]],
  ])('%i lugs: %j', (lugs, order) => {
    expect(lugOrder(lugs)).toEqual(order)
  })

  it.each(COUNTS)('%i lugs: every lug once, lug 1 first', (lugs) => {
    const order = lugOrder(lugs)
    expect(order[0]).toBe(1)
    expect([...order].sort((a, b) => a - b)).toEqual(Array.from({ length: lugs }, (_, i) => i + 1))
  })

  it.each(COUNTS)('%i lugs: each next lug is opposite the last, or beside the opposite', (lugs) => {
    const order = lugOrder(lugs)
    order.slice(1).forEach((lug, i) => {
      const steps = Math.abs(lug - (order[i] ?? Number.NaN))
      const roundTheHead = Math.min(steps, lugs - steps)
      expect(lugs / 2 - roundTheHead).toBeLessThanOrEqual(1)
    })
  })

  it.each([3, 13, 6.5, Number.NaN, -6])('refuses %f lugs', (lugs) => {
    expect(() => lugOrder(lugs)).toThrow(expect.objectContaining({ field: 'lugs' }))
  })
})
