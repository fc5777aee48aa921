import { z } from 'zod'
import { db } from '@/db/client'
import { findPersonByEmail } from '@/db/queries/person'
import { emailSchema } from '@/lib/contracts/common'
import { AppError } from '@/lib/errors'
import { clientAddress } from '@/lib/server/http/client-address'
import type { Limit } from '@/lib/server/http/rate-limit'
import { clearLimit, takeFromLimit } from '@/lib/server/http/rate-limit'
import { passwordMatches } from './password'

const perAddress: Limit = { name: 'sign-in-address', points: 60, seconds: 600 }
const perPerson: Limit = { name: 'sign-in-person', points: 10, seconds: 600 }
const inputSchema = z.object({ email: emailSchema, password: z.string().min(1).max(200) })

/** Answers the person or null; which of the two parts was wrong is not told. A full limit is told. */
export async function passwordSignIn(credentials: unknown, headers: Record<string, unknown>) {
  const input = inputSchema.safeParse(credentials)
  if (!input.success) return null
  const forwarded = headers['x-forwarded-for']
  try {
    await takeFromLimit(perAddress, clientAddress(new Headers({ 'x-forwarded-for': typeof forwarded === 'string' ? forwarded : '' })))
    await takeFromLimit(perPerson, input.data.email)
  } catch (refusal) {
    // next-auth hands the message of a thrown error to the sign-in page as its error code.
    if (refusal instanceof AppError) throw new Error('RateLimited', { cause: refusal })
    throw refusal
  }
  const person = await findPersonByEmail(db(), input.data.email)
  if (!(await passwordMatches(person?.passwordHash, input.data.password)) || !person) return null
  await clearLimit(perPerson, input.data.email)
  return { id: person.id, name: person.name, email: person.email }
}
