import { describe, expect, it } from 'vitest'
import { believe } from './next-move-belief'
import type { BeliefPrior, Hypothesis } from './next-move-belief'

const only: Hypothesis = {
  shares: [0.7, 0.1, 0.1, 0.1],
  handError: 0,
  lostTurns: 0,
  restlessness: 0,
  restless: false,
  weight: 1,
}
const prior: BeliefPrior = {
  lugs: 4,
  hypotheses: [only],
  gain: { value: 20, spread: 0.3 },
  level: { value: 70, spread: 0 },
  rods: 0,
  seat: 2,
}
const read = (lug: number, value: number, noise = 1) => ({ kind: 'read' as const, lug, value, noise, doubtful: false })

describe('belief over the lugs', () => {
  it('weighs prior and readings by their precision (derived: Gaussian of variance 4, two readings of variance 1)', () => {
    const { mean, covariance } = believe(prior, [read(0, 73), read(0, 74)])
    expect(mean[0]).toBeCloseTo((70 / 4 + 73 + 74) / (1 / 4 + 2), 9)
    expect(covariance[0]![0]).toBeCloseTo(1 / (1 / 4 + 2), 9)
    expect(mean[1]).toBeCloseTo(70, 9)
  })

  it('moves the lugs by gain and shares, and learns the gain from what a turn did (derived: Kalman by hand)', () => {
    const turned = believe({ ...prior, seat: 1e-6 }, [{ kind: 'turn', turns: [0.25, 0, 0, 0] }])
    expect(turned.mean[0]).toBeCloseTo(70 + 20 * 0.7 * 0.25, 9)
    expect(turned.mean[2]).toBeCloseTo(70 + 20 * 0.1 * 0.25, 9)
    const learned = believe({ ...prior, seat: 1e-6 }, [{ kind: 'turn', turns: [0.25, 0, 0, 0] }, read(0, 75)])
    // Change per unit of gain 0.175, gain 20 ± 6: prior variance of the reading 1.1025, noise 1.
    expect(learned.gain).toBeCloseTo(20 + ((36 * 0.175) / (1.1025 + 1)) * (75 - 73.5), 6)
  })

  it('gives the weight to the hypothesis that foretold the reading (derived: Bayes with equal variances)', () => {
    const restless: Hypothesis = { ...only, shares: [0.1, 0.1, 0.1, 0.7], restless: true, weight: 0.5 }
    const of = {
      ...prior,
      seat: 1e-6,
      gain: { value: 20, spread: 1e-6 },
      hypotheses: [{ ...only, weight: 0.5 }, restless],
    }
    const { doubt } = believe(of, [{ kind: 'turn', turns: [0.25, 0, 0, 0] }, read(0, 73.5)])
    // Foretold 73.5 and 70.5: odds exp(−(3² − 0²)/2).
    expect(doubt).toBeCloseTo(1 / (1 + Math.exp(4.5)), 6)
  })
})
