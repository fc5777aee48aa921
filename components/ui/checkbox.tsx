import { useId } from 'react'
import type { ComponentProps, ReactNode } from 'react'
import { classes } from './classes'

export interface CheckboxProps extends Omit<ComponentProps<'input'>, 'type'> {
  label: ReactNode
  hint?: ReactNode
}

/** A box to tick, with its words. */
export function Checkbox({ label, hint, className, id, ...rest }: CheckboxProps) {
  const own = useId()
  const boxId = id ?? own
  const hintId = hint ? `${boxId}-hint` : undefined
  return (
    <div className={classes('flex min-h-control items-start gap-3', className)}>
      <input
        {...rest}
        id={boxId}
        type="checkbox"
        aria-describedby={classes(hintId, rest['aria-describedby']) || undefined}
        className="mt-1 size-5 shrink-0 accent-ink"
      />
      <label htmlFor={boxId} className="grow py-0.5">
        {label}
        {hint && (
          <span id={hintId} className="block text-sm text-soft">
            {hint}
          </span>
        )}
      </label>
    </div>
  )
}
