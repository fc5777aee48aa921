import type { ComponentProps } from 'react'
import { controlClasses } from './control-classes'

/** One line of text. */
export function TextInput({ className, type = 'text', ...rest }: ComponentProps<'input'>) {
  return <input {...rest} type={type} className={controlClasses(className)} />
}
