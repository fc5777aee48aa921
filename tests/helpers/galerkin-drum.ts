import type { HeadPair } from '@/lib/acoustics/head-pair'
import { generalisedEigenvalues } from './symmetric-matrix'

/** Published zeros of J0, Abramowitz & Stegun table 9.5; McMahon's expansion beyond (A&S 9.5.12), good to 1e-7 from the fourth on. */
const FIRST_ZEROS = [2.404825557696, 5.520078110286, 8.653727912911]

function zero(n: number): number {
  const b = 8 * (n - 1 / 4) * Math.PI
  return FIRST_ZEROS[n - 1] ?? b / 8 + 1 / b - 124 / (3 * b ** 3) + 120_928 / (15 * b ** 5)
}

/**
 * Symmetric frequencies in Hz, rising, of two heads on one shell by Galerkin's method: either head in `terms` of its own shapes
 * J0(j_0n·r/a), the air's spring a rank-one stiffness on the swept volume, a dense eigenvalue problem. The normalised shape sweeps
 * 2·√π·a/j_0n, so no Bessel function is evaluated.
 */
export function galerkinDrumHz(drum: HeadPair, terms: number): number[] {
  const { radiusM, depthM, tensionNPerM, massKgPerM2, crossMassKgPerM2 } = drum
  const zeros = Array.from({ length: terms }, (_, i) => zero(i + 1))
  const spring = (1.4 * 101_325) / (Math.PI * radiusM ** 2 * depthM)
  const basis = ([0, 1] as const).flatMap((head) =>
    zeros.map((j, term) => ({ head, term, j, sweep: ((head === 0 ? 1 : -1) * 2 * Math.sqrt(Math.PI) * radiusM) / j })),
  )
  const stiffness = basis.map((one, i) =>
    basis.map(
      (other, k) => (i === k ? tensionNPerM[one.head] * (one.j / radiusM) ** 2 : 0) + spring * one.sweep * other.sweep,
    ),
  )
  const mass = basis.map((one) =>
    basis.map((other) =>
      one.term !== other.term ? 0 : one.head === other.head ? massKgPerM2[one.head] : crossMassKgPerM2,
    ),
  )
  return generalisedEigenvalues(stiffness, mass).map((square) => Math.sqrt(square) / (2 * Math.PI))
}

/** The n-th frequency in the limit of many terms: the error falls as 1/terms³, so two sizes give the rest (Richardson). */
export function galerkinLimitHz(drum: HeadPair, index: number, terms: number): number {
  const [coarse = Number.NaN, fine = Number.NaN] = [terms, 2 * terms].map((count) => galerkinDrumHz(drum, count)[index])
  return fine + (fine - coarse) / 7
}
