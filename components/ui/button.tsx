import type { ComponentProps, MouseEvent } from 'react'
import { buttonClasses } from './button-classes'
import type { ButtonKind } from './button-classes'

export interface ButtonProps extends ComponentProps<'button'> {
  kind?: ButtonKind
  /** What is going on, in words ("Saving the kit"). While set, the button shows it, keeps its focus and does nothing. */
  busy?: string | false | null
}

function refuse(event: MouseEvent) {
  event.preventDefault()
  event.stopPropagation()
}

/** A button whose words say its result. */
export function Button({
  kind = 'secondary',
  busy,
  className,
  children,
  onClick,
  type = 'button',
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      onClick={busy ? refuse : onClick}
      aria-disabled={busy ? true : rest['aria-disabled']}
      aria-busy={busy ? true : undefined}
      className={buttonClasses(kind, className)}
    >
      {busy ? (
        <>
          <span aria-hidden className="inline-block size-2 animate-pulse bg-current" />
          <span>{busy}…</span>
        </>
      ) : (
        children
      )}
    </button>
  )
}
