import { classes } from './classes'

export type ButtonKind = 'primary' | 'secondary' | 'quiet'

const kinds: Record<ButtonKind, string> = {
  primary: 'border border-ink bg-ink text-paper hover:bg-sheet hover:text-ink',
  secondary: 'border border-ink bg-transparent text-ink hover:bg-ink hover:text-paper',
  quiet:
    'border border-transparent bg-transparent text-ink underline decoration-1 underline-offset-4 hover:decoration-2',
}

/** The look of a button, for a button and for a link that stands as one. */
export function buttonClasses(kind: ButtonKind, className?: string): string {
  return classes(
    'inline-flex min-h-control items-center justify-center gap-2 px-4 py-1 text-center text-[0.9375rem] leading-tight font-bold',
    'transition-colors duration-100 disabled:pointer-events-none disabled:border-line disabled:bg-wash disabled:text-soft',
    'aria-disabled:pointer-events-none aria-disabled:border-line aria-disabled:bg-wash aria-disabled:text-soft',
    kinds[kind],
    className,
  )
}
