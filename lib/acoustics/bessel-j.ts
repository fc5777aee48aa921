import besselJ0 from '@stdlib/math-base-special-besselj0'
import besselJ1 from '@stdlib/math-base-special-besselj1'
import { requireQuantity, requireWhole } from './require-quantity'

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
  const zero = bisect((x) => besselJ(order, x), low, high)
  zeros.set(key, zero)
  return zero
}

function bisect(f: (x: number) => number, low: number, high: number): number {
  const risesFrom = Math.sign(f(low))
  let [a, b] = [low, high]
  for (let step = 0; step < 60; step++) {
    const mid = (a + b) / 2
    if (mid === a || mid === b) break
    if (Math.sign(f(mid)) === risesFrom) a = mid
    else b = mid
  }
  return (a + b) / 2
}
