'use client'

import { useEffect, useRef } from 'react'

export interface ErrorSummaryProps {
  /** What did not happen ("The kit is not saved yet"). */
  title: string
  /** Each with the id of the control it is about, where there is one. */
  errors: readonly { fieldId: string | null; message: string }[]
}

/** Everything wrong with a form at once, each line leading to its field. It takes the focus when it appears. */
export function ErrorSummary({ title, errors }: ErrorSummaryProps) {
  const region = useRef<HTMLDivElement>(null)
  const shown = errors.length > 0
  useEffect(() => {
    if (shown) region.current?.focus()
  }, [shown])
  if (!shown) return null
  return (
    <div ref={region} tabIndex={-1} role="alert" className="border-l-4 border-spike bg-sheet px-4 py-3">
      <p className="font-bold text-spike-text">{title}</p>
      <ul className="mt-1 list-inside list-['–_']">
        {errors.map(({ fieldId, message }) => (
          <li key={`${fieldId} ${message}`}>
            {fieldId ? (
              <a
                href={`#${fieldId}`}
                className="underline underline-offset-4"
                onClick={(event) => {
                  const field = document.getElementById(fieldId)
                  if (!field) return
                  event.preventDefault()
                  field.focus()
                }}
              >
                {message}
              </a>
            ) : (
              message
            )}
          </li>
        ))}
      </ul>
    </div>
  )
}
