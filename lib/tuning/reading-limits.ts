import type { ReadingUnit } from './readings'

/** What a typed reading may be, by its unit: wide enough for every drum, narrow enough to catch a slip of the thumb. */
export const readingLimits = {
  Hz: { min: 20, max: 2000, unit: 'Hz' },
  cents: { min: -1200, max: 1200, unit: 'cents' },
  gauge: { min: 0, max: 200, unit: 'on the gauge' },
} as const satisfies Record<ReadingUnit, { min: number; max: number; unit: string }>

/** A reading as it was typed, with a comma or a point; or the sentence that says what is allowed. */
export function parseReading(
  typed: string,
  unit: ReadingUnit,
): { value: number; fault: null } | { value: null; fault: string } {
  const { min, max, unit: word } = readingLimits[unit]
  const text = typed.trim().replace(',', '.').replace('−', '-')
  const value = /^[+-]?(\d+\.?\d*|\.\d+)$/.test(text) ? Number(text) : Number.NaN
  if (Number.isNaN(value)) return { value: null, fault: `Write a number, such as ${examples[unit]}.` }
  if (value < min || value > max)
    return { value: null, fault: `${typed.trim()} cannot be: from ${min} to ${max} ${word}.` }
  return { value, fault: null }
}

const examples: Record<ReadingUnit, string> = { Hz: '251.5', cents: '-12', gauge: '75' }
