import type { ComponentProps } from 'react'
import { controlClasses } from './control-classes'

/** Several lines of text. */
export function TextArea({ className, rows = 3, ...rest }: ComponentProps<'textarea'>) {
  return <textarea {...rest} rows={rows} className={controlClasses(className)} />
}
