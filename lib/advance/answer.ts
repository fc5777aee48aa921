import { inchWords } from './kit-words'

/**
 * What is offered instead of the thing asked for, structured by kind so that notes, footprint and sheets can follow it.
 * Sizes are nominal inches; `words` says what sizes cannot (shell, condition, where it differs).
 */
export type InsteadWhat =
  | {
      readonly kind: 'drum'
      readonly diameterIn: number
      readonly depthIn: number
      readonly lugs: number
      readonly words: string
    }
  | { readonly kind: 'cymbal'; readonly diameterIn: number; readonly words: string }
  | { readonly kind: 'other'; readonly words: string }

/** One answer to one line, by count: the four counts together are the count asked for. */
export interface AnswerContent {
  readonly asAsked: number
  readonly instead: readonly { readonly n: number; readonly what: InsteadWhat }[]
  /** `by` is a calendar date, YYYY-MM-DD, in the reader's own place. */
  readonly notYet: readonly { readonly n: number; readonly by: string }[]
  readonly cant: number
}

export const insteadDrumRange = { diameterIn: [6, 28], depthIn: [3, 24] } as const
export const insteadCymbalRange = { diameterIn: [6, 26] } as const
export const insteadLugCounts = [4, 5, 6, 8, 10, 12] as const

/** Which particulars an "instead" of a line of this kind has. */
export function insteadKind(lineKind: string): InsteadWhat['kind'] {
  return lineKind === 'drum' || lineKind === 'cymbal' ? lineKind : 'other'
}

/** How many pieces an answer speaks of. */
export function answerCount(content: AnswerContent): number {
  const sum = (parts: readonly { readonly n: number }[]) => parts.reduce((total, part) => total + part.n, 0)
  return content.asAsked + sum(content.instead) + sum(content.notYet) + content.cant
}

/**
 * What is wrong with an answer to a line of a kind and count, as a sentence that says what is allowed; null when it holds.
 * Checks counts (whole, not negative, together the count asked for), kinds of the "instead" and their sizes, and dates: where
 * the answerer's `today` (YYYY-MM-DD) is given, what is not known yet is known on it or after.
 */
export function answerFault(
  content: AnswerContent,
  line: { readonly kind: string; readonly count: number },
  today: string | null = null,
): string | null {
  const counts = [
    content.asAsked,
    content.cant,
    ...content.instead.map((part) => part.n),
    ...content.notYet.map((part) => part.n),
  ]
  if (counts.some((count) => !Number.isInteger(count) || count < 0)) return 'counts are whole numbers from 0'
  if ([...content.instead, ...content.notYet].some((part) => part.n === 0)) return 'each part speaks of at least 1'
  if (answerCount(content) !== line.count) {
    return `the counts together must be ${line.count}, the number asked for; now they are ${answerCount(content)}`
  }
  const wanted = insteadKind(line.kind)
  for (const { what } of content.instead) {
    if (what.kind !== wanted) return `what comes instead must be told as a ${wanted === 'other' ? 'sentence' : wanted}`
    const fault = insteadFault(what)
    if (fault) return fault
  }
  if (content.notYet.some(({ by }) => !isDate(by))) return 'give the date by which you know, as YYYY-MM-DD'
  const isOver = today !== null && content.notYet.some(({ by }) => by < today)
  return isOver ? 'give a date by which you know that is still to come' : null
}

function insteadFault(what: InsteadWhat): string | null {
  switch (what.kind) {
    case 'drum':
      if (!isSize(what.diameterIn, insteadDrumRange.diameterIn))
        return 'a drum is 6 to 28 in across, in whole or quarter inches'
      if (!isSize(what.depthIn, insteadDrumRange.depthIn))
        return 'a drum is 3 to 24 in deep, in whole or quarter inches'
      return (insteadLugCounts as readonly number[]).includes(what.lugs) ? null : 'a head has 4, 5, 6, 8, 10 or 12 lugs'
    case 'cymbal':
      return isSize(what.diameterIn, insteadCymbalRange.diameterIn)
        ? null
        : 'a cymbal is 6 to 26 in across, in whole or quarter inches'
    case 'other':
      return what.words.trim() === '' ? 'say what comes instead' : null
  }
}

function isSize(value: number, [low, high]: readonly [number, number]): boolean {
  return value >= low && value <= high && Number.isInteger(value * 4)
}

/** A real calendar date written YYYY-MM-DD. */
function isDate(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false
  const day = new Date(`${text}T00:00:00Z`)
  return !Number.isNaN(day.getTime()) && day.toISOString().startsWith(text)
}

/** Everything as asked. */
export function asAskedAnswer(count: number): AnswerContent {
  return { asAsked: count, instead: [], notYet: [], cant: 0 }
}

/** What comes instead, short: "13 in across, 9 deep, 6 lugs, birch". */
export function insteadWords(what: InsteadWhat): string {
  const words = what.words.trim()
  switch (what.kind) {
    case 'drum':
      return withWords(
        `${inchWords(what.diameterIn)} in across, ${inchWords(what.depthIn)} deep, ${what.lugs} lugs`,
        words,
      )
    case 'cymbal':
      return withWords(`${inchWords(what.diameterIn)} in`, words)
    case 'other':
      return words
  }
}

function withWords(size: string, words: string): string {
  return words === '' ? size : `${size}, ${words}`
}

/**
 * An answer as it is read: "as asked", "6 as asked, 2 not yet, by 5 October". A count stands before each part when more than
 * one was asked for.
 * @param dateWords how a calendar date is written for the reader
 */
export function answerWords(content: AnswerContent, dateWords: (date: string) => string): string {
  const total = answerCount(content)
  const counted = (n: number, words: string) => (total > 1 ? `${n} ${words}` : words)
  return [
    ...(content.asAsked > 0 ? [counted(content.asAsked, 'as asked')] : []),
    ...content.instead.map(({ n, what }) => counted(n, `instead: ${insteadWords(what)}`)),
    ...content.notYet.map(({ n, by }) => counted(n, `not yet, by ${dateWords(by)}`)),
    ...(content.cant > 0 ? [counted(content.cant, "can't")] : []),
  ].join('; ')
}
