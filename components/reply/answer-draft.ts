import type { AnswerContent, InsteadWhat } from '@/lib/advance/answer'
import { insteadKind } from '@/lib/advance/answer'
import type { ReplyLine } from '@/lib/contracts/answer'

export type AnswerKind = 'as asked' | 'instead' | 'not yet' | 'cant'

/** What a form needs to know of a line. */
export type DraftLine = Pick<ReplyLine, 'kind' | 'count' | 'size' | 'words'>

/** An answer as it is being typed; every number is text until it is kept. */
export type AnswerDraft = {
  asAsked: string
  instead: { n: string; diameterIn: string; depthIn: string; lugs: string; words: string }
  notYet: { n: string; by: string }
  cant: string
}

const text = (value: number | null | undefined) => (value === null || value === undefined ? '' : String(value))

/** Begins from what was said before, else with everything in the kind that was pressed and the sizes that were asked for. */
export function beginDraft(line: DraftLine, kind: AnswerKind, before: AnswerContent | null): AnswerDraft {
  const all = String(line.count)
  const instead = before?.instead[0]
  const notYet = before?.notYet[0]
  const said = before !== null && line.count > 1
  const sizes = instead?.what.kind === 'drum' ? instead.what : instead?.what.kind === 'cymbal' ? { ...instead.what, depthIn: null, lugs: null } : line.size
  return {
    asAsked: said ? String(before.asAsked) : kind === 'as asked' ? all : '0',
    instead: {
      n: said ? String(instead?.n ?? 0) : kind === 'instead' ? all : '0',
      diameterIn: text(sizes?.diameterIn),
      depthIn: text(sizes?.depthIn),
      lugs: text(sizes?.lugs),
      words: instead?.what.words ?? '',
    },
    notYet: { n: said ? String(notYet?.n ?? 0) : kind === 'not yet' ? all : '0', by: notYet?.by ?? '' },
    cant: said ? String(before.cant) : kind === 'cant' ? all : '0',
  }
}

/** Reads a number as it is typed in either hand; NaN when it is none, so that the rules refuse it. */
function numberIn(typed: string): number {
  return typed.trim() === '' ? Number.NaN : Number(typed.trim().replace(',', '.'))
}
const countIn = (typed: string) => (typed.trim() === '' ? 0 : numberIn(typed))

export function draftContent(line: DraftLine, draft: AnswerDraft): AnswerContent {
  const instead = countIn(draft.instead.n)
  const notYet = countIn(draft.notYet.n)
  return {
    asAsked: countIn(draft.asAsked),
    instead: instead === 0 ? [] : [{ n: instead, what: draftWhat(line, draft) }],
    notYet: notYet === 0 ? [] : [{ n: notYet, by: draft.notYet.by }],
    cant: countIn(draft.cant),
  }
}

function draftWhat(line: DraftLine, { instead }: AnswerDraft): InsteadWhat {
  const words = instead.words.trim()
  switch (insteadKind(line.kind)) {
    case 'drum':
      return { kind: 'drum', diameterIn: numberIn(instead.diameterIn), depthIn: numberIn(instead.depthIn), lugs: numberIn(instead.lugs), words }
    case 'cymbal':
      return { kind: 'cymbal', diameterIn: numberIn(instead.diameterIn), words }
    case 'other':
      return { kind: 'other', words }
  }
}
