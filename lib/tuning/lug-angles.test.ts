import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evenLugAngles, lugsFacing } from './lug-angles'

describe('lug 1 is the first lug clockwise from the badge, facing the head', () => {
  it('six even lugs: batter lug 1 stands 30° clockwise of the badge, right of it', () => {
    const [first] = lugsFacing('batter', evenLugAngles(6))
    expect(first).toMatchObject({ lug: 1 })
    expect(first?.seenRad).toBeCloseTo(Math.PI / 6, 12)
    expect(first?.x).toBeCloseTo(0.5, 12)
    expect(first?.y).toBeCloseTo(-Math.sqrt(3) / 2, 12)
  })

  it('the resonant head mirrors it: its lug 1 is the batter’s last', () => {
    const angles = [0.2, 1.5, 2.5, 4, 5.5]
    const [batter, resonant] = [lugsFacing('batter', angles), lugsFacing('resonant', angles)]
    expect(resonant.map(({ shellRad }) => shellRad)).toEqual([5.5, 4, 2.5, 1.5, 0.2])
    expect(resonant[0]?.seenRad).toBeCloseTo(2 * Math.PI - 5.5, 12)
    expect(batter.at(-1)?.shellRad).toBe(resonant[0]?.shellRad)
  })

  it('a through lug is seen in mirror places from the two sides', () => {
    fc.assert(
      fc.property(fc.integer({ min: 4, max: 12 }), fc.double({ min: -0.2, max: 0.2, noNaN: true }), (lugs, turned) => {
        const angles = evenLugAngles(lugs).map((angle) => angle + turned)
        const resonant = new Map(lugsFacing('resonant', angles).map((lug) => [lug.shellRad, lug]))
        for (const lug of lugsFacing('batter', angles)) {
          expect(resonant.get(lug.shellRad)?.x).toBeCloseTo(-lug.x, 12)
          expect(resonant.get(lug.shellRad)?.y).toBeCloseTo(lug.y, 12)
          expect(resonant.get(lug.shellRad)?.lug).toBe(lugs + 1 - lug.lug)
        }
      }),
    )
  })

  it('a lug at the badge is lug 1 on both heads', () => {
    const angles = [0, Math.PI / 2, Math.PI, (3 * Math.PI) / 2]
    expect(lugsFacing('batter', angles)[0]?.shellRad).toBe(0)
    expect(lugsFacing('resonant', angles)[0]?.shellRad).toBe(0)
  })

  it('does not care about order or whole turns', () => {
    const angles = [5.5, 0.2 + 2 * Math.PI, 1.5, 4 - 2 * Math.PI, 2.5]
    expect(lugsFacing('batter', angles).map(({ seenRad }) => Number(seenRad.toFixed(9)))).toEqual([
      0.2, 1.5, 2.5, 4, 5.5,
    ])
  })

  it.each([[[1, 2, 3]], [[1, 2, 3, Number.NaN]], [[1, 1.01, 3, 4]], [[0.01, 2, 4, 2 * Math.PI - 0.01]]])(
    'refuses %j',
    (angles) => {
      expect(() => lugsFacing('batter', angles)).toThrow(expect.objectContaining({ field: 'shellAnglesRad' }))
    },
  )
})
