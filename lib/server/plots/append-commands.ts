import { db } from '@/db/client'
import type { Db, Scope } from '@/db/client'
import {
  appendToLog,
  findCommandsByClientId,
  findRigEntryKinds,
  keepSnapshot,
  lockRigPlot,
  rigExists,
} from '@/db/queries/plot'
import type { AppendCommands } from '@/lib/contracts/plot'
import { AppError } from '@/lib/errors'
import { audit } from '@/lib/server/audit/audit'
import { assertCan, type Actor } from '@/lib/server/auth/actor'
import { notifyLive } from '@/lib/server/live/notify-live'
import { apply } from '@/plots/model/apply'
import { PLOT_COMMAND_VERSION, type PlotCommand } from '@/plots/model/command'
import type { PlotDocument } from '@/plots/model/document'
import { SNAPSHOT_EVERY } from '@/plots/model/fold'
import { PlotCommandError } from '@/plots/model/plot-command-error'
import { loadPlot } from './load-plot'
import { missedCommands, noSuchRig } from './read-plot'

/**
 * Adds commands to a rig's plot, all or none. Commands that are there already (a sending whose answer was lost) are
 * acknowledged again. New ones must have been made on the newest document: otherwise they are refused as stale, with
 * the commands that were missed, and the client rebases.
 */
export async function appendCommands(actor: Actor, input: { rigId: string } & AppendCommands) {
  assertCan(actor, 'plot:edit')
  const { rigId } = input
  return db().transaction(async (tx) => {
    if (!(await rigExists(tx, actor, rigId))) throw noSuchRig()
    const plot = await lockRigPlot(tx, actor, rigId)
    const clientIds = input.commands.map((command) => command.clientId)
    const known = await findCommandsByClientId(tx, actor, { plotId: plot.id, clientIds })
    const knownIds = new Set(known.map((command) => command.clientId))
    const fresh = input.commands.filter((command) => !knownIds.has(command.clientId))
    if (fresh.length === 0) return { sequence: plot.sequence, accepted: known }
    if (input.baseSequence !== plot.sequence) {
      throw new AppError('stale', 'The plot has moved on. Your changes are kept and put on top of the newest plot.', {
        details: { ...(await missedCommands(tx, actor, { plot, after: input.baseSequence })), arrived: [...knownIds] },
      })
    }
    await assertEntriesOfRig(tx, actor, rigId, fresh)
    const { document } = await loadPlot(tx, actor, plot.id)
    const after = applyAll(document, fresh)
    const rows = fresh.map((command, index) => ({
      plotId: plot.id,
      sequence: plot.sequence + index + 1,
      clientId: command.clientId,
      commandVersion: PLOT_COMMAND_VERSION,
      command,
      personId: actor.personId,
    }))
    await appendToLog(tx, actor, { plotId: plot.id, rows })
    const sequence = plot.sequence + rows.length
    if (Math.floor(sequence / SNAPSHOT_EVERY) > Math.floor(plot.sequence / SNAPSHOT_EVERY))
      await keepSnapshot(tx, actor, { plotId: plot.id, sequence, document: after })
    await audit(
      tx,
      actor,
      'plot.changed',
      { type: 'rig', id: rigId },
      {
        from: plot.sequence + 1,
        to: sequence,
        commands: [...new Set(fresh.map((command) => command.type))],
      },
    )
    await notifyLive(tx, actor.partyId, [`plot:${rigId}`])
    return { sequence, accepted: [...known, ...rows.map(({ clientId, sequence }) => ({ clientId, sequence }))] }
  })
}

function applyAll(document: PlotDocument, commands: readonly PlotCommand[]): PlotDocument {
  return commands.reduce((at, command, index) => {
    try {
      return apply(at, command)
    } catch (error) {
      if (!(error instanceof PlotCommandError)) throw error
      throw refused(index, error.message, error)
    }
  }, document)
}

/** A placed kit piece names an entry of this rig's kit, of its own kind. One since taken out may come back by undo. */
async function assertEntriesOfRig(db: Db, scope: Scope, rigId: string, commands: readonly PlotCommand[]) {
  const placed = commands.flatMap((command, index) =>
    command.type === 'place' ? command.pieces.map((piece) => ({ piece, index })) : [],
  )
  const entryIds = [...new Set(placed.flatMap(({ piece }) => piece.kitEntryId ?? []))]
  const kinds = new Map((await findRigEntryKinds(db, scope, { rigId, entryIds })).map((row) => [row.id, row.kind]))
  for (const { piece, index } of placed) {
    if (piece.kitEntryId === null) continue
    const kind = kinds.get(piece.kitEntryId)
    if (kind === undefined) throw refused(index, 'The kit of this rig has no such entry')
    if (kind !== piece.kind) throw refused(index, `The kit entry is ${kind}, not ${piece.kind}`)
  }
}

function refused(index: number, message: string, cause?: unknown): AppError {
  return new AppError('invalid', `${message}. Nothing was changed.`, {
    details: { fields: { [`commands.${index}`]: message } },
    cause,
  })
}
