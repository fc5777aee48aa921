import type { Route } from 'next'
import type { ListQuery } from '@/lib/contracts/list'

type Query = ListQuery<string, string>

/** The address of a list in another state; what is as it begins is left out. Any change but of the page goes to page 1. */
export function listAddress(path: string, query: Query, change: Partial<Query>): Route {
  const next = { ...query, page: 1, ...change }
  const params = new URLSearchParams()
  if (next.q) params.set('q', next.q)
  params.set('sort', next.sort)
  if (next.order !== 'up') params.set('order', next.order)
  if (next.filter !== 'all') params.set('filter', next.filter)
  if (next.page > 1) params.set('page', String(next.page))
  return `${path}?${params}` as Route
}
