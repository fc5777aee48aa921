import { db } from '@/db/client'
import {
  deletePlayer,
  findPlayer,
  insertPlayer,
  listPlayerNames,
  listPlayers,
  playerHasShows,
  updatePlayer,
} from '@/db/queries/player'
import type { Player, PlayerInput, PlayerListQuery } from '@/lib/contracts/player'
import { audit } from '@/lib/server/audit/audit'
import type { Actor } from '@/lib/server/auth/actor'
import { assertCan } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { changedOr, notThere, stillInUse, thereAlready } from '@/lib/server/refusals'

export async function readPlayers(actor: Actor, query: PlayerListQuery) {
  assertCan(actor, 'party:read')
  return listPlayers(db(), actor, query)
}

export async function readPlayerNames(actor: Actor) {
  assertCan(actor, 'party:read')
  return listPlayerNames(db(), actor)
}

export async function createPlayer(
  actor: Actor,
  input: { id?: string | undefined; player: PlayerInput },
): Promise<Player> {
  assertCan(actor, 'player:edit')
  return db().transaction(async (tx) => {
    const made = await insertPlayer(tx, actor, { ...input.player, id: input.id })
    if (!made) return thereAlready(input.id ? await findPlayer(tx, actor, input.id) : undefined)
    await audit(tx, actor, 'player.added', { type: 'player', id: made.id }, { hand: made.hand })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return made
  })
}

export async function changePlayer(
  actor: Actor,
  input: { playerId: string; version: number; player: PlayerInput },
): Promise<Player> {
  assertCan(actor, 'player:edit')
  return db().transaction(async (tx) => {
    const before = await findPlayer(tx, actor, input.playerId)
    if (!before) throw notThere('player')
    const changed = await updatePlayer(tx, actor, { id: before.id, version: input.version, player: input.player })
    const player = await changedOr('player', changed, () => findPlayer(tx, actor, before.id))
    await audit(
      tx,
      actor,
      'player.changed',
      { type: 'player', id: player.id },
      {
        from: { hand: before.hand, throneHeightM: before.throneHeightM },
        to: { hand: player.hand, throneHeightM: player.throneHeightM },
      },
    )
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return player
  })
}

export async function removePlayer(actor: Actor, input: { playerId: string; version: number }): Promise<Player> {
  assertCan(actor, 'player:edit')
  return db().transaction(async (tx) => {
    const player = await findPlayer(tx, actor, input.playerId)
    if (!player) throw notThere('player')
    if (await playerHasShows(tx, actor, player.id)) {
      throw stillInUse(`${player.name} plays shows of a run. Give those shows another player first.`)
    }
    const gone = await deletePlayer(tx, actor, { id: player.id, version: input.version })
    await changedOr('player', gone ? player : undefined, () => findPlayer(tx, actor, player.id))
    await audit(tx, actor, 'player.removed', { type: 'player', id: player.id }, { hand: player.hand })
    await notifyLive(tx, actor.partyId, [`directory:${actor.partyId}`])
    return player
  })
}
