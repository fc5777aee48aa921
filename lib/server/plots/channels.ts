import { db } from '@/db/client'
import type { Db, Scope } from '@/db/client'
import {
  deleteChannel,
  findChannel,
  findClashingChannel,
  insertChannel,
  listChannels,
  lockPatch,
  updateChannel,
} from '@/db/queries/channel'
import { rigExists } from '@/db/queries/plot'
import type { Channel, ChannelInput } from '@/lib/contracts/channel'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import { assertCan, type Actor } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { outputsOf } from '@/plots/symbols/piece-kinds'
import { noSuchRig, rigPlot } from './read-plot'

function noSuchChannel(): AppError {
  return new AppError('not-found', 'There is no such channel in this party.')
}

export async function readChannels(actor: Actor, input: { rigId: string }) {
  assertCan(actor, 'party:read')
  if (!(await rigExists(db(), actor, input.rigId))) throw noSuchRig()
  return { rigId: input.rigId, channels: await listChannels(db(), actor, input.rigId) }
}

/** The same id again is the same request: it answers the channel that is there. */
export async function createChannel(
  actor: Actor,
  input: { rigId: string; id?: string | undefined; channel: ChannelInput },
): Promise<Channel> {
  assertCan(actor, 'patch:edit')
  const { rigId, id } = input
  return db().transaction(async (tx) => {
    if (!(await lockPatch(tx, actor, rigId))) throw noSuchRig()
    const there = id === undefined ? undefined : await findChannel(tx, actor, id)
    if (there) {
      if (there.rigId !== rigId) throw noSuchRig()
      return there
    }
    await assertFree(tx, actor, { rigId, exceptId: null, channel: input.channel })
    const made = await insertChannel(tx, actor, { ...input.channel, id, rigId })
    if (!made) throw new AppError('conflict', 'This id is taken. Nothing was changed; send it under a new one.')
    await audit(tx, actor, 'channel.added', { type: 'channel', id: made.id }, { rigId, ...input.channel })
    await notifyLive(tx, actor.partyId, [`patch:${rigId}`])
    return made
  })
}

export async function changeChannel(
  actor: Actor,
  input: { channelId: string; version: number; channel: ChannelInput },
): Promise<Channel> {
  assertCan(actor, 'patch:edit')
  return db().transaction(async (tx) => {
    const before = await findChannel(tx, actor, input.channelId)
    if (!before || !(await lockPatch(tx, actor, before.rigId))) throw noSuchChannel()
    await assertFree(tx, actor, { rigId: before.rigId, exceptId: before.id, channel: input.channel })
    const changed = await updateChannel(tx, actor, { id: before.id, version: input.version, channel: input.channel })
    if (!changed) throw await staleChannel(tx, actor, before.id)
    await audit(tx, actor, 'channel.changed', { type: 'channel', id: before.id }, { from: before, to: input.channel })
    await notifyLive(tx, actor.partyId, [`patch:${before.rigId}`])
    return changed
  })
}

export async function removeChannel(actor: Actor, input: { channelId: string; version: number }): Promise<Channel> {
  assertCan(actor, 'patch:edit')
  return db().transaction(async (tx) => {
    const before = await findChannel(tx, actor, input.channelId)
    if (!before || !(await lockPatch(tx, actor, before.rigId))) throw noSuchChannel()
    if (!(await deleteChannel(tx, actor, { id: before.id, version: input.version })))
      throw await staleChannel(tx, actor, before.id)
    await audit(tx, actor, 'channel.removed', { type: 'channel', id: before.id }, { was: before })
    await notifyLive(tx, actor.partyId, [`patch:${before.rigId}`])
    return before
  })
}

async function staleChannel(db: Db, scope: Scope, channelId: string): Promise<AppError> {
  const current = await findChannel(db, scope, channelId)
  if (!current) return noSuchChannel()
  return new AppError('stale', 'Someone changed this channel meanwhile. Nothing was changed; look at it again.', {
    details: { current },
  })
}

/** A number stands once in a rig, an output goes to one channel, and it must be an output of a piece on the plot. */
async function assertFree(
  db: Db,
  scope: Scope,
  input: { rigId: string; exceptId: string | null; channel: ChannelInput },
): Promise<void> {
  const { rigId, exceptId, channel } = input
  const clash = await findClashingChannel(db, scope, { rigId, exceptId, ...channel })
  if (clash) {
    const field = clash.number === channel.number ? 'number' : 'pieceId'
    const said =
      field === 'number'
        ? `Channel ${channel.number} is taken${clash.name ? ` by ${clash.name}` : ''}`
        : `Channel ${clash.number} takes this output already`
    throw new AppError('conflict', `${said}. Nothing was changed.`, { details: { fields: { [field]: said } } })
  }
  if (channel.pieceId === null) return
  const { document } = await rigPlot(db, scope, rigId)
  const piece = document.pieces[channel.pieceId]
  const refuse = (field: string, message: string) =>
    new AppError('invalid', `${message}. Nothing was changed.`, { details: { fields: { [field]: message } } })
  if (!piece) throw refuse('pieceId', 'This piece is not on the plot')
  if (!outputsOf(piece).includes(channel.output))
    throw refuse('output', `This piece has the outputs: ${outputsOf(piece).join(', ') || 'none'}`)
}
