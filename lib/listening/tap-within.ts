/**
 * Returns `value` if it lies within the limits, both ends allowed.
 * @throws RangeError naming `field`; not-a-number is never within.
 */
export function within(field: string, value: number, min: number, max: number): number {
  if (!(value >= min && value <= max)) throw new RangeError(`${field} is ${value}: allowed ${min} to ${max}.`)
  return value
}
