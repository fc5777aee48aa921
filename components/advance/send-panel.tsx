'use client'

import type { Route } from 'next'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { sendPacks } from '@/lib/client/dispatch'
import { usePackPreview } from '@/lib/client/packs'
import type { AdvanceView } from '@/lib/contracts/advance'
import { holdBackSeconds } from '@/lib/contracts/dispatch'
import { StandingBadge } from '../signature/standing-badge'
import { Button } from '../ui/button'
import { Checkbox } from '../ui/checkbox'
import { EmptyState } from '../ui/empty-state'
import { Field } from '../ui/field'
import { Notice } from '../ui/notice'
import { Select } from '../ui/select'
import { useAct } from './use-act'

type Choice = { key: string; contactId: string; showId: string | null; hireId: string | null; label: string; place: string }

const idsOf = (of: AdvanceView['of']) => ({ showId: of.kind === 'show' ? of.showId : null, hireId: of.kind === 'hire' ? of.hireId : null })

function choice(of: AdvanceView['of'], contactId: string, label: string, place: string): Choice {
  const ids = idsOf(of)
  return { key: `${ids.showId ?? ids.hireId} ${contactId}`, contactId, ...ids, label, place }
}

/** "Send to 3 venues": one revision to the recipients that are ticked, here and at other shows that play the same rig. */
export function SendPanel({ view }: { view: AdvanceView }) {
  const router = useRouter()
  const [revisionId, setRevisionId] = useState(view.revisions[0]?.id ?? '')
  const [picked, setPicked] = useState<ReadonlySet<string> | null>(null)
  const [holdBack, setHoldBack] = useState(false)
  // Made once for what is ticked, so that sending again after a lost answer is the same sending.
  const [ids, setIds] = useState<ReadonlyMap<string, string>>(new Map())
  const send = useAct(sendPacks)
  // The sending that the outcome tells of.
  const [heldBack, setHeldBack] = useState(false)
  const preview = usePackPreview()
  const revision = view.revisions.find((entry) => entry.id === revisionId)

  if (view.revisions.length === 0) {
    return (
      <EmptyState title="Nothing can be sent yet">
        Issue a revision of the rig first: it freezes kit, plot and patch, and only what is frozen is sent.
      </EmptyState>
    )
  }
  if (view.recipients.length === 0) {
    return <EmptyState title="Nobody to send to yet">Add a contact with a duty to the directory; packs go to whoever looks after backline.</EmptyState>
  }
  const own = view.recipients.filter((person) => person.duties.length > 0).map((person) => choice(view.of, person.contactId, `${person.name}, ${person.email}`, view.title))
  const others = view.others
    .filter((other) => other.of.kind === view.of.kind && revision && other.rigIds.includes(revision.rigId))
    .map((other) => ({ other, choices: other.recipients.map((person) => choice(other.of, person.contactId, person.name, other.title)) }))
  const all = [...own, ...others.flatMap((entry) => entry.choices)]
  const first = view.recipients.find((person) => person.duties.includes('backline')) ?? view.recipients[0]
  const ticked = picked ?? new Set(own.filter((entry) => entry.contactId === first?.contactId).map((entry) => entry.key))
  const chosen = all.filter((entry) => ticked.has(entry.key))
  const toggle = (key: string, on: boolean) => {
    const next = new Set(ticked)
    if (on) next.add(key)
    else next.delete(key)
    setPicked(next)
  }

  function submit() {
    const known = new Map(ids)
    for (const entry of chosen) if (!known.has(entry.key)) known.set(entry.key, crypto.randomUUID())
    setIds(known)
    setHeldBack(holdBack)
    send.run(
      {
        ...{ revisionId, holdBack },
        recipients: chosen.map(({ key, contactId, showId, hireId }) => ({ dispatchId: known.get(key) ?? '', contactId, showId, hireId })),
      },
      // The next press is another sending.
      { onSuccess: () => setIds(new Map()) },
    )
  }

  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault()
        submit()
      }}
    >
      <Field label="Revision">
        {(control) => (
          <Select
            {...control}
            value={revisionId}
            onChange={(event) => setRevisionId(event.target.value)}
            options={view.revisions.map((entry) => ({ value: entry.id, label: `${entry.rigName}, revision ${entry.number}: ${entry.note}` }))}
          />
        )}
      </Field>
      <fieldset>
        <legend className="text-sm font-bold">To</legend>
        {own.map((entry) => (
          <Checkbox key={entry.key} label={entry.label} checked={ticked.has(entry.key)} onChange={(event) => toggle(entry.key, event.target.checked)} />
        ))}
      </fieldset>
      {others.length > 0 && (
        <details>
          <summary className="flex min-h-control items-center underline underline-offset-4">
            {view.of.kind === 'show' ? 'Other shows that play this rig' : 'Other hires of this rig'}
          </summary>
          {others.map(({ other, choices }) => (
            <fieldset key={other.title} className="border-t border-line py-2">
              <legend className="sr-only">{other.title}</legend>
              <p aria-hidden className="flex flex-wrap items-center justify-between gap-x-3 text-sm font-bold">
                {other.title} <StandingBadge standing={other.standing} />
              </p>
              {choices.map((entry) => (
                <Checkbox key={entry.key} label={entry.label} checked={ticked.has(entry.key)} onChange={(event) => toggle(entry.key, event.target.checked)} />
              ))}
            </fieldset>
          ))}
        </details>
      )}
      <Checkbox
        label={`Hold it back for ${holdBackSeconds} seconds`}
        hint="Until then it can be stopped."
        checked={holdBack}
        onChange={(event) => setHoldBack(event.target.checked)}
      />
      <div className="flex flex-wrap gap-2">
        <Button type="submit" kind="primary" busy={send.busy && 'Sending'} disabled={chosen.length === 0}>
          {sendWords(chosen, revision?.number)}
        </Button>
        <Button
          busy={preview.isPending && 'Composing'}
          onClick={() => {
            const own = idsOf(view.of)
            preview.mutate(
              { revisionId, ...(own.showId ? { showId: own.showId } : {}), ...(own.hireId ? { hireId: own.hireId, rigId: revision?.rigId } : {}) },
              { onSuccess: (made) => router.push(`/tours/${view.tourId}/revisions/packs/${made.id}` as Route) },
            )
          }}
        >
          Look at the pack first
        </Button>
      </div>
      {send.trouble && <Notice kind="error">{send.trouble}</Notice>}
      {preview.error && <Notice kind="error">{preview.error.message}</Notice>}
      {send.answer && <Outcomes outcomes={send.answer.outcomes} choices={all} heldBack={heldBack} />}
    </form>
  )
}

