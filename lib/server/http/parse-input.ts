import type { z } from 'zod'
import { AppError } from '@/lib/errors'

/** Parses what came from outside; names every field at fault and what is allowed there. */
export function parseInput<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const result = schema.safeParse(value)
  const fields: Record<string, string> = {}
  if (result.success) {
    const fault = storeFault(result.data)
    if (!fault) return result.data
    fields[fault.field] = fault.message
  }
  for (const issue of result.error?.issues ?? []) fields[issue.path.map(String).join('.') || 'request'] ??= issue.message
  const first = Object.entries(fields)[0]
  throw new AppError('invalid', `Please check ${first?.[0] ?? 'the request'}: ${first?.[1] ?? 'not valid'}. Nothing was changed.`, {
    details: { fields },
  })
}

/** Deeper than anything of ours; the database and the writer of JSON give up far below what fits into a request. */
const deepest = 24

/** What passed its schema and yet cannot be stored: text with a null character or half a character in it, or endless nesting. */
function storeFault(value: unknown, path: readonly string[] = []): { field: string; message: string } | undefined {
  const fault = (message: string) => ({ field: path.join('.') || 'request', message })
  if (typeof value === 'string') {
    return value.includes('\0') || /\p{Cs}/u.test(value) ? fault('holds a character that is none') : undefined
  }
  if (typeof value !== 'object' || value === null) return undefined
  if (path.length >= deepest) return fault('is nested too deeply')
  for (const [key, inner] of Object.entries(value)) {
    const found = storeFault(key, path) ?? storeFault(inner, [...path, key])
    if (found) return found
  }
  return undefined
}

/** Parses our own answer: a shape that the contract does not know is our fault, and no stray column leaves the house. */
export function parseAnswer<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const result = schema.safeParse(value)
  if (result.success) return result.data
  throw new AppError('internal', 'Our answer came out wrong. What you sent was saved; reload to see it.', {
    cause: new Error(result.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.code}`).join('; ')),
  })
}
