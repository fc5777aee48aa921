const micrometresPerMil = 25.4

/** Film thickness of each ply in mil, or the sentence that says how to write it. */
export type ParsedPlies = { plyMils: number[]; problem: null } | { plyMils: null; problem: string }

const ply = /^(\d{1,3}(?:[.,]\d{1,2})?)\s*(mils?|µm|μm|um)?$/i

/**
 * Reads the plies of a head as they are typed: "10", "7 + 7", "7.5+3 mil", "254 µm". A unit behind the last ply holds for all that have
 * none. Micrometres are taken to the hundredth of a mil.
 */
export function parsePlies(text: string): ParsedPlies {
  const parts = text.trim().split(/\s*\+\s*/)
  const read = parts.map((part) => ply.exec(part))
  const lastUnit = read.at(-1)?.[2]
  const plyMils = read.map((match) => {
    if (!match) return Number.NaN
    const value = Number((match[1] ?? '').replace(',', '.'))
    const unit = (match[2] ?? lastUnit ?? 'mil').toLowerCase()
    return unit.startsWith('mil') ? value : Math.round((value / micrometresPerMil) * 100) / 100
  })
  return plyMils.every(Number.isFinite)
    ? { plyMils, problem: null }
    : { plyMils: null, problem: 'write each ply in mil, such as 10 or 7 + 7' }
}

/** Whole micrometres of each ply: "254 µm", "178 + 178 µm". */
export function micrometreWords(plyMils: readonly number[]): string {
  return `${plyMils.map((mil) => Math.round(mil * micrometresPerMil)).join(' + ')} µm`
}
