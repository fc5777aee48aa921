import { useId } from 'react'
import type { ReactNode } from 'react'
import { classes } from './classes'

/** What a field hands its control, so that label, hint and error are read out with it. */
export interface FieldControl {
  id: string
  'aria-describedby': string | undefined
  'aria-invalid': true | undefined
}

export interface FieldProps {
  label: ReactNode
  /** What is allowed, before anything went wrong. */
  hint?: ReactNode
  /** What is wrong and what is allowed. */
  error?: string | undefined
  /** Says "not needed" beside the label. */
  optional?: boolean
  /** Fixes the control's id, so that an error summary can lead to it. */
  id?: string | undefined
  className?: string
  children: (control: FieldControl) => ReactNode
}

/** A label, its control, a hint and an error, tied together. */
export function Field({ label, hint, error, optional, id, className, children }: FieldProps) {
  const own = useId()
  const controlId = id ?? own
  const described = [hint && `${controlId}-hint`, error && `${controlId}-error`].filter(Boolean).join(' ')
  return (
    <div className={classes('flex flex-col gap-1', className)}>
      <label htmlFor={controlId} className="text-sm font-bold">
        {label}
        {optional && <span className="font-normal text-soft">, not needed</span>}
      </label>
      {children({
        id: controlId,
        'aria-describedby': described || undefined,
        'aria-invalid': error ? true : undefined,
      })}
      {hint && (
        <p id={`${controlId}-hint`} className="text-sm text-soft">
          {hint}
        </p>
      )}
      {error && <FieldError id={`${controlId}-error`}>{error}</FieldError>}
    </div>
  )
}

/** What is wrong with one field, marked by edge, word and colour. */
export function FieldError({ id, children }: { id: string; children: ReactNode }) {
  return (
    <p id={id} className="border-l-4 border-spike pl-2 text-sm font-bold text-spike-text">
      {children}
    </p>
  )
}
