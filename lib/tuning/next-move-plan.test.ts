import { describe, expect, it } from 'vitest'
import { outChance } from './next-move-out-chance'
import { facingLugs } from './next-move-plan'
import { sparseCorrections } from './next-move-sparse'

describe('chance of being out', () => {
  it.each([
    [1, 0.3173105],
    [1.959964, 0.05],
    [2.575829, 0.01],
  ])('within %f deviations (published: Abramowitz & Stegun, table 26.1)', (deviations, outside) => {
    expect(outChance(0, 1, deviations)).toBeCloseTo(outside, 6)
  })

  it('counts both sides, and one when far out', () => {
    expect(outChance(5, 0.01, 1)).toBeCloseTo(1, 9)
    expect(outChance(1, 1e-6, 1)).toBeCloseTo(0.5, 6)
  })
})

describe('facing lugs', () => {
  it('is the opposite of an even count, the two nearest to opposite of an odd one, and mutual', () => {
    expect(facingLugs(1, 8)).toEqual([5])
    expect(facingLugs(0, 5)).toEqual([2, 3])
    for (let lugs = 4; lugs <= 12; lugs++) {
      for (let lug = 0; lug < lugs; lug++) {
        for (const facing of facingLugs(lug, lugs)) expect(facingLugs(facing, lugs)).toContain(lug)
      }
    }
  })
})

describe('sparse corrections', () => {
  it('finds the one lug that was turned, and by how much (derived: readings made by that turn alone)', () => {
    const shares = [0.5, -0.1, 0.05, 0.2, 0.05, -0.1]
    const off = Float64Array.from({ length: 6 }, (_, i) => 20 * 0.25 * shares[(i - 2 + 6) % 6]!)
    const [first] = sparseCorrections({ off, shares, gain: 20, frozen: new Set() })
    expect(first?.[2]).toBeCloseTo(-0.25, 12)
    expect(first?.filter((turn) => turn !== 0)).toHaveLength(1)
  })

  it('leaves frozen lugs alone', () => {
    const shares = [0.5, -0.1, 0.05, 0.2, 0.05, -0.1]
    const off = Float64Array.from([3, -1, 0, 2, -1, -3])
    for (const turns of sparseCorrections({ off, shares, gain: 20, frozen: new Set([0, 3]) })) {
      expect([turns[0], turns[3]]).toEqual([0, 0])
    }
  })
})
