import type { ComponentProps } from 'react'
import { controlClasses } from './control-classes'

export interface SelectOption {
  value: string
  label: string
  disabled?: boolean
}

export interface SelectProps extends ComponentProps<'select'> {
  options: readonly SelectOption[]
  /** The first, empty choice in words ("Choose a venue"). */
  placeholder?: string
}

/** The browser's own list of choices: it works with every keyboard, reader and phone. */
export function Select({ options, placeholder, className, ...rest }: SelectProps) {
  return (
    <select {...rest} className={controlClasses(className)}>
      {placeholder !== undefined && <option value="">{placeholder}</option>}
      {options.map((option) => (
        <option key={option.value} value={option.value} disabled={option.disabled}>
          {option.label}
        </option>
      ))}
    </select>
  )
}
