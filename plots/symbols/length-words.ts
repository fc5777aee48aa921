export type LengthUnits = 'metric' | 'imperial'

/** A length in metres as a crew writes it: "2.4 m", or "7 ft 10 in" to the nearest inch. */
export function lengthWords(lengthM: number, units: LengthUnits): string {
  if (units === 'metric') return `${trimmed(lengthM)} m`
  const { feet, inches } = feetAndInches(lengthM)
  if (feet === 0) return `${inches} in`
  return inches === 0 ? `${feet} ft` : `${feet} ft ${inches} in`
}

/** Width by depth: "2.4 × 2.4 m", "8 × 8 ft". */
export function areaWords(widthM: number, depthM: number, units: LengthUnits): string {
  if (units === 'metric') return `${trimmed(widthM)} × ${trimmed(depthM)} m`
  const wide = feetAndInches(widthM)
  const deep = feetAndInches(depthM)
  if (wide.inches === 0 && deep.inches === 0) return `${wide.feet} × ${deep.feet} ft`
  return `${lengthWords(widthM, units)} × ${lengthWords(depthM, units)}`
}

function trimmed(lengthM: number): string {
  return String(Math.round(lengthM * 100) / 100)
}

function feetAndInches(lengthM: number): { feet: number; inches: number } {
  const inches = Math.round(lengthM / 0.0254)
  return { feet: Math.floor(inches / 12), inches: inches % 12 }
}
