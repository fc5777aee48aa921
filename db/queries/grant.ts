import { and, desc, eq, gt, isNull, lt, sql } from 'drizzle-orm'
import type { Db, Scope } from '@/db/client'
import { grant, grantToken } from '@/db/schema/grant'
import { hire } from '@/db/schema/hire'
import { show } from '@/db/schema/tour'

/** A key that was mailed afresh works for two weeks although its grant has run out; the keys before it stay run out. */
const freshKeyEnds = sql`case when ${grantToken.madeFor} = 'fresh' then ${grantToken.createdAt} + interval '14 days' end`

/** The one look-up that has no party yet: the token's hash is what finds it. `expiresAt` is this very key's. */
export async function findGrantByTokenHash(db: Db, tokenHash: string) {
  const rows = await db
    .select({
      tokenId: grantToken.id,
      grantId: grant.id,
      partyId: grant.partyId,
      purpose: grant.purpose,
      showId: grant.showId,
      hireId: grant.hireId,
      recipientName: grant.recipientName,
      recipientEmail: grant.recipientEmail,
      expiresAt: sql`greatest(${grant.expiresAt}, ${freshKeyEnds})`.mapWith(grant.expiresAt),
      withdrawnAt: grant.withdrawnAt,
    })
    .from(grantToken)
    .innerJoin(grant, and(eq(grant.partyId, grantToken.partyId), eq(grant.id, grantToken.grantId)))
    .where(eq(grantToken.tokenHash, tokenHash))
    .limit(1)
  return rows[0]
}

/** Notes that a link did something. Opening alone is not use: mail scanners open links too. */
export async function countTokenUse(db: Db, scope: Scope, tokenId: string): Promise<void> {
  await db
    .update(grantToken)
    .set({ lastUsedAt: sql`now()`, useCount: sql`${grantToken.useCount} + 1` })
    .where(and(eq(grantToken.partyId, scope.partyId), eq(grantToken.id, tokenId)))
}

type GrantSubject = { readonly showId: string | null; readonly hireId: string | null }

function ofSubject({ showId, hireId }: GrantSubject) {
  return and(showId === null ? isNull(grant.showId) : eq(grant.showId, showId), hireId === null ? isNull(grant.hireId) : eq(grant.hireId, hireId))
}

/** Leave that was given before and not withdrawn: for one contact, or for whoever stands at the bench. */
export async function findOpenGrant(db: Db, scope: Scope, input: GrantSubject & { purpose: 'reply' | 'bench'; contactId: string | null }) {
  const rows = await db
    .select({ id: grant.id, expiresAt: grant.expiresAt })
    .from(grant)
    .where(
      and(
        eq(grant.partyId, scope.partyId),
        eq(grant.purpose, input.purpose),
        ofSubject(input),
        input.contactId === null ? isNull(grant.contactId) : eq(grant.contactId, input.contactId),
        isNull(grant.withdrawnAt),
      ),
    )
    .orderBy(desc(grant.createdAt), desc(grant.id))
    .limit(1)
    .for('update')
  return rows[0]
}

