import type {
  FrozenCymbalSpec,
  FrozenDrumSpec,
  FrozenEntry,
  FrozenHead,
  FrozenHardwareSpec,
  FrozenMicrophoneSpec,
  SizeRange,
} from './frozen-kit'
import { entriesInOrder } from './frozen-kit'
import {
  cymbalSizeWords,
  cymbalTypeWord,
  drumRoleWord,
  drumSizeWords,
  headWords,
  rangeWords,
  typeWords,
} from './kit-words'
import type { Units } from './kit-words'

/** A head that is asked for: its kind, without what the tuner notes about it. */
export type AskedHead = Pick<FrozenHead, 'plyMils' | 'film' | 'coatingGPerM2' | 'damping'>

export type AskedDrumSpec = Pick<FrozenDrumSpec, 'role' | 'diameterIn' | 'depthIn' | 'lugs' | 'shell' | 'ported'> & {
  readonly batter: AskedHead
  readonly resonant: AskedHead | null
  readonly insteadOf: SizeRange | null
}

/**
 * What is asked for one line: all that whoever brings it must know, and nothing that is only for tuning (note, lock, head
 * relation, tolerance, gauge, muffling). An answer holds as long as this stays the same.
 */
export type LineContent = {
  readonly name: string
  readonly count: number
  /** Carried things are not asked for, so there is no line of them. */
  readonly supply: 'rented' | 'venue'
  readonly remark: string
} & (
  | { readonly kind: 'drum'; readonly spec: AskedDrumSpec }
  | { readonly kind: 'cymbal'; readonly spec: FrozenCymbalSpec }
  | { readonly kind: 'hardware'; readonly spec: FrozenHardwareSpec }
  | { readonly kind: 'microphone'; readonly spec: FrozenMicrophoneSpec }
)

export interface AskedLine {
  readonly entryId: string
  /** 1, 2, 3 … in the order of the kit. */
  readonly position: number
  readonly content: LineContent
}

/** The lines that a kit asks for, numbered in the kit's order. What is carried is not asked for. */
export function linesOfKit(entries: readonly FrozenEntry[]): AskedLine[] {
  return entriesInOrder(entries)
    .flatMap((entry) => {
      const content = lineContent(entry)
      return content ? [{ entryId: entry.id, content }] : []
    })
    .map((line, index) => ({ ...line, position: index + 1 }))
}

/** What is asked for one kit entry, or null when it is carried. */
export function lineContent(entry: FrozenEntry): LineContent | null {
  if (entry.supply === 'carried') return null
  const common = { name: entry.name, count: entry.count, supply: entry.supply, remark: entry.remark }
  switch (entry.kind) {
    case 'drum':
      return { ...common, kind: 'drum', spec: askedDrum(entry.spec) }
    case 'cymbal':
      return { ...common, kind: 'cymbal', spec: { type: entry.spec.type, diameterIn: entry.spec.diameterIn } }
    case 'hardware':
      return { ...common, kind: 'hardware', spec: { type: entry.spec.type } }
    case 'microphone':
      return {
        ...common,
        kind: 'microphone',
        spec: { type: entry.spec.type, phantom: entry.spec.phantom, stand: entry.spec.stand },
      }
  }
}

function askedDrum(spec: FrozenDrumSpec): AskedDrumSpec {
  const { role, diameterIn, depthIn, lugs, shell, ported, insteadOf } = spec
  return {
    role,
    diameterIn,
    depthIn,
    lugs,
    shell,
    ported,
    batter: askedHead(spec.batter),
    resonant: spec.resonant ? askedHead(spec.resonant) : null,
    insteadOf: insteadOf && {
      diameterMinIn: insteadOf.diameterMinIn,
      diameterMaxIn: insteadOf.diameterMaxIn,
      depthMinIn: insteadOf.depthMinIn,
      depthMaxIn: insteadOf.depthMaxIn,
    },
  }
}

function askedHead({ plyMils, film, coatingGPerM2, damping }: FrozenHead): AskedHead {
  return { plyMils, film, coatingGPerM2, damping }
}

/** A line as it is read out: "Rack tom, 12 in across, 8 deep, 6 lugs"; two or more of a thing as "2 × …". */
export function lineWords(content: LineContent, units: Units): string {
  const many = content.count > 1 ? `${content.count} × ` : ''
  return `${many}${[content.name, ...unsaid(content, essentials(content, units))].join(', ')}`
}

/** Leaves out what the name says already: a "Throne" need not be called a throne again. */
function unsaid({ name }: LineContent, phrases: readonly string[]): string[] {
  return phrases.filter((phrase) => !name.toLowerCase().includes(phrase))
}

function essentials(content: LineContent, units: Units): string[] {
  switch (content.kind) {
    case 'drum':
      return [drumSizeWords(content.spec, units), `${content.spec.lugs} lugs`]
    case 'cymbal':
      return [cymbalTypeWord(content.spec.type), cymbalSizeWords(content.spec.diameterIn, units)]
    case 'hardware':
      return [typeWords(content.spec.type)]
    case 'microphone':
      return [
        `${typeWords(content.spec.type)} microphone`,
        ...(content.spec.stand === 'none'
          ? []
          : [content.spec.stand === 'clip' ? 'with clip' : `${content.spec.stand} stand`]),
      ]
  }
}

/** More about a line, a phrase each: what kind of drum it is, shell, new heads, phantom, remark. */
export function lineDetails(content: LineContent): string[] {
  const remark = content.remark === '' ? [] : [content.remark]
  switch (content.kind) {
    case 'drum': {
      const { role, shell, ported, batter, resonant } = content.spec
      return [
        [drumRoleWord(role), ...(shell === '' ? [] : [shell]), ...(ported ? ['ported front head'] : [])].join(', '),
        `new heads: ${headWords(batter)} batter, ${resonant ? `${headWords(resonant)} resonant` : 'no resonant head'}`,
        ...remark,
      ]
    }
    case 'microphone':
      return [...(content.spec.phantom ? ['needs phantom 48 V'] : []), ...remark]
    case 'cymbal':
    case 'hardware':
      return remark
  }
}

/** What may come instead without asking again, in words; null when nothing was said. */
export function insteadOfWords(content: LineContent): string | null {
  const range = content.kind === 'drum' ? content.spec.insteadOf : null
  if (!range) return null
  return `${rangeWords(range.diameterMinIn, range.diameterMaxIn)} across, ${rangeWords(range.depthMinIn, range.depthMaxIn)} deep`
}
