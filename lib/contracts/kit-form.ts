import { z } from 'zod'
import { nearestNote } from '@/lib/acoustics/note'
import type { Note } from '@/lib/acoustics/note'
import { noteName } from '@/lib/acoustics/note-name'
import type { NoteLocale } from '@/lib/acoustics/note-name'
import { parsePitch } from '@/lib/acoustics/parse-pitch'
import { parsePlies } from '@/lib/staging/plies'
import { inchFractions, parseSize } from '@/lib/staging/size'
import type { EntryInput, Head } from './kit'
import { entryInputSchema } from './kit'

/**
 * A kit entry as a form holds it: everything typed is text, at the path where the contract has its value. The schemas
 * read the text and then ask the contract of the route, so that form and route say one thing.
 */
export type HeadForm = {
  plyMils: string
  film: Head['film']
  coatingGPerM2: string
  damping: Head['damping']
  gauge: string
  range: { slackNPerM: string; chokedNPerM: string }
}
type CommonForm = { name: string; supply: EntryInput['supply']; count: string; remark: string }
type DrumSpec = Extract<EntryInput, { kind: 'drum' }>['spec']
type SizeRangeForm = { diameterMinIn: string; diameterMaxIn: string; depthMinIn: string; depthMaxIn: string }

export type DrumForm = CommonForm & {
  kind: 'drum'
  spec: Pick<DrumSpec, 'role' | 'shell' | 'ported' | 'noteLocked' | 'muffling'> & {
    diameterIn: string
    depthIn: string
    lugs: string
    batter: HeadForm
    resonant: HeadForm
    note: string
    headRelationCents: string
    measuredTapRatio: string
    toleranceCents: string
    warbleLimitHz: string
    insteadOf: SizeRangeForm
  }
  hasResonant: boolean
  takesOther: boolean
}

export type PieceForm = CommonForm & {
  kind: 'cymbal' | 'hardware' | 'microphone'
  spec: { type: string; diameterIn: string; phantom: boolean; stand: string }
}

/** How the party writes notes. */
export type NoteReader = { locale: NoteLocale; referenceHz: number }

type Problem = { path: string[]; message: string }
/** A value read from text, at its path; what cannot be read leaves a problem there. */
type Read = <Value>(path: string, parsed: { value: Value } | { problem: string }) => Value | undefined

export function drumFormSchema(reader: NoteReader): z.ZodType<EntryInput, DrumForm> {
  return formSchema((form: DrumForm, read) => {
    const { spec, hasResonant, takesOther } = form
    const size = (path: string, text: string) => read(path, sizeValue(text))
    const range = spec.insteadOf
    return {
      ...{ kind: form.kind, name: form.name, supply: form.supply, count: 1, remark: form.remark },
      spec: {
        ...{
          role: spec.role,
          shell: spec.shell,
          // Only a kick is asked for its port: the answer of a drum that was one before does not stay behind.
          ported: spec.role === 'kick' && spec.ported,
          noteLocked: spec.noteLocked,
          muffling: spec.muffling,
        },
        diameterIn: size('spec.diameterIn', spec.diameterIn),
        depthIn: size('spec.depthIn', spec.depthIn),
        lugs: Number(spec.lugs),
        batter: readHead(read, 'spec.batter', spec.batter),
        resonant: hasResonant ? readHead(read, 'spec.resonant', spec.resonant) : null,
        note: read('spec.note', noteValue(spec.note, reader)),
        headRelationCents: read('spec.headRelationCents', numberValue(spec.headRelationCents)),
        measuredTapRatio: read('spec.measuredTapRatio', optionalNumber(spec.measuredTapRatio)),
        toleranceCents: read('spec.toleranceCents', numberValue(spec.toleranceCents)),
        warbleLimitHz: read('spec.warbleLimitHz', numberValue(spec.warbleLimitHz)),
        insteadOf: takesOther
          ? {
              diameterMinIn: size('spec.insteadOf.diameterMinIn', range.diameterMinIn),
              diameterMaxIn: size('spec.insteadOf.diameterMaxIn', range.diameterMaxIn),
              depthMinIn: size('spec.insteadOf.depthMinIn', range.depthMinIn),
              depthMaxIn: size('spec.insteadOf.depthMaxIn', range.depthMaxIn),
            }
          : null,
      },
    }
  })
}

export function pieceFormSchema(): z.ZodType<EntryInput, PieceForm> {
  return formSchema((form: PieceForm, read) => ({
    ...{ kind: form.kind, name: form.name, supply: form.supply, remark: form.remark },
    count: read('count', numberValue(form.count)),
    spec:
      form.kind === 'cymbal'
        ? { type: form.spec.type, diameterIn: read('spec.diameterIn', sizeValue(form.spec.diameterIn)) }
        : form.spec,
  }))
}

function formSchema<Form>(toInput: (form: Form, read: Read) => unknown): z.ZodType<EntryInput, Form> {
  return z.custom<Form>().transform((form, context) => {
    const problems: Problem[] = []
    const read: Read = (path, parsed) => {
      if ('value' in parsed) return parsed.value
      problems.push({ path: path.split('.'), message: parsed.problem })
      return undefined
    }
    const result = entryInputSchema.safeParse(toInput(form, read))
    for (const issue of result.error?.issues ?? []) {
      const path = formPath(issue.path.map(String))
      const said = problems.some((problem) => problem.path.join('.') === path.join('.'))
      if (!said) problems.push({ path, message: issue.message })
    }
    if (result.success && problems.length === 0) return result.data
    for (const problem of problems) context.addIssue({ code: 'custom', ...problem })
    return z.NEVER
  })
}

