'use client'

import type { ReactNode } from 'react'
import type { FieldValues } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import type { SavingForm } from '@/lib/client/use-saving-form'
import { ChangedMeanwhile } from './changed-meanwhile'

export interface SaveFormProps<Fields extends FieldValues> {
  saving: SavingForm<Fields>
  /** Names the form to a screen reader ("Salle Nord"). */
  label: string
  /** The words of its button, and what they become while it works. */
  action: string
  busy: string
  /** The fields by their names, for the comparison when somebody else was quicker. */
  names: Partial<Record<keyof Fields & string, string>>
  /** A value of the comparison in words, where its text alone would not do. */
  say?: (field: keyof Fields & string, value: unknown) => string | undefined
  onClose: (() => void) | null
  children: ReactNode
}

/** The frame of every form at the desk: its fields, what became of saving them, and its buttons. */
export function SaveForm<Fields extends FieldValues>(props: SaveFormProps<Fields>) {
  const { saving, label, action, busy, names, say, onClose, children } = props
  const { trouble } = saving
  return (
    <form
      noValidate
      aria-label={label}
      className="flex flex-col gap-4"
      onSubmit={(event) => {
        event.preventDefault()
        saving.submit()
      }}
    >
      <div key={saving.filled} className="contents">
        {children}
      </div>
      {trouble?.kind === 'lost' && (
        <Notice kind="error" word="Not saved yet" action={<Button onClick={saving.submit}>Try again</Button>}>
          There is no connection. What you typed is kept here.
        </Notice>
      )}
      {trouble?.kind === 'refused' && <Notice kind="error">{trouble.message}</Notice>}
      {trouble?.kind === 'changed meanwhile' && (
        <ChangedMeanwhile
          mine={trouble.mine}
          theirs={trouble.theirs}
          names={names}
          say={say}
          onSaveMine={saving.saveOverTheirs}
          onTakeTheirs={saving.takeTheirs}
        />
      )}
      <div className="flex flex-wrap gap-2">
        <Button type="submit" kind="primary" busy={saving.saving ? busy : null}>
          {action}
        </Button>
        {onClose && (
          <Button kind="quiet" onClick={onClose}>
            Close without saving
          </Button>
        )}
      </div>
    </form>
  )
}
