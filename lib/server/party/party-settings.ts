import { db } from '@/db/client'
import { findParty, updateParty } from '@/db/queries/party'
import type { Party, PartySettings, UpdateParty } from '@/lib/contracts/party'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'

export async function readParty(actor: Actor): Promise<Party> {
  assertCan(actor, 'party:read')
  const found = await findParty(db(), actor)
  if (!found) throw new AppError('not-found', 'This party is not there any more.')
  return found
}

/** Sets what holds for the whole party: its name, units, reference pitch, paper and how notes are named. */
export async function changePartySettings(actor: Actor, input: UpdateParty): Promise<Party> {
  assertCan(actor, 'party:manage')
  const { version, ...settings } = input
  return db().transaction(async (tx) => {
    const before = await findParty(tx, actor)
    const after = before && (await updateParty(tx, actor, { version, settings }))
    if (!before || !after) {
      throw new AppError('stale', 'Somebody changed the settings meanwhile. Yours are not saved; look at theirs, then save again.', {
        details: { current: before },
      })
    }
    const changed = (Object.keys(settings) as (keyof PartySettings)[]).filter((key) => before[key] !== after[key])
    await audit(tx, actor, 'party.change', { type: 'party', id: actor.partyId }, {
      name: after.name,
      changed: Object.fromEntries(changed.map((key) => [key, after[key]])),
    })
    await notifyLive(tx, actor.partyId, [`party:${actor.partyId}`])
    return after
  })
}
