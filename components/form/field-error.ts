import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form'

type Fault = { message?: unknown } & Record<string, unknown>

function firstMessage(fault: unknown): string | undefined {
  if (typeof fault !== 'object' || fault === null) return undefined
  const { message, root, ...parts } = fault as Fault
  if (typeof message === 'string' && message !== '') return message
  for (const part of [root, ...Object.entries(parts).flatMap(([key, value]) => (key === 'ref' ? [] : [value]))]) {
    const found = firstMessage(part)
    if (found) return found
  }
  return undefined
}

/** What is wrong with a field, or with the first of its parts. */
export function fieldError<Fields extends FieldValues>(
  form: UseFormReturn<Fields, unknown, Fields>,
  name: FieldPath<Fields>,
): string | undefined {
  return firstMessage(form.getFieldState(name, form.formState).error)
}
