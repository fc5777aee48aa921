import { db } from '@/db/client'
import type { SignOffRow } from '@/db/queries/bench'
import { findSignOff, insertSignOff, listSignOffs, lockBench } from '@/db/queries/bench'
import { countTokenUse } from '@/db/queries/grant'
import { findShow } from '@/db/queries/show'
import type { BenchSignOff, SignOffInput } from '@/lib/contracts/bench'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { fieldFault, notThere, thereAlready } from '@/lib/server/refusals'
import { assertAtBench } from './assert-at-bench'
import { benchSignOff } from './bench-answer'
import { assertRoomOnBench } from './bench-limit'
import { readNightSheet } from './read-night-sheet'

/** Hands a drum over as tuned, by name, or takes that back. Nothing is ever rewritten: each adds one. */
export async function signOffDrum(
  actor: Actor,
  input: { showId: string; signOff: SignOffInput },
): Promise<BenchSignOff> {
  assertAtBench(actor, input.showId, 'bench:log')
  const { id, entryId, decision, remark } = input.signOff
  const byName = actor.kind === 'person' ? actor.name : input.signOff.byName
  if (byName === '') throw fieldFault('byName', 'write your name')
  return db().transaction(async (tx) => {
    await lockBench(tx, actor, input.showId)
    const show = await findShow(tx, actor, input.showId)
    if (!show) throw notThere('show')
    const there = await findSignOff(tx, actor, id)
    if (there) return sameSignOff(there, input)
    await assertRoomOnBench(tx, actor, show.id, { signOffs: 1 })
    const sheet = await readNightSheet(tx, actor, show)
    if (!sheet?.drums.some((drum) => drum.id === entryId))
      throw fieldFault('entryId', 'this drum is not on the sheet of this show')
    if (decision === 'taken-back') {
      const last = (await listSignOffs(tx, actor, show.id)).findLast((row) => row.kitEntryId === entryId)
      if (last?.decision !== 'signed')
        throw new AppError('conflict', 'This drum is not signed off. Nothing was changed.')
    }
    const made = await insertSignOff(tx, actor, {
      ...{ id, showId: show.id, kitEntryId: entryId, decision, byName, remark },
      grantId: actor.kind === 'link' ? actor.grantId : null,
      personId: actor.kind === 'person' ? actor.personId : null,
    })
    const row = thereAlready(made ? await findSignOff(tx, actor, id) : undefined)
    await audit(
      tx,
      actor,
      decision === 'signed' ? 'bench.sign-off' : 'bench.take-back',
      { type: 'show', id: show.id },
      { entryId, name: byName },
    )
    await notifyLive(tx, actor.partyId, [`bench:${show.id}`])
    if (actor.kind === 'link') await countTokenUse(tx, actor, actor.tokenId)
    return benchSignOff(row)
  })
}

function sameSignOff(row: SignOffRow, { showId, signOff }: { showId: string; signOff: SignOffInput }): BenchSignOff {
  const same = row.showId === showId && row.kitEntryId === signOff.entryId && row.decision === signOff.decision
  if (!same) throw new AppError('conflict', 'This id belongs to another sign-off. Nothing was changed.')
  return benchSignOff(row)
}
