import type { ReactNode } from 'react'

/** A part of a form under its own heading. */
export function FormPart({ title, children }: { title: string; children: ReactNode }) {
  return (
    <fieldset className="min-w-0 border-t border-line pt-3">
      <legend className="name float-left mb-2 w-full text-lg">{title}</legend>
      <div className="clear-both flex flex-col gap-3">{children}</div>
    </fieldset>
  )
}