/** Holds the links of one show or hire, so that two sendings at once share one. */
export async function lockGrants(db: Db, scope: Scope, subjectId: string): Promise<void> {
  await db.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`grants ${scope.partyId} ${subjectId}`}, 0))`)
}

export async function insertGrant(db: Db, scope: Scope, row: Omit<typeof grant.$inferInsert, 'partyId'>): Promise<string> {
  const rows = await db
    .insert(grant)
    .values({ ...row, partyId: scope.partyId })
    .returning({ id: grant.id })
  const made = rows[0]
  if (!made) throw new Error('no grant row came back')
  return made.id
}

/** The name, address and end of a grant as they are now: an address that was mended is the known one from here on. */
export async function renewGrant(
  db: Db,
  scope: Scope,
  input: { grantId: string; recipientName: string; recipientEmail: string | null; expiresAt: Date },
): Promise<void> {
  const { recipientName, recipientEmail, expiresAt } = input
  await db
    .update(grant)
    .set({ recipientName, recipientEmail, expiresAt })
    .where(and(eq(grant.partyId, scope.partyId), eq(grant.id, input.grantId)))
}

/** Moves the end of the links of one show or hire to no sooner than a moment; what was withdrawn or has run out stays so. */
export async function extendGrants(db: Db, scope: Scope, input: GrantSubject & { expiresAt: Date }): Promise<void> {
  await db
    .update(grant)
    .set({ expiresAt: input.expiresAt })
    .where(
      and(
        eq(grant.partyId, scope.partyId),
        ofSubject(input),
        isNull(grant.withdrawnAt),
        gt(grant.expiresAt, sql`now()`),
        lt(grant.expiresAt, input.expiresAt),
      ),
    )
}

export async function insertGrantToken(
  db: Db,
  scope: Scope,
  row: { id: string; grantId: string; tokenHash: string; madeFor: 'dispatch' | 'print' | 'fresh' },
): Promise<void> {
  await db.insert(grantToken).values({ ...row, partyId: scope.partyId })
}

export async function findGrant(db: Db, scope: Scope, grantId: string) {
  const rows = await db
    .select({
      id: grant.id,
      purpose: grant.purpose,
      showId: grant.showId,
      hireId: grant.hireId,
      contactId: grant.contactId,
      recipientName: grant.recipientName,
      recipientEmail: grant.recipientEmail,
      expiresAt: grant.expiresAt,
      withdrawnAt: grant.withdrawnAt,
      tourId: sql<string>`coalesce(${show.tourId}, ${hire.tourId})`,
    })
    .from(grant)
    .leftJoin(show, and(eq(show.partyId, grant.partyId), eq(show.id, grant.showId)))
    .leftJoin(hire, and(eq(hire.partyId, grant.partyId), eq(hire.id, grant.hireId)))
    .where(and(eq(grant.partyId, scope.partyId), eq(grant.id, grantId)))
    .limit(1)
  return rows[0]
}

/** Ends a link with all its keys; false when it had ended before. */
export async function withdrawGrant(db: Db, scope: Scope, grantId: string): Promise<boolean> {
  const rows = await db
    .update(grant)
    .set({ withdrawnAt: sql`now()` })
    .where(and(eq(grant.partyId, scope.partyId), eq(grant.id, grantId), isNull(grant.withdrawnAt)))
    .returning({ id: grant.id })
  return rows.length === 1
}

/** Ends every link of a show with all its keys; answers which were still open. */
export async function withdrawGrantsOfShow(db: Db, scope: Scope, showId: string) {
  return db
    .update(grant)
    .set({ withdrawnAt: sql`now()` })
    .where(and(eq(grant.partyId, scope.partyId), eq(grant.showId, showId), isNull(grant.withdrawnAt)))
    .returning({ id: grant.id, purpose: grant.purpose })
}

/** The links of one show or hire, newest first, with how many keys each has, when one was last used and when the last runs out. */
export async function listGrants(db: Db, scope: Scope, subject: GrantSubject) {
  return db
    .select({
      id: grant.id,
      purpose: grant.purpose,
      contactId: grant.contactId,
      recipientName: grant.recipientName,
      expiresAt: sql`greatest(${grant.expiresAt}, max(${freshKeyEnds}))`.mapWith(grant.expiresAt),
      withdrawnAt: grant.withdrawnAt,
      createdAt: grant.createdAt,
      tokens: sql<number>`count(${grantToken.id})::int`,
      uses: sql<number>`coalesce(sum(${grantToken.useCount}), 0)::int`,
      lastUsedAt: sql<string | null>`to_char(max(${grantToken.lastUsedAt}) at time zone 'utc', 'YYYY-MM-DD"T"HH24:MI:SS"Z"')`,
    })
    .from(grant)
    .leftJoin(grantToken, and(eq(grantToken.partyId, grant.partyId), eq(grantToken.grantId, grant.id)))
    .where(and(eq(grant.partyId, scope.partyId), ofSubject(subject)))
    .groupBy(grant.id)
    .orderBy(desc(grant.createdAt), desc(grant.id))
    .limit(200)
}
