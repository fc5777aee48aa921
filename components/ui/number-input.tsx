import type { ComponentProps } from 'react'
import { classes } from './classes'
import { controlClasses } from './control-classes'

export interface NumberInputProps extends Omit<ComponentProps<'input'>, 'type'> {
  /** The unit that stands behind the number and is read out with it. */
  unit?: string
}

/** A number, with its unit at its right end. Text with a decimal keyboard: a wheel or an arrow key must not change a size. */
export function NumberInput({ unit, className, ...rest }: NumberInputProps) {
  const unitId = unit && rest.id ? `${rest.id}-unit` : undefined
  return (
    <span className={classes('relative block', className)}>
      <input
        inputMode="decimal"
        autoComplete="off"
        {...rest}
        type="text"
        aria-describedby={classes(unitId, rest['aria-describedby']) || undefined}
        className={controlClasses('figures')}
        style={unit ? { paddingRight: `${unit.length + 2}ch` } : undefined}
      />
      {unit && (
        <span
          id={unitId}
          className="pointer-events-none absolute inset-y-0 right-2.5 flex items-center text-sm text-soft"
        >
          {unit}
        </span>
      )}
    </span>
  )
}
