import type { LengthUnits } from './length-words'

const METRES: Readonly<Record<string, number>> = {
  m: 1,
  cm: 0.01,
  mm: 0.001,
  ft: 0.3048,
  "'": 0.3048,
  '′': 0.3048,
  in: 0.0254,
  '"': 0.0254,
  '″': 0.0254,
}

/**
 * Metres from what a person types: "2.4", "2,4 m", "-35 cm", "8 ft", "7' 10\"", "22 in". A bare number is metres, or
 * feet for a reader in imperial. Null when it cannot be read.
 */
export function parseLengthM(text: string, units: LengthUnits): number | null {
  const trimmed = text.trim().toLowerCase().replaceAll(',', '.').replaceAll('−', '-')
  const sign = trimmed.startsWith('-') ? -1 : 1
  const body = trimmed.replace(/^[-+]\s*/, '')
  if (/^\d*\.?\d+$/.test(body)) return sign * Number(body) * (units === 'metric' ? 1 : 0.3048)
  const parts = [...body.matchAll(/(\d*\.?\d+)\s*(mm|cm|m|ft|in|['′"″])\s*/g)]
  if (parts.length === 0 || parts.map((part) => part[0]).join('') !== body) return null
  return sign * parts.reduce((sum, part) => sum + Number(part[1]) * (METRES[part[2] ?? ''] ?? Number.NaN), 0)
}
