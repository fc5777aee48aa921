/** Cuts a drawing coordinate to a thousandth, so that server and browser write the same markup. */
export function round(value: number): number {
  return Math.round(value * 1000) / 1000
}
