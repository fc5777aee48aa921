import { daysBetween } from '@/lib/staging/calendar'
import type { Standing } from './standing'

/** What a run needs from somebody. The words of the button follow from the kind. */
export type NextKind =
  | 'add days'
  | 'add a show'
  | 'start the kit'
  | 'issue'
  | 'give the zone'
  | 'add a contact'
  | 'send'
  | 'send again'
  | 'take down'
  | 'send what changed'
  | 'settle'

export interface NextStep {
  /** The same step has the same key while it stands. */
  readonly key: string
  readonly kind: NextKind
  /** What it is about, as its reader knows it ("Salle Nord, Arvic, Thu 15 Oct"). */
  readonly about: string
  /** Date of the show, or of the delivery; null where none presses. */
  readonly date: string | null
  readonly rigId: string | null
  readonly showId: string | null
  readonly hireId: string | null
}

/** A show or a hire, as far as it can need something. */
export interface NextSubject {
  readonly id: string
  readonly about: string
  /** Date of the show, or of the hire's first show, YYYY-MM-DD. */
  readonly date: string
  readonly rigIds: readonly string[]
  readonly zoneKnown: boolean
  readonly hasContact: boolean
  readonly sent: boolean
  readonly standing: Standing
}

export interface NextUpFacts {
  /** Today's date where the reader is, YYYY-MM-DD. */
  readonly today: string
  /** What the reader's roles let them do: nobody is told what they cannot do. */
  readonly may: {
    readonly editRun: boolean
    readonly editKit: boolean
    readonly issue: boolean
    readonly editDirectory: boolean
    readonly send: boolean
    readonly settle: boolean
  }
  readonly dayCount: number
  readonly rigs: readonly {
    readonly id: string
    readonly name: string
    readonly entries: number
    readonly revision: number | null
  }[]
  readonly shows: readonly NextSubject[]
  readonly hires: readonly NextSubject[]
}

/**
 * How many days each kind moves a thing forward: a mail that came back ten weeks ahead presses as much as a pack that is
 * still to be sent six weeks ahead.
 */
const daysForward: Record<NextKind, number> = {
  'send again': 28,
  'take down': 24,
  'send what changed': 21,
  settle: 14,
  issue: 10,
  'start the kit': 10,
  'give the zone': 7,
  'add a contact': 7,
  send: 0,
  'add days': 0,
  'add a show': 0,
}

const byStanding: Partial<Record<Standing, NextKind>> = {
  'not delivered': 'send again',
  overdue: 'take down',
  'changed since': 'send what changed',
  answered: 'settle',
}

/** What a run needs from this reader now, most urgent first. Shows that were played need nothing more. */
export function nextUp(facts: NextUpFacts): NextStep[] {
  const { may, today } = facts
  if (facts.dayCount === 0) return may.editRun ? [plain('add days', 'the run')] : []
  const ahead = facts.shows.filter((show) => show.date >= today)
  const steps: NextStep[] = []
  if (facts.shows.length === 0 && may.editRun) steps.push(plain('add a show', 'the run'))
  for (const rig of facts.rigs) {
    const first = ahead.find((show) => show.rigIds.includes(rig.id))
    const step = { about: rig.name, date: first?.date ?? null, rigId: rig.id, showId: null, hireId: null }
    if (rig.entries === 0 && may.editKit) steps.push({ ...step, key: `kit ${rig.id}`, kind: 'start the kit' })
    if (rig.entries > 0 && rig.revision === null && first && may.issue) {
      steps.push({ ...step, key: `issue ${rig.id}`, kind: 'issue' })
    }
  }
  const issued = new Set(facts.rigs.filter((rig) => rig.revision !== null).map((rig) => rig.id))
  for (const show of ahead) {
    if (!show.zoneKnown && may.editRun) steps.push(of(show, 'give the zone', 'show'))
    steps.push(...advance(show, 'show', may, issued))
  }
  const hiresAhead = facts.hires.filter((hire) => hire.date >= today)
  for (const hire of hiresAhead) steps.push(...advance(hire, 'hire', may, issued))
  return steps
    .map((step) => ({ step, press: pressing(step, today) }))
    .sort((a, b) => a.press - b.press || (a.step.key < b.step.key ? -1 : 1))
    .map(({ step }) => step)
}

function advance(
  subject: NextSubject,
  what: 'show' | 'hire',
  may: NextUpFacts['may'],
  issued: ReadonlySet<string>,
): NextStep[] {
  if (!subject.hasContact && may.editDirectory) return [of(subject, 'add a contact', what)]
  const kind = subject.sent
    ? byStanding[subject.standing]
    : subject.rigIds.some((id) => issued.has(id))
      ? 'send'
      : undefined
  if (!kind || !subject.hasContact) return []
  const allowed = kind === 'settle' || kind === 'take down' ? may.settle : may.send
  return allowed ? [of(subject, kind, what)] : []
}

function of(subject: NextSubject, kind: NextKind, what: 'show' | 'hire'): NextStep {
  return {
    key: `${kind} ${subject.id}`,
    kind,
    about: subject.about,
    date: subject.date,
    rigId: null,
    showId: what === 'show' ? subject.id : null,
    hireId: what === 'hire' ? subject.id : null,
  }
}

function plain(kind: NextKind, about: string): NextStep {
  return { key: kind, kind, about, date: null, rigId: null, showId: null, hireId: null }
}

/** Days left, less the days its kind moves it forward; without a date it can wait for everything that has one. */
function pressing(step: NextStep, today: string): number {
  return step.date === null ? Number.MAX_SAFE_INTEGER : daysBetween(today, step.date) - daysForward[step.kind]
}
