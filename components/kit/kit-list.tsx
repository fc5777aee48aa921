'use client'

import { useEffect, useRef, useState } from 'react'
import { Notice } from '@/components/ui/notice'
import { showToast } from '@/components/ui/toast'
import { useKit, useMarkEntry, useOrderKit } from '@/lib/client/kit'
import type { Entry, EntryInput } from '@/lib/contracts/kit'
import { entryKinds } from '@/lib/contracts/kit'
import { AddToKit } from './add-to-kit'
import { CopyKit } from './copy-kit'
import type { KitSource } from './copy-kit'
import { DraftNotice } from './draft-notice'
import { EmptyKit } from './empty-kit'
import { EntryActions } from './entry-actions'
import { EntryEditor } from './entry-editor'
import { keptDrafts } from './entry-target'
import type { EntryDraft, EntryTarget } from './entry-target'
import type { KitReader } from './kit-reader'
import { KitSection } from './kit-section'
import { swapNeighbours } from './swap-neighbours'
import { TakenOut } from './taken-out'
import { WaitingForConnection } from './waiting-for-connection'

export interface KitListProps {
  rigId: string
  initial: readonly Entry[]
  sources: readonly KitSource[]
  reader: KitReader
  mayEdit: boolean
}

const editId = (entryId: string) => `kit-edit-${entryId}`

/** The kit of a rig by kind: read, added to, changed, ordered, taken out and put back. */
export function KitList({ rigId, initial, sources, reader, mayEdit }: KitListProps) {
  const all = useKit(rigId, initial).data
  const entries = all.filter(({ removed }) => !removed)
  const [open, setOpen] = useState<{ target: EntryTarget; typed: EntryDraft['typed'] | null } | null>(null)
  const [draft, setDraft] = useState<EntryDraft | null>(() => keptDrafts.read(rigId))
  const focusAfter = useRef<string | null>(null)
  const order = useOrderKit(rigId)
  const mark = useMarkEntry(rigId)

  const setRemoved = (entry: Entry, removed: boolean) =>
    mark.mutate(
      { entry, removed },
      {
        onSuccess: (after) =>
          removed
            ? showToast(`${after.name} is out of the kit.`, {
                label: `Put ${after.name} back`,
                run: () => setRemoved(after, false),
              })
            : showToast(`${after.name} is back in the kit.`),
      },
    )
  const close = (entryId: string) => {
    setOpen(null)
    focusAfter.current = editId(entryId)
  }
  useEffect(() => {
    if (open || !focusAfter.current) return
    document.getElementById(focusAfter.current)?.focus()
    focusAfter.current = null
  }, [open])
  const forget = () => {
    keptDrafts.drop(rigId)
    setDraft(null)
  }
  const add = (start: EntryInput) => setOpen({ target: { do: 'add', id: crypto.randomUUID(), start }, typed: null })
  const editor = open && (
    <EntryEditor
      key={open.target.id}
      {...{ rigId, reader, target: open.target, typed: open.typed }}
      onSaved={(saved) => {
        close(saved.id)
        showToast(open.target.do === 'add' ? `${saved.name} is in the kit.` : `${saved.name} is saved.`)
      }}
      onLeave={() => close(open.target.id)}
      onAbandon={(left) => {
        keptDrafts.keep(rigId, left)
        setDraft(left)
      }}
    />
  )
  const beneath = draft && draft.target.id !== open?.target.id && (
    <DraftNotice
      name={draft.typed.name || draft.target.start.name}
      onGoOn={() => {
        setOpen(draft)
        forget()
      }}
      onDrop={forget}
    />
  )
  const failed = order.error ?? mark.error

  return (
    <>
      <WaitingForConnection
        busy={order.isPending || mark.isPending}
        tries={order.failureCount + mark.failureCount}
        what="Your change"
      />
      {failed && !order.isPending && !mark.isPending && (
        <Notice kind="error" className="mt-4">
          {failed.message}
        </Notice>
      )}
      {entries.length === 0 && !open && !draft ? (
        <div className="mt-6">
          <EmptyKit
            rigId={rigId}
            mayEdit={mayEdit}
            others={
              <>
                <CopyKit rigId={rigId} sources={sources} />
                <AddToKit kind="drum" onAdd={add} />
              </>
            }
          />
        </div>
      ) : (
        entryKinds.map((kind) => {
          const ofKind = entries.filter((entry) => entry.kind === kind)
          const move = (index: number, by: -1 | 1) => {
            const ids = swapNeighbours(entries, ofKind[index], ofKind[index + by])
            return ids && (() => order.mutate(ids))
          }
          return (
            <KitSection
              key={kind}
              {...{ kind, reader, entries: ofKind }}
              add={mayEdit && <AddToKit kind={kind} onAdd={add} />}
              editing={open?.target.start.kind === kind ? { id: open.target.id, form: editor } : null}
              beneath={
                draft && beneath && draft.target.start.kind === kind ? { id: draft.target.id, notice: beneath } : null
              }
              actionsOf={(entry, index) =>
                mayEdit && (
                  <EntryActions
                    editId={editId(entry.id)}
                    name={entry.name}
                    onUp={move(index, -1)}
                    onDown={move(index, 1)}
                    onEdit={() => setOpen({ target: { do: 'change', id: entry.id, start: entry }, typed: null })}
                    onRemove={() => setRemoved(entry, true)}
                  />
                )
              }
            />
          )
        })
      )}
      {mayEdit && entries.length > 0 && sources.length > 0 && (
        <div className="mt-8">
          <CopyKit rigId={rigId} sources={sources} />
        </div>
      )}
      <TakenOut
        entries={all.filter(({ removed }) => removed)}
        onPutBack={mayEdit ? (entry) => setRemoved(entry, false) : null}
      />
    </>
  )
}
