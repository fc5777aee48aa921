import { useId } from 'react'
import type { ComponentProps, ReactNode } from 'react'
import { classes } from './classes'
import { FieldError } from './field'

export interface RadioOption {
  value: string
  label: ReactNode
  disabled?: boolean
}

export interface RadioGroupProps extends Omit<ComponentProps<'input'>, 'type' | 'value' | 'defaultValue'> {
  legend: ReactNode
  /** Keeps the legend for screen readers only, where the heading above says the same. */
  legendHidden?: boolean
  name: string
  options: readonly RadioOption[]
  /** Given with `onChange`: the choice is held outside. */
  value?: string | null
  defaultValue?: string
  hint?: ReactNode
  error?: string | undefined
  /** How many stand beside one another: all in one row, or two by two. */
  columns?: 'row' | 'two' | 'one'
}

const layouts = { row: 'grid auto-cols-fr grid-flow-col', two: 'grid grid-cols-2 gap-2', one: 'grid gap-2' }

/** One choice out of a few, as large buttons; underneath they are radio buttons, with a radio button's keys. */
export function RadioGroup(props: RadioGroupProps) {
  const { legend, legendHidden, options, value, defaultValue, hint, error, columns = 'row', className, ...rest } = props
  const id = useId()
  const described = classes(hint ? `${id}-hint` : null, error ? `${id}-error` : null) || undefined
  return (
    <fieldset className={classes('min-w-0', className)} aria-describedby={described}>
      <legend className={legendHidden ? 'sr-only' : 'mb-1 text-sm font-bold'}>{legend}</legend>
      <div className={layouts[columns]}>
        {options.map((option, index) => (
          <label
            key={option.value}
            className={classes(
              'relative flex min-h-control cursor-pointer items-center justify-center border border-ink px-3 py-1 text-center leading-tight font-bold',
              'has-checked:bg-ink has-checked:text-paper has-focus-visible:z-10 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-spike',
              'has-disabled:cursor-default has-disabled:border-line has-disabled:text-soft',
              columns === 'row' && index > 0 && '-ml-px',
            )}
          >
            <input
              {...rest}
              type="radio"
              value={option.value}
              disabled={option.disabled ?? rest.disabled}
              className="absolute inset-0 size-full cursor-[inherit] appearance-none opacity-0"
              {...(value === undefined
                ? { defaultChecked: defaultValue === undefined ? undefined : defaultValue === option.value }
                : { checked: value === option.value })}
            />
            {option.label}
          </label>
        ))}
      </div>
      {hint && (
        <p id={`${id}-hint`} className="mt-1 text-sm text-soft">
          {hint}
        </p>
      )}
      {error && (
        <div className="mt-1">
          <FieldError id={`${id}-error`}>{error}</FieldError>
        </div>
      )}
    </fieldset>
  )
}
