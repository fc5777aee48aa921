import Link from 'next/link'
import type { ListQuery } from '@/lib/contracts/list'
import { pageSize } from '@/lib/contracts/list'
import { listAddress } from './list-address'

export interface PagesProps {
  path: string
  query: ListQuery<string, string>
  total: number
  /** What is counted, for one and for many ("venue", "venues"). */
  words: readonly [one: string, many: string]
  size?: number
}

/** How many there are, which of them are shown, and the pages before and after. */
export function Pages({ path, query, total, words, size = pageSize }: PagesProps) {
  const last = Math.max(1, Math.ceil(total / size))
  const first = (query.page - 1) * size + 1
  return (
    <nav aria-label="Pages" className="mt-2 flex flex-wrap items-center gap-x-4 text-sm text-soft">
      <span>
        {total === 1 ? `1 ${words[0]}` : `${total} ${words[1]}`}
        {last > 1 && `, ${first} to ${Math.min(total, query.page * size)} shown`}
      </span>
      {query.page > 1 && (
        <Link
          className="flex min-h-control items-center font-bold text-ink underline underline-offset-4"
          href={listAddress(path, query, { page: query.page - 1 })}
        >
          Page before
        </Link>
      )}
      {query.page < last && (
        <Link
          className="flex min-h-control items-center font-bold text-ink underline underline-offset-4"
          href={listAddress(path, query, { page: query.page + 1 })}
        >
          Next page
        </Link>
      )}
    </nav>
  )
}
