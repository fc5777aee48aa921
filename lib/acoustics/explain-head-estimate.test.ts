import { describe, expect, it } from 'vitest'
import { explainHeadEstimate } from './explain-head-estimate'
import { headEstimate } from './head-estimate'
import type { HeadEstimateInput } from './head-estimate'

const tom: HeadEstimateInput = {
  ...{
    diameterM: 0.3048,
    plyMils: [10],
    coatingKgPerM2: 0.02,
    noteHz: 146.8324,
    lugs: 6,
    role: 'tom',
    temperatureC: 25,
  },
}

/** The stated formulas worked out afresh from the stated inputs. */
const BY_HAND: Record<string, (given: Record<string, number>) => number> = {
  'areal-density': (g) => g['ρ(PET)']! * g['h']! + g['σc']!,
  'air-density': (g) => (1.2041 * 293.15) / (273.15 + g['t']!),
  'moving-density': (g) => g['σ']! + g['β0']! * g['ρ']! * g['a']!,
  tension: (g) => g['σ0']! * ((2 * Math.PI * g['a']! * g['f01']!) / g['j01']!) ** 2,
  tap: (g) =>
    g['f01']! *
    (g['j11']! / g['j01']!) *
    Math.sqrt((g['σ']! + g['β0']! * g['ρ']! * g['a']!) / (g['σ']! + g['β1']! * g['ρ']! * g['a']!)),
  'rod-pull': (g) => (2 * Math.PI * g['a']! * g['T']!) / g['N']!,
  torque: (g) => g['K']! * g['d']! * g['F']!,
  'film-stress': (g) => g['T']! / g['h']!,
  range: (g) => Math.log(g['T']! / g['Tslack']!) / Math.log(g['Tchoked']! / g['Tslack']!),
}

describe('why these numbers', () => {
  it.each(explainHeadEstimate(tom).map((figure) => [figure.id, figure] as const))(
    '%s: the formula, fed with the inputs shown, gives the value shown',
    (id, figure) => {
      const given = Object.fromEntries(figure.inputs.map(({ symbol, value }) => [symbol, value]))
      expect(BY_HAND[id]?.(given)).toBeCloseTo(figure.value, 9)
      expect(figure.source).not.toBe('')
    },
  )

  it('shows the same figures as the estimate', () => {
    const estimate = headEstimate(tom)
    const shown = Object.fromEntries(explainHeadEstimate(tom).map(({ id, value }) => [id, value]))
    expect(shown).toMatchObject({
      tension: estimate.tensionNPerM,
      tap: estimate.tapHz,
      'rod-pull': estimate.rodPullN,
      torque: estimate.torqueNm.nominalNm,
      'film-stress': estimate.filmStressPa,
      range: estimate.rangePosition.fraction,
    })
  })

  it('says when the tap was measured', () => {
    const tap = explainHeadEstimate({ ...tom, measuredTapRatio: 1.7 }).find(({ id }) => id === 'tap')
    expect(tap).toMatchObject({ mark: 'measured', formula: 'f11 = r·f01' })
  })
})
