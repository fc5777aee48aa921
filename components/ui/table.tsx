import type { Route } from 'next'
import Link from 'next/link'
import { useId } from 'react'
import type { ComponentProps, ReactNode } from 'react'
import { classes } from './classes'

export interface TableProps {
  /** What the table holds; read out, and shown unless `captionHidden`. */
  caption: ReactNode
  captionHidden?: boolean
  head: ReactNode
  children: ReactNode
  className?: string
}

/** A table between hairlines. On a narrow page it scrolls by itself, with the keys too. */
export function Table({ caption, captionHidden, head, children, className }: TableProps) {
  const captionId = useId()
  return (
    <div className={classes('overflow-x-auto', className)} tabIndex={0} role="group" aria-labelledby={captionId}>
      <table className="w-full border-collapse text-left text-[0.9375rem]">
        <caption id={captionId} className={captionHidden ? 'sr-only' : 'pb-2 text-left text-soft'}>
          {caption}
        </caption>
        <thead>
          <tr className="border-b-2 border-ink">{head}</tr>
        </thead>
        <tbody>{children}</tbody>
      </table>
    </div>
  )
}

export interface TableHeadProps extends ComponentProps<'th'> {
  /** Numbers stand to the right. */
  numeric?: boolean
  /** How the rows are sorted by this column now. */
  sorted?: 'ascending' | 'descending' | undefined
  /** Where a press on the heading leads, to sort by this column. */
  sortHref?: Route | undefined
}

export function TableHead({ numeric, sorted, sortHref, className, children, ...rest }: TableHeadProps) {
  return (
    <th
      scope="col"
      {...rest}
      aria-sort={sorted}
      className={classes(
        'px-2 py-1.5 align-baseline text-sm font-bold first:pl-0 last:pr-0',
        numeric && 'text-right',
        className,
      )}
    >
      {sortHref ? (
        <Link href={sortHref} className="inline-flex min-h-7 items-center gap-1 underline underline-offset-4">
          {children}
          {sorted && <span aria-hidden>{sorted === 'ascending' ? '↑' : '↓'}</span>}
        </Link>
      ) : (
        children
      )}
    </th>
  )
}

export function TableRow({ className, ...rest }: ComponentProps<'tr'>) {
  return <tr {...rest} className={classes('border-b border-line', className)} />
}

export interface TableCellProps extends ComponentProps<'td'> {
  numeric?: boolean
}

export function TableCell({ numeric, className, ...rest }: TableCellProps) {
  return (
    <td
      {...rest}
      className={classes('px-2 py-1.5 align-baseline first:pl-0 last:pr-0 has-[input,select]:align-top', numeric && 'figures text-right', className)}
    />
  )
}