/** Where a form holds what the contract has at a path: plies and a note are one text each. */
export function formPath(path: readonly string[]): string[] {
  const end = path.findIndex((part) => part === 'plyMils' || part === 'note')
  return end < 0 ? [...path] : path.slice(0, end + 1)
}

function readHead(read: Read, path: string, head: HeadForm) {
  const plies = parsePlies(head.plyMils)
  return {
    ...{ film: head.film, damping: head.damping },
    plyMils: read(`${path}.plyMils`, plies.problem === null ? { value: plies.plyMils } : { problem: plies.problem }),
    coatingGPerM2: read(`${path}.coatingGPerM2`, numberValue(head.coatingGPerM2)),
    gauge: read(`${path}.gauge`, optionalNumber(head.gauge)),
    range: readRange(read, `${path}.range`, head.range),
  }
}

/** Both edges or neither: one alone is asked for the other. */
function readRange(read: Read, path: string, { slackNPerM, chokedNPerM }: HeadForm['range']) {
  if (slackNPerM.trim() === '' && chokedNPerM.trim() === '') return null
  return {
    slackNPerM: read(`${path}.slackNPerM`, numberValue(slackNPerM)),
    chokedNPerM: read(`${path}.chokedNPerM`, numberValue(chokedNPerM)),
  }
}

function optionalNumber(text: string): { value: number | null } | { problem: string } {
  return text.trim() === '' ? { value: null } : numberValue(text)
}

function sizeValue(text: string): { value: number } | { problem: string } {
  const size = parseSize(text)
  return size.problem === null ? { value: size.inches } : { problem: size.problem }
}

function numberValue(text: string): { value: number } | { problem: string } {
  const plain = text.trim().replace(',', '.').replace('−', '-')
  const value = Number(plain)
  return plain !== '' && Number.isFinite(value) ? { value } : { problem: 'write a number' }
}

/** A typed note or frequency, to the hundredth of a cent; no text, no note. */
export function noteValue(text: string, reader: NoteReader): { value: Note | null } | { problem: string } {
  if (text.trim() === '') return { value: null }
  const pitch = parsePitch(text, reader)
  if (!pitch) return { problem: `write a note such as ${noteName(50, reader.locale)}, or a frequency such as 146.8 Hz` }
  const { semitone, cents } = nearestNote(pitch.frequencyHz, reader.referenceHz)
  return { value: { semitone, cents: Math.round(cents * 100) / 100 || 0 } }
}

/** A note as it is typed and shown: "D3", "D3 +12". */
export function noteText({ semitone, cents }: Note, locale: NoteLocale): string {
  const name = noteName(semitone, locale)
  return cents === 0 ? name : `${name} ${cents > 0 ? '+' : '−'}${Math.abs(cents)}`
}

function headForm(head: Head): HeadForm {
  return {
    plyMils: head.plyMils.join(' + '),
    film: head.film,
    coatingGPerM2: String(head.coatingGPerM2),
    damping: head.damping,
    gauge: head.gauge === null ? '' : String(head.gauge),
    range: {
      slackNPerM: head.range === null ? '' : String(head.range.slackNPerM),
      chokedNPerM: head.range === null ? '' : String(head.range.chokedNPerM),
    },
  }
}

export function drumFormOf(entry: Extract<EntryInput, { kind: 'drum' }>, locale: NoteLocale): DrumForm {
  const { name, supply, remark, spec } = entry
  const { role, shell, ported, noteLocked, muffling, insteadOf, note } = spec
  const range = insteadOf ?? {
    ...{ diameterMinIn: spec.diameterIn, diameterMaxIn: spec.diameterIn },
    ...{ depthMinIn: spec.depthIn, depthMaxIn: spec.depthIn },
  }
  return {
    ...{ kind: 'drum', name, supply, count: '1', remark },
    hasResonant: spec.resonant !== null,
    takesOther: insteadOf !== null,
    spec: {
      ...{ role, shell, ported, noteLocked, muffling },
      diameterIn: inchFractions(spec.diameterIn),
      depthIn: inchFractions(spec.depthIn),
      lugs: String(spec.lugs),
      batter: headForm(spec.batter),
      resonant: headForm(spec.resonant ?? { ...spec.batter, range: null }),
      note: note === null ? '' : noteText(note, locale),
      headRelationCents: String(spec.headRelationCents),
      measuredTapRatio: spec.measuredTapRatio === null ? '' : String(spec.measuredTapRatio),
      toleranceCents: String(spec.toleranceCents),
      warbleLimitHz: String(spec.warbleLimitHz),
      insteadOf: {
        diameterMinIn: inchFractions(range.diameterMinIn),
        diameterMaxIn: inchFractions(range.diameterMaxIn),
        depthMinIn: inchFractions(range.depthMinIn),
        depthMaxIn: inchFractions(range.depthMaxIn),
      },
    },
  }
}

export function pieceFormOf(entry: Exclude<EntryInput, { kind: 'drum' }>): PieceForm {
  const { kind, name, supply, count, remark, spec } = entry
  return {
    ...{ kind, name, supply, count: String(count), remark },
    spec: {
      type: spec.type,
      diameterIn: 'diameterIn' in spec ? inchFractions(spec.diameterIn) : '',
      phantom: 'phantom' in spec ? spec.phantom : false,
      stand: 'stand' in spec ? spec.stand : 'none',
    },
  }
}
