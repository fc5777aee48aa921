import { randomUUID } from 'node:crypto'
import { and, eq } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { db } from '@/db/client'
import { findBlob } from '@/db/queries/file'
import { pack } from '@/db/schema/advance'
import { fileReference } from '@/db/schema/file'
import { mail, mailAttachment } from '@/db/schema/mail'
import type { MemberActor } from '@/lib/server/auth/actor'
import { linkToken } from '@/lib/server/auth/link-token'
import { makePackPdf } from '@/lib/server/jobs/make-pack-pdf'
import { queueMail } from '@/lib/server/mail/queue-mail'
import { storePack } from '@/lib/server/packs/store-pack'
import { blobStore } from '@/lib/server/storage/blob-store'
import type { PartyFixture } from '../helpers/party-fixture'
import { makeParty } from '../helpers/party-fixture'
import { readPdf } from '../helpers/read-pdf'
import { makeTour } from '../helpers/tour-fixture'

describe('the PDF of a pack that is sent', () => {
  let party: PartyFixture
  let packId: string
  let showId: string

  beforeAll(async () => {
    party = await makeParty()
    const tour = await makeTour(party)
    showId = tour.showId
    await party.drumTech.call('POST', `/api/rigs/${tour.rigId}/revisions`, { note: 'first' })
  })
  /** A pack that no job was started for, so that the test runs the job itself. */
  const storedPack = async () => {
    const { personId, sessionId } = party.tourManager
    const actor: MemberActor = {
      ...{ kind: 'person', personId, sessionId, name: 'The tour-manager', partyId: party.partyId },
      ...{ roles: ['tour-manager'], address: 'test' },
    }
    packId = (await db().transaction((tx) => storePack(tx, actor, { of: { showId } }))).packId
  }
  const waitingMail = (holdSeconds: number) =>
    db().transaction((tx) =>
      queueMail(tx, {
        ...{ partyId: party.partyId, kind: 'pack', to: { address: 'house@venue.example', name: '' } },
        ...{ subject: 'Pack', text: 'Pack', html: '<p>Pack</p>', holdSeconds, awaitsPdf: true },
      }),
    )
  const jobsOf = async (mailId: string) =>
    Number(
      (await db().execute<{ count: string }>(`select count(*) from graphile_worker.jobs where key = 'mail:${mailId}'`))
        .rows[0]?.count,
    )
  const mailOf = async (mailId: string) => (await db().select().from(mail).where(eq(mail.id, mailId)))[0]
  const attachedTo = async (mailId: string) =>
    db().select().from(mailAttachment).where(eq(mailAttachment.mailId, mailId))

  it('carries the links of its tokens, is attached once, and lets its mail go only then, run twice too', async () => {
    await storedPack()
    const mailId = await waitingMail(3600)
    expect(await jobsOf(mailId)).toBe(0)
    const [replyTokenId, benchTokenId] = [randomUUID(), randomUUID()]
    const payload = { packId, partyId: party.partyId, mailId, replyTokenId, benchTokenId }
    await makePackPdf(payload, { attempts: 1 })
    await makePackPdf(payload, { attempts: 2 })
    expect(await jobsOf(mailId)).toBe(1)
    expect(await attachedTo(mailId)).toHaveLength(1)
    const [stored] = await db()
      .select({ blobId: pack.pdfBlobId, pages: pack.pdfPages })
      .from(pack)
      .where(eq(pack.id, packId))
    expect((await attachedTo(mailId))[0]?.blobId).toBe(stored?.blobId)
    const references = await db()
      .select({ audience: fileReference.audience, name: fileReference.name })
      .from(fileReference)
      .where(and(eq(fileReference.subjectType, 'pack'), eq(fileReference.subjectId, packId)))
    expect(references).toEqual([
      { audience: 'recipient', name: expect.stringMatching(/revision 1, Test Hall\.pdf$/) as string },
    ])
    const answer = await party.viewer.call('GET', `/api/packs/${packId}`)
    expect(answer.body).toMatchObject({ pdf: 'ready', pages: stored?.pages })
    const bytes = await readBlob(stored?.blobId ?? '')
    expect((await readPdf(bytes)).links.sort()).toEqual(
      [`b/${linkToken('grant', benchTokenId)}`, `r/${linkToken('grant', replyTokenId)}`].map(
        (path) => new URL(path, process.env['APP_URL']).href,
      ),
    )
  })

  const readBlob = async (blobId: string) => {
    const found = await findBlob(db(), party, blobId)
    return blobStore().get(found?.sha256 ?? '')
  }

  it('does not wake a mail that was stopped while it was made', async () => {
    await storedPack()
    const mailId = await waitingMail(3600)
    await db().update(mail).set({ cancelledAt: new Date() }).where(eq(mail.id, mailId))
    await makePackPdf(
      { packId, partyId: party.partyId, mailId, replyTokenId: null, benchTokenId: null },
      { attempts: 1 },
    )
    expect(await jobsOf(mailId)).toBe(0)
    expect(await attachedTo(mailId)).toEqual([])
  })

  it('gives its mail up with a sentence when it cannot be made, after five tries, and not before', async () => {
    await storedPack()
    await db()
      .update(pack)
      .set({ document: { schemaVersion: 1, lines: [], sheets: 'none' } })
      .where(eq(pack.id, packId))
    const mailId = await waitingMail(0)
    const payload = { packId, partyId: party.partyId, mailId, replyTokenId: null, benchTokenId: null }
    await expect(makePackPdf(payload, { attempts: 1 })).rejects.toThrow()
    expect((await mailOf(mailId))?.failedAt).toBeNull()
    await makePackPdf(payload, { attempts: 5 })
    expect((await mailOf(mailId))?.failure).toContain('PDF could not be made')
    expect(await jobsOf(mailId)).toBe(0)
  })

  it('gives its mail up when every try before ended with its process', async () => {
    await storedPack()
    const mailId = await waitingMail(0)
    await makePackPdf(
      { packId, partyId: party.partyId, mailId, replyTokenId: null, benchTokenId: null },
      { attempts: 6 },
    )
    expect((await mailOf(mailId))?.failure).toContain('PDF could not be made')
    expect(await jobsOf(mailId)).toBe(0)
  })

  it('is not tried again when the pack is too large', async () => {
    await storedPack()
    const [row] = await db().select({ document: pack.document }).from(pack).where(eq(pack.id, packId))
    await db()
      .update(pack)
      .set({ document: { ...(row?.document as object), facts: [{ label: 'x', words: 'x'.repeat(5 * 1024 * 1024) }] } })
      .where(eq(pack.id, packId))
    const mailId = await waitingMail(0)
    await makePackPdf(
      { packId, partyId: party.partyId, mailId, replyTokenId: null, benchTokenId: null },
      { attempts: 1 },
    )
    expect((await mailOf(mailId))?.failedAt).toBeInstanceOf(Date)
  })
})