function sendWords(chosen: readonly Choice[], number: number | undefined): string {
  const places = new Set(chosen.map((entry) => entry.showId ?? entry.hireId))
  const [one] = chosen
  if (!one) return 'Choose a recipient'
  const what = `Send revision ${number ?? ''}`
  if (places.size > 1) return `${what} to ${places.size} ${one.showId ? 'venues' : 'suppliers'}`
  return chosen.length === 1 ? `${what} to ${one.label.split(',')[0]}` : `${what} to ${chosen.length} people`
}

interface OutcomesProps {
  outcomes: readonly { dispatchId: string; contactId: string; outcome: string; message: string }[]
  choices: readonly Choice[]
  heldBack: boolean
}

function Outcomes({ outcomes, choices, heldBack }: OutcomesProps) {
  const refused = outcomes.filter((entry) => entry.outcome === 'refused')
  const queued = outcomes.length - refused.length
  const packs = queued === 1 ? '1 pack' : `${queued} packs`
  return (
    <>
      {queued > 0 && (
        <Notice kind="success">
          {heldBack
            ? `${packs} held back for ${holdBackSeconds} seconds. Recipients says how it stands.`
            : `${packs} sent off. Recipients says when the mail has arrived.`}
        </Notice>
      )}
      {refused.map((entry) => (
        <Notice key={entry.dispatchId} kind="error">
          {choices.find((other) => other.contactId === entry.contactId)?.label ?? 'A recipient'}: {entry.message}
        </Notice>
      ))}
    </>
  )
}
