import type { CostSplit } from '@/lib/tuning/note-plan-model'

const reasons: { key: keyof CostSplit; words: string }[] = [
  { key: 'order', words: 'for a larger drum over a smaller' },
  { key: 'outOfRange', words: 'out of range' },
  { key: 'intervals', words: 'for intervals' },
  { key: 'offMiddle', words: 'off the middle' },
  { key: 'tooClose', words: 'for drums too near each other' },
  { key: 'sharedNames', words: 'for wires stirred' },
]

/** A cost as it is read: to the tenth. */
export function costWords(cost: number): string {
  return String(Math.round(cost * 10) / 10)
}

/**
 * A plan's cost with its reasons: "2.4: 2 for intervals, 0.4 off the middle", "2 for intervals" where there is one only,
 * "nothing" when nothing speaks against it.
 */
export function splitWords(cost: number, split: CostSplit): string {
  const parts = reasons.filter(({ key }) => Math.round(split[key] * 10) > 0)
  if (parts.length === 0) return costWords(cost) === '0' ? 'nothing' : costWords(cost)
  const words = parts.map((part) => `${costWords(split[part.key])} ${part.words}`)
  return words.length === 1 && parts[0] && costWords(split[parts[0].key]) === costWords(cost)
    ? words.join('')
    : `${costWords(cost)}: ${words.join(', ')}`
}
