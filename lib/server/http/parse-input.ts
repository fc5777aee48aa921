import type { z } from 'zod'
import { AppError } from '@/lib/errors'

/** Parses what came from outside; names every field at fault and what is allowed there. */
export function parseInput<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const result = schema.safeParse(value)
  if (result.success) return result.data
  const fields: Record<string, string> = {}
  for (const issue of result.error.issues) fields[issue.path.map(String).join('.') || 'request'] ??= issue.message
  const first = Object.entries(fields)[0]
  throw new AppError('invalid', `Please check ${first?.[0] ?? 'the request'}: ${first?.[1] ?? 'not valid'}. Nothing was changed.`, {
    details: { fields },
  })
}

/** Parses our own answer: a shape that the contract does not know is our fault, and no stray column leaves the house. */
export function parseAnswer<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const result = schema.safeParse(value)
  if (result.success) return result.data
  throw new AppError('internal', 'Our answer came out wrong. What you sent was saved; reload to see it.', {
    cause: new Error(result.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.code}`).join('; ')),
  })
}
