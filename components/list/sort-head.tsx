import type { ReactNode } from 'react'
import { TableHead } from '@/components/ui/table'
import type { ListQuery } from '@/lib/contracts/list'
import { listAddress } from './list-address'

export interface SortHeadProps {
  path: string
  query: ListQuery<string, string>
  by: string
  children: ReactNode
}

/** A heading that sorts the list by its column, and the other way round when it does already. */
export function SortHead({ path, query, by, children }: SortHeadProps) {
  const sorted = query.sort === by
  const order = sorted && query.order === 'up' ? 'down' : 'up'
  return (
    <TableHead
      sorted={sorted ? (query.order === 'up' ? 'ascending' : 'descending') : undefined}
      sortHref={listAddress(path, query, { sort: by, order })}
    >
      {children}
    </TableHead>
  )
}
