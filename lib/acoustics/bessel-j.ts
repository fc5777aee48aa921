import besselJ0 from '@stdlib/math-base-special-besselj0'
import besselJ1 from '@stdlib/math-base-special-besselj1'
import { requireQuantity, requireWhole } from './require-quantity'
import { risingRoot } from './rising-root'

const MAX_ORDER = 40
/** Below this the first term of the power series is exact to rounding. */
const SMALL_X = 1e-8

/**
 * Bessel function of the first kind J_m(x) of whole order, x from 0 to 10 000.
 * J0 and J1 come from the package; higher orders by the recurrence J_{k+1} = (2k/x)·J_k − J_{k−1} (DLMF 10.6.1):
 * upwards where that is stable (x > m), else downwards from a far higher order and normalised by
 * J_0 + 2·(J_2 + J_4 + …) = 1 (Miller's algorithm, DLMF 3.6(v)). Absolute error below 1e-14 for x up to 100.
 * @throws AcousticsError order not a whole number 0 to 40, x negative or not finite
 */
export function besselJ(order: number, x: number): number {
  requireWhole('order', order, { min: 0, max: MAX_ORDER, unit: '' })
  requireQuantity('x', x, { min: 0, max: 10_000, unit: '' })
  if (order === 0) return besselJ0(x)
  if (order === 1) return besselJ1(x)
  if (x < SMALL_X) return leadingTerm(order, x)
  return x > order ? upwards(order, x) : downwards(order, x)
}

/**
 * J2(x)/J0(x) = 2·J1(x)/(x·J0(x)) − 1, x > 0: how far a clamped film bulges under a pressure that swings. It rises from 0 and runs
 * from −∞ to +∞ between one zero of J0 and the next, for 2·J1/(x·J0) = 4·Σ 1/(j_0n² − x²). `x` is not checked: root finding asks it a
 * hundred times a drum.
 */
export function besselBulge(x: number): number {
  return (2 * besselJ1(x)) / (x * besselJ0(x)) - 1
}

/** (x/2)^m / m!, DLMF 10.2.2. */
function leadingTerm(order: number, x: number): number {
  let term = 1
  for (let k = 1; k <= order; k++) term *= x / 2 / k
  return term
}

function upwards(order: number, x: number): number {
  let lower = besselJ0(x)
  let here = besselJ1(x)
  for (let k = 1; k < order; k++) [lower, here] = [here, ((2 * k) / x) * here - lower]
  return here
}

function downwards(order: number, x: number): number {
  // Starting this far above makes the wrong start die out below rounding for every x ≤ order.
  const top = 2 * Math.ceil((order + Math.sqrt(160 * order) + 20) / 2)
  let upper = 0
  let here = 1e-300
  let wanted = 0
  let sum = 0
  for (let k = top; k > 0; k--) {
    ;[upper, here] = [here, ((2 * k) / x) * here - upper]
    if (Math.abs(here) > 1e200) {
      here *= 1e-200
      upper *= 1e-200
      wanted *= 1e-200
      sum *= 1e-200
    }
    if (k - 1 === order) wanted = here
    if ((k - 1) % 2 === 0) sum += k === 1 ? here : 2 * here
  }
  return wanted / sum
}

const zeros = new Map<string, number>()

/**
 * The n-th positive zero j_mn of J_m, to rounding.
 * Bracketed by proven bounds: (n − 1/4)π < j_0n < (n − 1/8)π (Watson, Theory of Bessel Functions, 15.32), and
 * j_{m−1,n} < j_mn < j_{m−1,n+1} (interlacing, DLMF 10.21.2), then bisected.
 * @throws AcousticsError order not a whole number 0 to 20, index not a whole number 1 to 60
 */
export function besselJZero(order: number, index: number): number {
  requireWhole('order', order, { min: 0, max: 20, unit: '' })
  requireWhole('index', index, { min: 1, max: 60, unit: '' })
  return zeroOf(order, index)
}

function zeroOf(order: number, index: number): number {
  const key = `${order},${index}`
  const known = zeros.get(key)
  if (known !== undefined) return known
  const [low, high] =
    order === 0
      ? [(index - 1 / 4) * Math.PI, (index - 1 / 8) * Math.PI]
      : [zeroOf(order - 1, index), zeroOf(order - 1, index + 1)]
  const falls = besselJ(order, low) > 0
  const zero = risingRoot((x) => (falls ? -besselJ(order, x) : besselJ(order, x)), low, high)
  zeros.set(key, zero)
  return zero
}

/**
 * The n-th positive zero of the slope J_m′, to rounding: the wavenumbers k·a of a rigid cylinder's air. For m = 0 these are the
 * zeros of J_1; for m ≥ 1 the first lies in (m, j_m1) and the others in (j_{m,n−1}, j_mn) (DLMF 10.21.3), where
 * J_m′ = J_{m−1} − (m/x)·J_m changes sign once.
 * @throws AcousticsError order not a whole number 0 to 8, index not a whole number 1 to 60
 */
export function besselSlopeZero(order: number, index: number): number {
  requireWhole('order', order, { min: 0, max: 8, unit: '' })
  requireWhole('index', index, { min: 1, max: 60, unit: '' })
  if (order === 0) return zeroOf(1, index)
  const slope = (x: number) => besselJ(order - 1, x) - (order / x) * besselJ(order, x)
  const low = index === 1 ? order : zeroOf(order, index - 1)
  const falls = index % 2 === 1
  return risingRoot((x) => (falls ? -slope(x) : slope(x)), low, zeroOf(order, index))
}
