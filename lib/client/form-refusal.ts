import type { FieldValues, Path, UseFormReturn } from 'react-hook-form'
import { AppError } from '@/lib/errors'

/** Puts a refusal where it belongs: beside the fields it names, else over the whole form. */
export function showRefusal<Values extends FieldValues, Output>(
  form: Pick<UseFormReturn<Values, unknown, Output>, 'setError' | 'getValues'>,
  error: unknown,
): void {
  const refusal = error instanceof AppError ? error : new AppError('internal', 'Something failed in this page. Reload it and try again.')
  const fields = refusal.details?.['fields']
  const known = Object.keys(form.getValues())
  let placed = false
  for (const [name, message] of Object.entries(fields && typeof fields === 'object' ? fields : {})) {
    if (!known.includes(name)) continue
    // The name is one of the form's own, as just checked; its type cannot say so.
    form.setError(name as Path<Values>, { message: String(message) }, { shouldFocus: !placed })
    placed = true
  }
  if (!placed) form.setError('root', { message: refusal.message })
}
