import { classes } from './classes'

/** The look shared by every box that is typed or chosen in. */
export function controlClasses(className?: string): string {
  return classes(
    'min-h-control w-full border border-ink bg-sheet px-2.5 py-1 text-base text-ink sm:text-[0.9375rem]',
    'aria-invalid:border-2 aria-invalid:border-spike disabled:border-line disabled:bg-wash disabled:text-soft [&[readonly]]:bg-wash',
    className,
  )
}
