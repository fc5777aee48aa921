/** Exact by definition (international yard and pound agreement, 1959): 1 in = 25.4 mm, 1 ft = 12 in. */
export const metresPerInch = 0.0254
export const metresPerFoot = 0.3048

export type LengthUnits = 'metric' | 'imperial'

const number = String.raw`\d+(?:[.,]\d+)?`
const feet = String.raw`(?:ft|feet|foot|'|′|’)`
const inches = String.raw`(?:in|inch|inches|"|″|”|'')`
const metric = new RegExp(String.raw`^(${number})\s*(m|metres?|meters?|cm|mm)$`, 'i')
const feetAndInches = new RegExp(String.raw`^(${number})\s*${feet}(?:\s*(${number})\s*${inches}?)?$`, 'i')
const inchesOnly = new RegExp(String.raw`^(${number})\s*${inches}$`, 'i')
const bare = new RegExp(`^${number}$`)
const perMetre: Record<string, number> = { m: 1, cm: 100, mm: 1000 }

const value = (text: string | undefined) => Number((text ?? '0').replace(',', '.'))

/**
 * A typed length in metres: "2.4 m", "240 cm", "8 ft", 7'10", "94 in". A bare number is metres, or feet for a party that
 * works in feet. Null when it cannot be read. A decimal comma is read as a point; inches beside feet must be under 12.
 */
export function parseLength(text: string, units: LengthUnits): number | null {
  const typed = text.trim()
  if (bare.test(typed)) return value(typed) * (units === 'metric' ? 1 : metresPerFoot)
  const inMetres = metric.exec(typed)
  if (inMetres) {
    const unit = (inMetres[2] ?? 'm').toLowerCase()
    return value(inMetres[1]) / (perMetre[unit] ?? 1)
  }
  const inInches = inchesOnly.exec(typed)
  if (inInches) return value(inInches[1]) * metresPerInch
  const inFeet = feetAndInches.exec(typed)
  if (!inFeet) return null
  const rest = value(inFeet[2])
  return rest < 12 ? value(inFeet[1]) * metresPerFoot + rest * metresPerInch : null
}

/** A bound of a typed length, `metres` m, for readers of either unit: "1 m (3'3")". */
export const lengthBound = (metres: number): string =>
  `${formatLength(metres, 'metric')} (${formatLength(metres, 'imperial')})`

/** A length of `metres` m in words: "2.44 m" to the centimetre, or "8 ft" and 7'10" to the inch. */
export function formatLength(metres: number, units: LengthUnits): string {
  if (units === 'metric') return `${Number(metres.toFixed(2))} m`
  const whole = Math.round(metres / metresPerInch)
  const rest = whole % 12
  const ft = (whole - rest) / 12
  if (rest === 0) return `${ft} ft`
  return ft === 0 ? `${rest} in` : `${ft}'${rest}"`
}
