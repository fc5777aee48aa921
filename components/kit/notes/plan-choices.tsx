import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { classes } from '@/components/ui/classes'
import { noteText } from '@/lib/contracts/kit-form'
import type { DrumEntry } from '@/lib/contracts/kit'
import type { JudgedPlan } from '@/lib/tuning/note-plan-model'
import type { KitReader } from '../kit-reader'
import { costWords } from './cost-words'

/** One plan that could be taken. */
export interface PlanChoice {
  readonly id: string
  /** "the best", "plan 3". */
  readonly name: string
  readonly plan: JudgedPlan
  /** Why it stands where it does, a sentence each. */
  readonly why: readonly string[]
  /** Whether it is the plan as it is drawn now. */
  readonly current: boolean
}

export interface PlanChoicesProps {
  /** What they were planned by ("Fourths from A2 on Tom 14"). */
  title: string
  choices: readonly PlanChoice[]
  drums: readonly DrumEntry[]
  reader: KitReader
  /** The id of the plan that is looked at. */
  lookedAt: string | null
  /** Null: only to be read. */
  hands: { look: (choice: PlanChoice | null) => void; keep: (choice: PlanChoice) => void } | null
}

/** As many as stand beside the chart; the rest are there to be asked for. */
const shownAtFirst = 5

/** The best plan and the next best, each with its notes, its cost and why, to be looked at on the chart and kept. */
export function PlanChoices({ title, choices, drums, reader, lookedAt, hands }: PlanChoicesProps) {
  const [all, setAll] = useState(false)
  const more = choices.length - shownAtFirst
  return (
    <section aria-label="Plans, best first">
      <h2 className="text-xl">Plans, best first</h2>
      <p className="text-sm text-soft">{title}; notes in the order of the chart</p>
      <ol className="mt-2 border-t border-line">
        {choices.slice(0, all ? undefined : shownAtFirst).map((choice) => {
          const looking = choice.id === lookedAt
          return (
            <li
              key={choice.id}
              className={classes(
                'border-b border-l-4 border-b-line py-2 pl-3',
                looking ? 'border-l-spike bg-sheet' : choice.current ? 'border-l-reed' : 'border-l-line',
              )}
            >
              <div className="flex flex-wrap items-baseline justify-between gap-x-3">
                <h3 className="text-base first-letter:uppercase">{choice.name}</h3>
                <span className="figures text-sm text-soft">costs {costWords(choice.plan.cost)}</span>
              </div>
              <p className="figures text-[0.9375rem]">{notesOf(choice.plan, drums, reader)}</p>
              {choice.why.map((sentence) => (
                <p key={sentence} className="text-sm text-soft">
                  {sentence}
                </p>
              ))}
              {choice.current ? (
                <p className="text-sm font-bold text-reed">Your plan as it is</p>
              ) : (
                hands && (
                  <div className="-ml-4 flex flex-wrap">
                    <Button kind="quiet" aria-pressed={looking} onClick={() => hands.look(looking ? null : choice)}>
                      {looking ? 'Back to my plan' : `Look at ${choice.name}`}
                    </Button>
                    <Button kind="quiet" onClick={() => hands.keep(choice)}>
                      Keep {choice.name}
                    </Button>
                  </div>
                )
              )}
            </li>
          )
        })}
      </ol>
      {more > 0 && (
        <Button kind="quiet" aria-expanded={all} onClick={() => setAll(!all)} className="mt-1 -ml-4">
          {all ? 'Only the best five' : `${more} more`}
        </Button>
      )}
    </section>
  )
}

/** The notes in the order of the chart: "D3 A2 E2, A1, E3". */
function notesOf(plan: JudgedPlan, drums: readonly DrumEntry[], reader: KitReader): string {
  const notes = new Map(plan.drums.map(({ drumId, note }) => [drumId, note]))
  return drums
    .flatMap(({ id }) => {
      const note = notes.get(id)
      return note ? [noteText(note, reader.locale)] : []
    })
    .join(' ')
}
