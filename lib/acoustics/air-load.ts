import { besselJ, besselJZero } from './bessel-j'
import { requireWhole } from './require-quantity'

const INTEGRATION_END = 100
const INTERVALS = 4000
/** Nearer to the removable pole than this, the quotient is taken from its Taylor series instead. */
const POLE_WIDTH = 1e-4

const factors = new Map<number, number>()

/**
 * Air-load factor β_m of shape (m,1) with open air on both faces: the air moves as a mass β_m·ρ·a on each m² of film.
 * β_m = 2·∫₀^∞ W_m(k)² dk / ∫₀¹ J_m(jr)² r dr, W_m the Hankel transform of J_m(jr) on the unit disc. With j a zero
 * of J_m, W_m(k) = j·J_m′(j)·J_m(k)/(k² − j²) and the norm is J_m′(j)²/2 (DLMF 10.22.37, 10.22.38), so
 * β_m = 4j²·∫₀^∞ (J_m(k)/(k² − j²))² dk: Simpson's rule to k = 100, and J² ≈ 1/(πk) beyond.
 * Incompressible air and a one-term Rayleigh quotient: good while the head is small against the wavelength.
 * Worked out once and kept. Absolute error below 1e-6.
 * @throws AcousticsError m not a whole number 0 to 8
 */
export function airLoadFactor(m: number): number {
  requireWhole('m', m, { min: 0, max: 8, unit: '' })
  const known = factors.get(m)
  if (known !== undefined) return known
  const factor = integrate(m)
  factors.set(m, factor)
  return factor
}

function integrate(m: number): number {
  const j = besselJZero(m, 1)
  const slopeAtZero = -besselJ(m + 1, j)
  const quotient = (k: number) => {
    const off = k - j
    // Bessel's equation at a zero gives J″(j) = −J′(j)/j.
    const perOff = Math.abs(off) < POLE_WIDTH ? slopeAtZero * (1 - off / (2 * j)) : besselJ(m, k) / off
    return (perOff / (k + j)) ** 2
  }
  const step = INTEGRATION_END / INTERVALS
  let sum = quotient(0) + quotient(INTEGRATION_END)
  for (let i = 1; i < INTERVALS; i++) sum += (i % 2 === 1 ? 4 : 2) * quotient(i * step)
  const beyond = 1 / (4 * Math.PI * INTEGRATION_END ** 4)
  return 4 * j ** 2 * ((sum * step) / 3 + beyond)
}
