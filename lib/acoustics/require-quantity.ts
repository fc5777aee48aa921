import { AcousticsError } from './acoustics-error'

export type QuantityLimits = { min: number; max: number; unit: string }

/**
 * Returns `value` if it is a finite number within the limits (both ends allowed).
 * @throws AcousticsError naming `field`, the value and what is allowed.
 */
export function requireQuantity(field: string, value: number, { min, max, unit }: QuantityLimits): number {
  const allowed = `allowed ${min} to ${max}${unit === '' ? '' : ` ${unit}`}`
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    throw new AcousticsError(field, `${field} is not a finite number: ${allowed}.`)
  }
  if (value < min || value > max) throw new AcousticsError(field, `${field} is ${value}: ${allowed}.`)
  return value
}

/**
 * Returns `value` if it is a whole number within the limits.
 * @throws AcousticsError naming `field`.
 */
export function requireWhole(field: string, value: number, limits: QuantityLimits): number {
  requireQuantity(field, value, limits)
  if (!Number.isInteger(value)) throw new AcousticsError(field, `${field} is ${value}: a whole number is needed.`)
  return value
}

/** Exact by definition (international yard and pound agreement, 1959). */
export const METRE_PER_INCH = 0.0254

/**
 * Head diameter in metres, 0.1 to 0.8 (about 4 to 31 in). The commonest slip is to pass nominal inches or
 * millimetres as metres: the message says so.
 * @throws AcousticsError
 */
export function requireDiameterM(diameterM: number): number {
  return requireLengthM('diameterM', diameterM, 0.1, 0.8)
}

/** Shell depth in metres, 0.05 to 0.65 (about 2 to 25 in); inches and millimetres are told as for a diameter. @throws AcousticsError */
export function requireDepthM(depthM: number): number {
  return requireLengthM('depthM', depthM, 0.05, 0.65)
}

function requireLengthM(field: string, metres: number, min: number, max: number): number {
  const within = (m: number) => m >= min && m <= max
  if (Number.isFinite(metres) && !within(metres)) {
    const slip = within(metres * METRE_PER_INCH)
      ? ` That looks like inches: ${metres} in is ${(metres * METRE_PER_INCH).toFixed(4)} m.`
      : within(metres / 1000)
        ? ` That looks like millimetres: ${metres} mm is ${metres / 1000} m.`
        : ''
    throw new AcousticsError(field, `${field} is ${metres}: allowed ${min} to ${max} m.${slip}`)
  }
  return requireQuantity(field, metres, { min, max, unit: 'm' })
}

/** Film tension in N/m, 1 to 50 000: past the top every drum film has long since torn. @throws AcousticsError */
export function requireTensionNPerM(tensionNPerM: number, field = 'tensionNPerM'): number {
  return requireQuantity(field, tensionNPerM, { min: 1, max: 50_000, unit: 'N/m' })
}

/** Pitch of a drum in Hz, 10 to 5000. @throws AcousticsError naming `field`. */
export function requirePitchHz(field: string, hz: number): number {
  return requireQuantity(field, hz, { min: 10, max: 5000, unit: 'Hz' })
}
