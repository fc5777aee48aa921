import type { Adapter, AdapterUser } from 'next-auth/adapters'
import { db } from '@/db/client'
import { findPerson, findPersonByEmail, markEmailVerified } from '@/db/queries/person'
import { insertVerificationToken, takeVerificationToken } from '@/db/queries/verification-token'

type PersonRow = NonNullable<Awaited<ReturnType<typeof findPerson>>>

function asUser(row: PersonRow): AdapterUser {
  return { id: row.id, name: row.name, email: row.email, emailVerified: row.emailVerifiedAt }
}

/**
 * What next-auth needs for the e-mail link on our own tables. It never makes a person: people come by invitation or by
 * signing up. Sessions are ours (see current-actor), so the adapter keeps none.
 */
export const authAdapter: Adapter = {
  createUser() {
    return Promise.reject(new Error('people are made by sign-up or invitation'))
  },
  async getUser(id) {
    const row = await findPerson(db(), id)
    return row ? asUser(row) : null
  },
  async getUserByEmail(email) {
    const row = await findPersonByEmail(db(), email)
    return row ? asUser(row) : null
  },
  getUserByAccount: () => Promise.resolve(null),
  async updateUser(user) {
    if (user.emailVerified) await markEmailVerified(db(), user.id)
    const row = await findPerson(db(), user.id)
    if (!row) throw new Error('the person is gone')
    return asUser(row)
  },
  linkAccount: () => Promise.resolve(undefined),
  createSession: () => Promise.reject(new Error('sessions are made at sign-in')),
  getSessionAndUser: () => Promise.resolve(null),
  updateSession: () => Promise.resolve(null),
  deleteSession: () => Promise.resolve(null),
  async createVerificationToken(token) {
    // Nobody is mailed a link to an unknown address, so there is nothing to keep for it.
    if (await findPersonByEmail(db(), token.identifier)) await insertVerificationToken(db(), token)
    return token
  },
  async useVerificationToken(input) {
    return (await takeVerificationToken(db(), input)) ?? null
  },
}
