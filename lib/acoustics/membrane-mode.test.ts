import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { idealModeHz, idealTensionNPerM } from './membrane-mode'

const TEN_MIL = 0.35306
const TWELVE_IN = 12 * 0.0254
const mode = fc.record({ m: fc.integer({ min: 0, max: 4 }), n: fc.integer({ min: 1, max: 3 }) })
const head = fc.record({
  diameterM: fc.double({ min: 0.15, max: 0.35, noNaN: true }),
  arealDensityKgPerM2: fc.double({ min: 0.1, max: 0.8, noNaN: true }),
})
const tension = fc.double({ min: 300, max: 9000, noNaN: true })

describe('ideal membrane (A&S 9.5, DLMF 10.21; figures derived)', () => {
  it('12 in, 10 mil, 2000 N/m: f01 189.0208 and f11 301.1744 Hz', () => {
    const given = { diameterM: TWELVE_IN, arealDensityKgPerM2: TEN_MIL, tensionNPerM: 2000 }
    expect(idealModeHz({ m: 0, n: 1 }, given)).toBeCloseTo(189.0208, 4)
    expect(idealModeHz({ m: 1, n: 1 }, given)).toBeCloseTo(301.1744, 4)
  })

  it('22 in, 10 mil, 1500 N/m: 89.2891 Hz', () => {
    const given = { diameterM: 22 * 0.0254, arealDensityKgPerM2: TEN_MIL, tensionNPerM: 1500 }
    expect(idealModeHz({ m: 0, n: 1 }, given)).toBeCloseTo(89.2891, 4)
  })

  it('12 in, 10 mil at 100 Hz needs 559.772 N/m', () => {
    const bare = { diameterM: TWELVE_IN, arealDensityKgPerM2: TEN_MIL }
    expect(idealTensionNPerM({ m: 0, n: 1 }, 100, bare)).toBeCloseTo(559.772, 3)
  })

  it('round trip: tension to frequency and back', () => {
    fc.assert(
      fc.property(mode, head, tension, (shape, bare, tensionNPerM) => {
        const hz = idealModeHz(shape, { ...bare, tensionNPerM })
        fc.pre(hz < 5000)
        expect(idealTensionNPerM(shape, hz, bare) / tensionNPerM).toBeCloseTo(1, 11)
      }),
    )
  })

  it('scales as √T, 1/a and 1/√σ', () => {
    fc.assert(
      fc.property(
        mode,
        head,
        tension,
        fc.double({ min: 1.1, max: 2, noNaN: true }),
        (shape, bare, tensionNPerM, by) => {
          const hz = idealModeHz(shape, { ...bare, tensionNPerM })
          expect(idealModeHz(shape, { ...bare, tensionNPerM: tensionNPerM * by }) / hz).toBeCloseTo(Math.sqrt(by), 11)
          expect(idealModeHz(shape, { ...bare, tensionNPerM, diameterM: bare.diameterM * by }) / hz).toBeCloseTo(
            1 / by,
            11,
          )
          const heavier = { ...bare, arealDensityKgPerM2: bare.arealDensityKgPerM2 * by }
          expect(idealModeHz(shape, { ...heavier, tensionNPerM }) / hz).toBeCloseTo(1 / Math.sqrt(by), 11)
        },
      ),
    )
  })

  it.each([
    ['diameterM', { diameterM: 12, arealDensityKgPerM2: TEN_MIL, tensionNPerM: 2000 }],
    ['diameterM', { diameterM: 0, arealDensityKgPerM2: TEN_MIL, tensionNPerM: 2000 }],
    ['arealDensityKgPerM2', { diameterM: TWELVE_IN, arealDensityKgPerM2: 0, tensionNPerM: 2000 }],
    ['tensionNPerM', { diameterM: TWELVE_IN, arealDensityKgPerM2: TEN_MIL, tensionNPerM: -1 }],
    ['tensionNPerM', { diameterM: TWELVE_IN, arealDensityKgPerM2: TEN_MIL, tensionNPerM: Number.NaN }],
  ])('refuses nonsense, naming %s', (field, given) => {
    expect(() => idealModeHz({ m: 0, n: 1 }, given)).toThrow(expect.objectContaining({ field }))
  })

  it('says that inches or millimetres were passed as metres', () => {
    const bare = { arealDensityKgPerM2: TEN_MIL, tensionNPerM: 2000 }
    expect(() => idealModeHz({ m: 0, n: 1 }, { ...bare, diameterM: 12 })).toThrow('12 in is 0.3048 m')
    expect(() => idealModeHz({ m: 0, n: 1 }, { ...bare, diameterM: 305 })).toThrow('305 mm is 0.305 m')
  })
})
