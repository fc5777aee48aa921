'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useEffect, useRef } from 'react'
import type { ReactNode } from 'react'
import { FormProvider, useForm } from 'react-hook-form'
import type { DefaultValues, FieldErrors, FieldValues } from 'react-hook-form'
import type { z } from 'zod'
import { Button } from '@/components/ui/button'
import { ErrorSummary } from '@/components/ui/error-summary'
import { Notice } from '@/components/ui/notice'
import type { Entry, EntryInput } from '@/lib/contracts/kit'
import { ClashNotice } from './clash-notice'
import type { EntryTarget } from './entry-target'
import { fieldId } from './field-id'
import type { KitReader } from './kit-reader'
import { useSaveForm } from './use-save-form'
import { WaitingForConnection } from './waiting-for-connection'

export interface EntryFormProps<Form extends FieldValues> {
  rigId: string
  target: EntryTarget
  schema: z.ZodType<EntryInput, Form>
  /** The form of an entry, for what it starts from and for taking theirs. */
  formOf: (entry: EntryInput) => Form
  /** What was typed before, if this goes on from there. */
  typed: Form | null
  reader: KitReader
  title: string
  onSaved: (entry: Entry) => void
  onLeave: () => void
  /** Called with what was typed when the form goes away unsaved. */
  onAbandon: (typed: Form) => void
  children: ReactNode
}

/** The form of one entry: everything wrong at once, nothing typed ever lost. */
export function EntryForm<Form extends FieldValues>(props: EntryFormProps<Form>) {
  const { rigId, target, schema, formOf, typed, reader, title, onSaved, onLeave, onAbandon, children } = props
  const start = formOf(target.start)
  const form = useForm<Form, unknown, EntryInput>({
    resolver: zodResolver(schema),
    defaultValues: start as DefaultValues<Form>,
    ...(typed ? { values: typed, resetOptions: { keepDefaultValues: true } } : {}),
    mode: 'onTouched',
    shouldFocusError: false,
  })
  const { errors, isDirty, submitCount } = form.formState
  const unsaved = useRef(false)
  useEffect(() => {
    unsaved.current = isDirty
  }, [isDirty])
  const saving = useSaveForm<Form>({
    rigId,
    target,
    form,
    onSaved: (entry) => {
      unsaved.current = false
      onSaved(entry)
    },
  })
  useKeepWhatWasTyped(
    () => unsaved.current,
    () => onAbandon(form.getValues()),
  )
  const top = useRef<HTMLFormElement>(null)
  useEffect(() => top.current?.querySelector<HTMLElement>('input, select')?.focus(), [])

  const { clash, busy, tries } = saving
  return (
    <FormProvider {...form}>
      <form
        ref={top}
        noValidate
        aria-label={title}
        onSubmit={(event) => void saving.submit(event)}
        className="flex flex-col gap-5 border-2 border-ink bg-sheet p-4"
      >
        <h3 className="text-2xl">{title}</h3>
        <ErrorSummary
          key={submitCount}
          title="Not saved yet: please look at these"
          errors={submitCount > 0 ? errorList(errors) : []}
        />
        {children}
        {/* Where the button was pressed: whoever saves from the foot must not look for the answer at the top. */}
        {saving.said && Object.keys(errors).length === 0 && (
          <Notice kind="error">{saving.said} What you typed is kept here.</Notice>
        )}
        {clash && (
          <ClashNotice
            {...{ ...clash, reader, busy }}
            onKeepMine={() => void saving.keepMine()}
            onTakeTheirs={() => {
              unsaved.current = false
              onSaved(clash.theirs)
            }}
          />
        )}
        <WaitingForConnection busy={busy} tries={tries} what="What you typed" />
        <div className="flex flex-wrap gap-2 border-t border-line pt-3">
          <Button kind="primary" type="submit" busy={busy && 'Saving'}>
            {target.do === 'add' ? 'Add to the kit' : 'Save changes'}
          </Button>
          <Button kind="quiet" onClick={onLeave}>
            {isDirty ? 'Leave it for now' : 'Close'}
          </Button>
        </div>
      </form>
    </FormProvider>
  )
}

/** Hands over what was typed when the form goes away unsaved, and asks before the whole page does. */
function useKeepWhatWasTyped(isUnsaved: () => boolean, abandon: () => void) {
  const latest = useRef({ isUnsaved, abandon })
  useEffect(() => {
    latest.current = { isUnsaved, abandon }
  })
  useEffect(() => {
    const ask = (event: BeforeUnloadEvent) => {
      if (latest.current.isUnsaved()) event.preventDefault()
    }
    window.addEventListener('beforeunload', ask)
    return () => {
      window.removeEventListener('beforeunload', ask)
      if (latest.current.isUnsaved()) latest.current.abandon()
    }
  }, [])
}

function errorList(errors: FieldErrors, at: readonly string[] = []): { fieldId: string; message: string }[] {
  return Object.entries(errors).flatMap(([key, error]) => {
    if (!error || typeof error !== 'object') return []
    const path = [...at, key]
    const message = (error as { message?: unknown }).message
    if (typeof message === 'string')
      return [{ fieldId: fieldId(path.join('.')), message: `${pathWords(path)}: ${message}` }]
    return errorList(error as FieldErrors, path)
  })
}

const words: Record<string, string> = {
  ...{
    diameterIn: 'across',
    depthIn: 'deep',
    lugs: 'lugs',
    plyMils: 'plies',
    coatingGPerM2: 'coating',
    gauge: 'gauge',
  },
  ...{
    headRelationCents: 'resonant over batter',
    measuredTapRatio: 'tap over note',
    toleranceCents: 'even within',
    warbleLimitHz: 'warble under',
    insteadOf: 'instead of',
    type: 'kind',
  },
  ...{ diameterMinIn: 'across, from', diameterMaxIn: 'across, to', depthMinIn: 'deep, from', depthMaxIn: 'deep, to' },
  ...{ range: 'range', slackNPerM: 'slack under', chokedNPerM: 'chokes over' },
  ...{ batter: 'batter head', resonant: 'resonant head', supply: 'brought by', count: 'how many' },
}

/** A path as the form's labels say it: "Batter head, plies". */
function pathWords(path: readonly string[]): string {
  const said = path.filter((part) => part !== 'spec').map((part) => words[part] ?? part)
  const text = said.join(', ')
  return text.charAt(0).toUpperCase() + text.slice(1)
}
