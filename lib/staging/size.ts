import { metresPerInch } from './length'

const millimetresPerInch = metresPerInch * 1000

/** What a typed drum or cymbal size means in nominal inches, or the sentence that says why it means none. */
export type ParsedSize = { inches: number; problem: null } | { inches: null; problem: string }

const howTo = 'write a size such as 12, 5½, 12" or 305 mm'
const vulgar: Record<string, number> = { '¼': 0.25, '½': 0.5, '¾': 0.75 }
const inchMark = String.raw`(?:in|inch|inches|"|″|”|'')?`
const decimal = new RegExp(String.raw`^(\d{1,4}(?:[.,]\d{1,4})?)\s*${inchMark}$`, 'i')
const fraction = new RegExp(String.raw`^(\d{1,3})[\s-]+(\d)\s*\/\s*(\d{1,2})\s*${inchMark}$`, 'i')
const glyph = new RegExp(String.raw`^(\d{1,3})\s*([¼½¾])\s*${inchMark}$`, 'i')
const metric = /^(\d{1,4}(?:[.,]\d{1,3})?)\s*(mm|cm)$/i

/** A tape read to the millimetre, on a shell that is rarely cut closer. */
const metricSlackMm = 1

/**
 * Reads a drum or cymbal size as it is typed: 12, 12", "12 in", 5.5, 5,5, "5 1/2", 5½, "305 mm", "30.5 cm". Sizes are nominal: whole
 * or quarter inches. Millimetres are taken for the quarter inch they lie within 1 mm of, and refused otherwise.
 */
export function parseSize(text: string): ParsedSize {
  const typed = text.trim()
  const inMetric = metric.exec(typed)
  if (inMetric) return ofMillimetres(number(inMetric[1]) * (inMetric[2]?.toLowerCase() === 'cm' ? 10 : 1))
  const inches = inchesOf(typed)
  if (inches === null) return { inches: null, problem: howTo }
  const quarters = inches * 4
  if (Number.isInteger(quarters)) return { inches, problem: null }
  const [below, above] = [Math.floor(quarters) / 4, Math.ceil(quarters) / 4]
  return {
    inches: null,
    problem: `sizes are whole or quarter inches: ${inchFractions(below)} or ${inchFractions(above)} in, not ${typed}`,
  }
}

function number(text: string | undefined): number {
  return Number((text ?? '').replace(',', '.'))
}

function inchesOf(typed: string): number | null {
  const [, plain] = decimal.exec(typed) ?? []
  if (plain !== undefined) return number(plain)
  const [, whole, over, under] = fraction.exec(typed) ?? []
  if (whole !== undefined) return Number(under) === 0 ? null : Number(whole) + Number(over) / Number(under)
  const [, before, part = ''] = glyph.exec(typed) ?? []
  return before === undefined ? null : Number(before) + (vulgar[part] ?? 0)
}

function ofMillimetres(mm: number): ParsedSize {
  const quarters = (mm / millimetresPerInch) * 4
  const nearest = Math.round(quarters) / 4
  if (Math.abs(millimetresOf(nearest) - mm) <= metricSlackMm) return { inches: nearest, problem: null }
  const sizes = [Math.floor(quarters) / 4, Math.ceil(quarters) / 4].map(
    (inches) => `${inchFractions(inches)} in is ${Math.round(millimetresOf(inches))} mm`,
  )
  return { inches: null, problem: `${Math.round(mm * 10) / 10} mm is no whole or quarter inch: ${sizes.join(', ')}` }
}

/** Exact millimetres of nominal inches. */
export function millimetresOf(inches: number): number {
  return inches * millimetresPerInch
}

/** Nominal inches as the trade writes them, quarters as fractions: 12, 5½, 6¼. Any finer part stays decimal. */
export function inchFractions(inches: number): string {
  const whole = Math.floor(inches)
  const sign = Object.entries(vulgar).find(([, part]) => part === inches - whole)?.[0]
  if (inches === whole) return String(whole)
  return sign === undefined ? String(Math.round(inches * 100) / 100) : `${whole === 0 ? '' : whole}${sign}`
}
