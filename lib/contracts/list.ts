import { z } from 'zod'

export const pageSize = 25

/** The state of a list, as its address keeps it. What cannot be read falls back, so that an old bookmark still opens. */
export function listQuerySchema<Sort extends string, Filter extends string>(
  sorts: readonly [Sort, ...Sort[]],
  filters: readonly [Filter, ...Filter[]],
) {
  return z.object({
    q: z
      .string()
      .trim()
      .max(100)
      .refine((text) => !text.includes('\0'))
      .catch('')
      .default(''),
    sort: z.enum(sorts).catch(sorts[0]).default(sorts[0]),
    order: z.enum(['up', 'down']).catch('up').default('up'),
    filter: z.enum(filters).catch(filters[0]).default(filters[0]),
    page: z.coerce.number().int().min(1).max(10_000).catch(1).default(1),
  })
}

export type ListQuery<Sort extends string, Filter extends string> = {
  q: string
  sort: Sort
  order: 'up' | 'down'
  filter: Filter
  page: number
}

/** One page of a list, and how many there are in all. */
export type ListPage<Row> = { rows: Row[]; total: number }
