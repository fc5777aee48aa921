'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useMutation } from '@tanstack/react-query'
import { useState } from 'react'
import type { DefaultValues, FieldValues, Path, UseFormReturn } from 'react-hook-form'
import { useForm } from 'react-hook-form'
import type { z } from 'zod'
import { AppError } from '@/lib/errors'

export interface SavingFormOptions<Fields extends FieldValues, Row> {
  schema: z.ZodType<Fields, Fields>
  /** What stands in the fields at first; a number that only its reader knows is left out. */
  start: DefaultValues<Fields>
  /** The version that the form was opened on; null where it makes something new. */
  version: number | null
  /** The key under which the request carries the fields: the route names them with it. */
  key: string
  /** `id` is made once a form, so that sending again after a lost answer is the same request. */
  save: (request: { id: string; version: number; fields: Fields }) => Promise<Row>
  /** The row that stands now, out of a refusal that carries it. */
  readCurrent: ((current: unknown) => { version: number; fields: Fields } | null) | null
  onSaved: (row: Row) => void
}

/** Why a form is not saved. What was typed is kept in each case. */
export type Trouble<Fields> =
  | { kind: 'lost' }
  | { kind: 'refused'; message: string }
  | { kind: 'changed meanwhile'; version: number; theirs: Fields; mine: Fields }

export interface SavingForm<Fields extends FieldValues> {
  form: UseFormReturn<Fields, unknown, Fields>
  saving: boolean
  trouble: Trouble<Fields> | null
  /** Counts the times the fields were filled afresh: inputs that keep their own text begin again with it. */
  filled: number
  submit: () => void
  saveOverTheirs: () => void
  takeTheirs: () => void
}

/** A form over one contract that keeps what was typed until it is saved, whatever becomes of the request. */
export function useSavingForm<Fields extends FieldValues, Row>(
  options: SavingFormOptions<Fields, Row>,
): SavingForm<Fields> {
  const { schema, start, key, save, readCurrent, onSaved } = options
  const [id] = useState(() => crypto.randomUUID())
  // The version is the one seen when the form was opened, though the page behind it may be read again meanwhile.
  const [version, setVersion] = useState(options.version ?? 0)
  const [trouble, setTrouble] = useState<Trouble<Fields> | null>(null)
  const [filled, setFilled] = useState(0)
  const form = useForm<Fields, unknown, Fields>({
    resolver: zodResolver(schema),
    defaultValues: start,
  })
  const sending = useMutation({ mutationFn: save })

  const placeFieldErrors = (fields: Record<string, unknown>) => {
    const own = Object.entries(fields).filter(([path]) => path.startsWith(`${key}.`))
    own.forEach(([path, message], index) =>
      // The path is the contract's own, read back by the route from the same schema.
      form.setError(
        path.slice(key.length + 1) as Path<Fields>,
        { message: String(message) },
        { shouldFocus: index === 0 },
      ),
    )
    return own.length > 0
  }

  const send = async (fields: Fields, seen: number) => {
    setTrouble(null)
    try {
      onSaved(await sending.mutateAsync({ id, version: seen, fields }))
    } catch (error) {
      setTrouble(troubleOf(error, fields))
    }
  }

  const troubleOf = (error: unknown, mine: Fields): Trouble<Fields> | null => {
    if (!(error instanceof AppError))
      return {
        kind: 'refused',
        message: 'Something failed on this page. What you typed is kept here; please try again.',
      }
    if (error.code === 'unavailable') return { kind: 'lost' }
    const details = error.details ?? {}
    const current = error.code === 'stale' ? readCurrent?.(details['current']) : null
    if (current) return { kind: 'changed meanwhile', version: current.version, theirs: current.fields, mine }
    const fields = details['fields']
    if (fields && typeof fields === 'object' && placeFieldErrors(fields as Record<string, unknown>)) return null
    return { kind: 'refused', message: error.message }
  }

  return {
    form,
    saving: sending.isPending,
    trouble,
    filled,
    submit: () => void form.handleSubmit((fields) => send(fields, version))(),
    saveOverTheirs: () => {
      if (trouble?.kind !== 'changed meanwhile') return
      setVersion(trouble.version)
      const seen = trouble.version
      void form.handleSubmit((fields) => send(fields, seen))()
    },
    takeTheirs: () => {
      if (trouble?.kind !== 'changed meanwhile') return
      setVersion(trouble.version)
      form.reset(trouble.theirs)
      setFilled(filled + 1)
      setTrouble(null)
    },
  }
}
