import type { AnswerContent, InsteadWhat } from './answer'
import { answerCount } from './answer'
import type { LineState } from './answer-state'
import type { FrozenEntry } from './frozen-kit'
import type { RevisionDocument } from './revision-document'

/** A kit entry as it is for one show. */
export type NightEntry = FrozenEntry & {
  /** What was settled to come instead, and what had been asked; null when the entry is as the revision says. */
  readonly instead: { readonly words: string; readonly askedSpec: FrozenEntry['spec'] } | null
  /** How many were settled not to come. */
  readonly missing: number
}

/**
 * The kit that is true for one show: the revision with what was settled. A drum that comes in another size keeps its heads, note
 * and tolerance (they are decided again by whoever tunes it) and takes the settled diameter, depth and lugs; a cymbal takes the
 * settled diameter. A size is taken only when every piece of the line comes so: half of a count leaves the entry as it was asked
 * and `missing` and the answer say the rest. Only settled answers to the very words of this revision count. Nothing is stored.
 */
export function nightKit(
  revision: Pick<RevisionDocument, 'kit' | 'lines'>,
  states: readonly LineState[],
): NightEntry[] {
  const byLine = new Map(states.map((state) => [state.lineId, state]))
  const settled = new Map<string, AnswerContent>()
  for (const line of revision.lines) {
    const state = byLine.get(line.lineId)
    if (state?.state === 'settled' && state.answer.lineHash === line.hash)
      settled.set(line.entryId, state.answer.content)
  }
  return revision.kit.map((entry) => nightEntry(entry, settled.get(entry.id)))
}

function nightEntry(entry: FrozenEntry, answer: AnswerContent | undefined): NightEntry {
  const what = answer && wholeInstead(answer)
  const missing = answer?.cant ?? 0
  if (!what) return { ...entry, instead: null, missing }
  const instead = { words: what.words.trim(), askedSpec: entry.spec }
  if (entry.kind === 'drum' && what.kind === 'drum') {
    const { diameterIn, depthIn, lugs } = what
    return { ...entry, spec: { ...entry.spec, diameterIn, depthIn, lugs }, instead, missing }
  }
  if (entry.kind === 'cymbal' && what.kind === 'cymbal') {
    return { ...entry, spec: { ...entry.spec, diameterIn: what.diameterIn }, instead, missing }
  }
  return { ...entry, instead, missing }
}

/** The one thing that comes instead of all that was asked for. */
function wholeInstead(answer: AnswerContent): InsteadWhat | undefined {
  const [first] = answer.instead
  return first && first.n === answerCount(answer) ? first.what : undefined
}
