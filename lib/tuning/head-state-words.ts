import type { HeadState, LugState } from './head-state'

/**
 * Which lugs of a head are out, in words: "Lugs 2 and 5 are low by 12 and 9 cents; lug 3 is high by 14 cents". Lugs keep their
 * own order, amounts are rounded to whole cents or tenths of a gauge unit. Null when none is out.
 */
export function outWords(state: HeadState): string | null {
  const out = state.lugs.filter((lug) => lug.out === true)
  const clauses = (['low', 'high'] as const).flatMap((side) => {
    const lugs = out.filter((lug) => (deviation(lug) < 0 ? 'low' : 'high') === side)
    return lugs.length === 0 ? [] : [clause(lugs, side, state.unit)]
  })
  const words = clauses.join('; ')
  return words === '' ? null : words[0]?.toUpperCase() + words.slice(1)
}

/** How far a lug is off what it is judged against; 0 when it was not read. */
export function deviation({ fromTarget, fromMean }: LugState): number {
  return fromTarget ?? fromMean ?? 0
}

function clause(lugs: readonly LugState[], side: 'low' | 'high', unit: HeadState['unit']): string {
  const amounts = lugs.map((lug) => amount(Math.abs(deviation(lug)), unit))
  const last = amounts.at(-1)
  const unitWord = unit === 'gauge' ? 'on the gauge' : last === '1' ? 'cent' : 'cents'
  const numbers = listed(lugs.map(({ lug }) => String(lug)))
  return `${lugs.length === 1 ? 'lug' : 'lugs'} ${numbers} ${lugs.length === 1 ? 'is' : 'are'} ${side} by ${listed(amounts)} ${unitWord}`
}

function amount(value: number, unit: HeadState['unit']): string {
  return unit === 'gauge' ? String(Math.round(value * 10) / 10) : String(Math.round(value))
}

/** "2", "2 and 5", "1, 2 and 5". */
export function listed(words: readonly string[]): string {
  if (words.length < 2) return words.join('')
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`
}
