import { eq, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { person } from '@/db/schema/person'

const columns = {
  id: person.id,
  name: person.name,
  email: person.email,
  emailVerifiedAt: person.emailVerifiedAt,
  passwordHash: person.passwordHash,
  locale: person.locale,
}

/** People stand above parties; an address is compared without case. */
export async function findPersonByEmail(db: Db, email: string) {
  const rows = await db.select(columns).from(person).where(sql`lower(${person.email}) = lower(${email})`).limit(1)
  return rows[0]
}

export async function findPerson(db: Db, id: string) {
  const rows = await db.select(columns).from(person).where(eq(person.id, id)).limit(1)
  return rows[0]
}

export async function insertPerson(
  db: Db,
  row: { id?: string | undefined; name: string; email: string; passwordHash?: string | null; emailVerifiedAt?: Date | null },
) {
  const rows = await db.insert(person).values(row).returning(columns)
  const made = rows[0]
  if (!made) throw new Error('no person row came back')
  return made
}

/** Makes a person, or answers undefined when somebody has that address: of two at once, one is made. */
export async function insertPersonUnlessKnown(
  db: Db,
  row: { name: string; email: string; passwordHash?: string; emailVerifiedAt?: Date },
) {
  const rows = await db.insert(person).values(row).onConflictDoNothing().returning(columns)
  return rows[0]
}

export async function setPersonPassword(db: Db, id: string, passwordHash: string): Promise<void> {
  await db.update(person).set({ passwordHash }).where(eq(person.id, id))
}

export async function markEmailVerified(db: Db, id: string): Promise<void> {
  await db.update(person).set({ emailVerifiedAt: sql`coalesce(${person.emailVerifiedAt}, now())` }).where(eq(person.id, id))
}
